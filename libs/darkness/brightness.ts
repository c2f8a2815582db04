import { toDeg } from '#sky';
import { magToLuminance } from './luminance';
import { FADING, moonScatter, moonlightStrength, skyAirmass } from './moonlight';
import { lowAirmass, patternExtinction, patternShare, patternSunAltitude, zenithTwilight } from './twilight';

/** A town's glow over a site's horizon. */
export interface LightDome {
  /** Middle of the dome, rad from north through east. */
  readonly azimuthRad: number;
  /** Width in azimuth, rad, over which the dome adds at least half of what it adds in its middle. */
  readonly widthRad: number;
  /** Magnitudes by which the horizon under the dome's middle is brighter than the site's sky there. */
  readonly brighteningMag: number;
}

/** What a site's sky is like on a clear, moonless night. */
export interface SiteSky {
  /** At the zenith, V mag/arcsec2, as a sky meter reads it: town light in, never extincted again. */
  readonly zenithMagPerArcsec2: number;
  readonly extinctionMagPerAirmass: number;
  readonly domes: readonly LightDome[];
}

/**
 * The light on a site's sky at one instant, prepared so that `skyLuminance` costs a few operations for each
 * target. Made once by `createSkyLight` and filled again and again by `setSkyLight`; its numbers are for
 * those two only.
 */
export interface SkyLight {
  site: SiteSky | null;
  /**
   * Four numbers a dome: cosine and sine of its azimuth, narrowness, brightening as a share of the night
   * sky.
   */
  domes: Float64Array;
  /** exp(fading * airmass) is the share of light that comes through. */
  fading: number;
  night: number;
  moon: number;
  twilight: number;
  twilightEven: number;
  twilightFading: number;
  twilightTilt: number;
  sunSin: number;
  sunCosNorth: number;
  sunCosEast: number;
}

/** An unfilled sky; fill it with `setSkyLight` before use. */
export function createSkyLight(): SkyLight {
  return {
    site: null,
    domes: new Float64Array(0),
    fading: 0,
    night: 0,
    moon: 0,
    twilight: 0,
    twilightEven: 0,
    twilightFading: 0,
    twilightTilt: 0,
    sunSin: 0,
    sunCosNorth: 0,
    sunCosEast: 0,
  };
}

/**
 * Fills `light` for one site and instant. Altitudes are airless and topocentric, azimuths from north through
 * east, all in radians; the phase angle is 0 at full Moon; the Moon's distance in au, also topocentric.
 */
export function setSkyLight(
  light: SkyLight,
  site: SiteSky,
  sunAltitudeRad: number,
  sunAzimuthRad: number,
  moonAltitudeRad: number,
  moonPhaseAngleRad: number,
  moonDistanceAu: number,
): void {
  if (light.site !== site) setSite(light, site);
  const extinction = site.extinctionMagPerAirmass;
  light.moon = moonlightStrength(moonAltitudeRad, moonPhaseAngleRad, moonDistanceAu, extinction);
  const zenith = zenithTwilight(sunAltitudeRad);
  if (zenith === 0) {
    light.twilight = 0;
    light.twilightEven = 0;
    return;
  }
  // The pattern is Schaefer's brightness in a direction over that at the zenith; all that does not depend on
  // the direction is worked into one factor here.
  const clear = patternExtinction(extinction);
  const sunHeld = patternSunAltitude(sunAltitudeRad);
  const share = patternShare(sunAltitudeRad);
  const overZenith = 1 - Math.exp(FADING * clear * lowAirmass(1));
  light.twilight = (zenith * share * (0.5 * Math.PI - sunHeld)) / overZenith;
  light.twilightEven = zenith * (1 - share);
  light.twilightFading = FADING * clear;
  light.twilightTilt = (-FADING * toDeg(1)) / (360 * clear);
  light.sunSin = Math.sin(sunHeld);
  light.sunCosNorth = Math.cos(sunHeld) * Math.cos(sunAzimuthRad);
  light.sunCosEast = Math.cos(sunHeld) * Math.sin(sunAzimuthRad);
}

/**
 * Brightness of the sky in a direction, in nanolambert: the night sky with its town light, moonlight and
 * twilight, added as light. `sinAltitude` is the sine of the altitude (below the horizon counts as the
 * horizon), `azimuthRad` runs from north through east, `cosMoonSeparation` is the cosine of the topocentric
 * angle from the Moon.
 *
 * Night off the zenith and moonlight: Krisciunas & Schaefer 1991. Twilight: `zenithTwilight` spread over the
 * sky by the pattern of Schaefer 1998, as published with the Sun 3 to 12 degrees down; with the Sun deeper
 * the pattern of 12 degrees is kept, with the Sun higher that of 3 degrees fades into an even day. Domes are
 * our model: a dome adds its share of the night sky at that height, falling off with azimuth to half at the
 * edge of its width, and with height as (1 - sin h)^3, to an eighth at 30 degrees and nothing at the zenith,
 * where the site's measured value holds.
 */
export function skyLuminance(
  light: SkyLight,
  sinAltitude: number,
  azimuthRad: number,
  cosMoonSeparation: number,
): number {
  const sine = sinAltitude > 1 ? 1 : sinAltitude > 0 ? sinAltitude : 0;
  const inAir = skyAirmass(sine);
  const through = Math.exp(light.fading * inAir);
  let night = light.night * inAir * through;
  const { domes } = light;
  const hasTwilight = light.twilight > 0;
  let north = 0;
  let east = 0;
  if (hasTwilight || domes.length > 0) {
    north = Math.cos(azimuthRad);
    east = Math.sin(azimuthRad);
  }
  if (domes.length > 0) {
    const low = 1 - sine;
    const height = low * low * low;
    let glow = 0;
    for (let i = 0; i < domes.length; i += 4) {
      const away = 1 + domes[i + 2]! * (1 - north * domes[i]! - east * domes[i + 1]!);
      glow += domes[i + 3]! / (away * away);
    }
    night *= 1 + glow * height;
  }
  let total = night + light.twilightEven;
  if (light.moon > 0) total += light.moon * moonScatter(cosMoonSeparation) * (1 - through);
  if (hasTwilight) {
    const cosSun =
      sine * light.sunSin +
      Math.sqrt(1 - sine * sine) * (north * light.sunCosNorth + east * light.sunCosEast);
    const scattered = 1 - Math.exp(light.twilightFading * lowAirmass(sine));
    const tilt = Math.exp(light.twilightTilt * Math.acos(sine));
    // The antisolar point may round to just below -1.
    total += (light.twilight * tilt * scattered) / Math.acos(cosSun > -1 ? cosSun : -1);
  }
  return total;
}

/** Squared-Lorentzian falloff with the chord: this makes it one half at half the width from the middle. */
const HALF = Math.SQRT2 - 1;

function setSite(light: SkyLight, site: SiteSky): void {
  const { extinctionMagPerAirmass: extinction, domes } = site;
  light.site = site;
  light.fading = FADING * extinction;
  // A sky measured at the zenith has one airmass of dimming in it already.
  light.night = magToLuminance(site.zenithMagPerArcsec2) * Math.exp(-FADING * extinction);
  light.domes = new Float64Array(4 * domes.length);
  domes.forEach((dome, i) => {
    const halfWidth = 0.5 * dome.widthRad;
    light.domes[4 * i] = Math.cos(dome.azimuthRad);
    light.domes[4 * i + 1] = Math.sin(dome.azimuthRad);
    light.domes[4 * i + 2] = HALF / (1 - Math.cos(halfWidth));
    light.domes[4 * i + 3] = Math.exp(-FADING * dome.brighteningMag) - 1;
  });
}
