import { toDeg, toRad } from '#sky';
import { magToLuminance } from './luminance';
import { FADING } from './moonlight';

/** The moonless, twilightless sky contained in the measured twilights. */
const NIGHT_IN_MEASUREMENT = magToLuminance(21.61);

/** Zenith sky at sunset and at 3 and 6 degrees of depression, and its slope there, mag and mag per degree. */
const SUNSET = { mag: 7.11, slope: 0.45 };
const MIDWAY = { mag: 9.33, slope: 1.03 };
const MEASURED_FROM = 6;
const MEASURED_TO = 15;
const NIGHT_FROM = 18;
/** A plain daylight sky, approached as the Sun climbs. */
const DAYLIGHT = 4;

const END_OF_MEASUREMENT = magToLuminance(zenithTwilightMag(MEASURED_TO));
const END_EXCESS = END_OF_MEASUREMENT - NIGHT_IN_MEASUREMENT;
/** Makes the fade to nothing at 18 degrees leave 15 degrees with the measured slope. */
const FADE_POWER =
  (-FADING * measuredSlope(MEASURED_TO) * END_OF_MEASUREMENT * (NIGHT_FROM - MEASURED_TO)) / END_EXCESS;

/**
 * Between these depressions (degrees) the directional law holds; outside, the nearer one's pattern is kept.
 */
const PATTERN_FROM = 3;
const PATTERN_TO = 12;
/** Sun's height in degrees at which daylight has lost all of the twilight's pattern. */
const PATTERN_GONE = 10;
/** The directional law divides by the extinction; no site has air clearer than this. */
const LEAST_EXTINCTION = 0.1;

/**
 * Brightness of the whole zenith sky in V mag/arcsec2, at a dark site, with the Sun `depressionDeg` below the
 * horizon, up to 15. From 6 degrees on: Patat, Ugolnikov & Postylyakov 2006 (A&A 455, 385, table 1),
 * sigma 0.18. Brighter: the course of Koomen et al. 1952 (JOSA 42, 353), the mean of its two sites hung on
 * Patat's value at 6 degrees, as a smooth curve. With the Sun up, a plain approach to a daylight sky: our
 * model, good for no more than "it is day".
 */
export function zenithTwilightMag(depressionDeg: number): number {
  if (depressionDeg >= MEASURED_FROM) {
    const beyond = depressionDeg - 5;
    return 11.84 + 1.518 * beyond - 0.057 * beyond * beyond;
  }
  if (depressionDeg >= 3) {
    const measured = { mag: zenithTwilightMag(MEASURED_FROM), slope: measuredSlope(MEASURED_FROM) };
    return smoothBetween(MIDWAY, measured, depressionDeg - 3);
  }
  if (depressionDeg >= 0) return smoothBetween(SUNSET, MIDWAY, depressionDeg);
  const depth = SUNSET.mag - DAYLIGHT;
  return DAYLIGHT + depth * Math.exp((depressionDeg * SUNSET.slope) / depth);
}

/**
 * Twilight's own light at the zenith in nanolambert, to be added to a site's night sky: the measured sky less
 * the night it contains, fading smoothly from 15 degrees of depression to nothing at 18. The measured
 * parabola turns over at 18.3 degrees, so it is never followed beyond 15.
 */
export function zenithTwilight(sunAltitudeRad: number): number {
  const depressionDeg = -toDeg(sunAltitudeRad);
  if (depressionDeg >= NIGHT_FROM) return 0;
  if (depressionDeg > MEASURED_TO) {
    return END_EXCESS * ((NIGHT_FROM - depressionDeg) / (NIGHT_FROM - MEASURED_TO)) ** FADE_POWER;
  }
  return magToLuminance(zenithTwilightMag(depressionDeg)) - NIGHT_IN_MEASUREMENT;
}

/**
 * Twilight in a direction in nanolambert, Schaefer 1998 (Sky & Telescope 95(5), 57), V band. Its pattern over
 * the sky is what we use; its absolute value is checked but not used.
 */
export function schaeferTwilight(
  sunAltitudeRad: number,
  zenithDistanceRad: number,
  sunSeparationRad: number,
  extinction: number,
): number {
  const magnitude =
    -26.74 + 11.05 + 32.5 - toDeg(sunAltitudeRad) - toDeg(zenithDistanceRad) / (360 * extinction);
  const spread = 100 / toDeg(sunSeparationRad);
  const scattered = 1 - Math.exp(FADING * extinction * lowAirmass(Math.cos(zenithDistanceRad)));
  return (Math.exp(FADING * magnitude) * spread * scattered) / 1.11e-15;
}

/** Airmass of Rozenberg 1966 from the sine of the altitude: 40 at the horizon. */
export function lowAirmass(sinAltitude: number): number {
  return 1 / (sinAltitude + 0.025 * Math.exp(-11 * sinAltitude));
}

/** The Sun's place used for the pattern: its height held within the directional law's range. */
export function patternSunAltitude(sunAltitudeRad: number): number {
  return toRad(-Math.min(PATTERN_TO, Math.max(PATTERN_FROM, -toDeg(sunAltitudeRad))));
}

/**
 * How much of the directional pattern shows: all of it from 3 degrees of depression down, fading to none
 * while the Sun climbs to 10 degrees. The fourth power makes the glow over the Sun, up to a hundred times
 * the zenith, fade about evenly in magnitudes.
 */
export function patternShare(sunAltitudeRad: number): number {
  const fromDeg = -PATTERN_FROM;
  const climb = (toDeg(sunAltitudeRad) - fromDeg) / (PATTERN_GONE - fromDeg);
  const t = Math.min(1, Math.max(0, climb));
  return (1 - t * t * (3 - 2 * t)) ** 4;
}

/** The extinction used for the pattern, which divides by it. */
export function patternExtinction(extinction: number): number {
  return Math.max(LEAST_EXTINCTION, extinction);
}

interface Anchor {
  readonly mag: number;
  readonly slope: number;
}

function measuredSlope(depressionDeg: number): number {
  return 1.518 - 0.114 * (depressionDeg - 5);
}

/** The cubic through two anchors three degrees apart, with their slopes (Hermite). */
function smoothBetween(from: Anchor, to: Anchor, degreesOn: number): number {
  const width = 3;
  const t = degreesOn / width;
  const rest = 1 - t;
  return (
    rest * rest * ((1 + 2 * t) * from.mag + t * width * from.slope) +
    t * t * ((1 + 2 * rest) * to.mag - rest * width * to.slope)
  );
}
