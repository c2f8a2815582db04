// Published and independently computed values for extinction, twilight, moonlight, night sky and visibility.
// darkness.json is made by darkness_reference.py, which works from the papers, not from this code.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import {
  airmass,
  BINOCULAR_10X50,
  createSkyLight,
  extinctionForElevation,
  type Instrument,
  limitingMagnitude,
  luminanceToMag,
  magToLuminance,
  moonIlluminatedFraction,
  NAKED_EYE,
  nakedEyeLimit,
  type SiteSky,
  setSkyLight,
  skyFromBortle,
  skyLuminance,
  visibilityMargin,
} from '#darkness';
import { ARCMIN, DEG, KM_PER_AU, refractionTrueToApparent, toRad } from '#sky';
import {
  type ContrastPair,
  FULL_PAIR,
  magToCandela,
  type View,
  viewLimit,
} from '../../libs/darkness/contrast';
import { moonScatter } from '../../libs/darkness/moonlight';
import {
  lowAirmass,
  schaeferTwilight,
  zenithTwilight,
  zenithTwilightMag,
} from '../../libs/darkness/twilight';

interface Table {
  readonly rows: readonly (readonly number[])[];
}

const expected = JSON.parse(readFileSync(join(__dirname, 'darkness.json'), 'utf8')) as Readonly<
  Record<'moonlight' | 'night' | 'twilight' | 'limits', Table> & {
    chain: { readonly skyMags: readonly number[]; readonly margins: readonly number[] };
  }
>;

const MEAN_MOON_AU = 384_400 / KM_PER_AU;
const NIGHT_SUN = -40 * DEG;
const MOON_DOWN = -30 * DEG;

interface Moon {
  readonly phaseAngleDeg: number;
  readonly zenithDistanceDeg: number;
  readonly separationDeg: number;
}

/** Brightness in nanolambert at a zenith distance on a domeless site, through the public functions. */
function skyAt(zenithMag: number, extinction: number, zenithDistanceDeg: number, moon: Moon | null): number {
  const site: SiteSky = { zenithMagPerArcsec2: zenithMag, extinctionMagPerAirmass: extinction, domes: [] };
  const light = createSkyLight();
  const moonAltitude = moon === null ? MOON_DOWN : toRad(90 - moon.zenithDistanceDeg);
  setSkyLight(light, site, NIGHT_SUN, 0, moonAltitude, toRad(moon?.phaseAngleDeg ?? 0), MEAN_MOON_AU);
  return skyLuminance(
    light,
    Math.cos(toRad(zenithDistanceDeg)),
    0,
    Math.cos(toRad(moon?.separationDeg ?? 90)),
  );
}

/** A sky so dark that it adds nothing. */
const NO_NIGHT = 60;

function magAdded(...mags: readonly number[]): number {
  return luminanceToMag(mags.reduce((sum, mag) => sum + magToLuminance(mag), 0));
}

/** Candela per square metre of a luminance in nanolambert. */
function candela(nanolambert: number): number {
  return (nanolambert * 1e-5) / Math.PI;
}

describe('airmass and extinction', () => {
  it('is Kasten & Young 1989 (our evaluation of the published formula)', () => {
    const values = [0, 5, 10, 30].map((altitudeDeg) => airmass(toRad(altitudeDeg)));
    expect(values[0]).toBeCloseTo(37.92, 3);
    expect(values[1]).toBeCloseTo(10.306, 3);
    expect(values[2]).toBeCloseTo(5.586, 3);
    expect(values[3]).toBeCloseTo(1.9943, 4);
  });

  it('agrees with Pickering 2002 (DIO 12) to 2.5% down to the horizon', () => {
    for (let h = 0; h <= 90; h += 0.5) {
      const pickering = 1 / Math.sin(toRad(h + 244 / (165 + 47 * h ** 1.1)));
      expect(Math.abs(airmass(toRad(h)) / pickering - 1)).toBeLessThan(0.025);
      if (h === 0) expect(pickering).toBeCloseTo(38.749, 3);
      if (h === 5) expect(pickering).toBeCloseTo(10.334, 3);
      if (h === 10) expect(pickering).toBeCloseTo(5.581, 3);
      if (h === 30) expect(pickering).toBeCloseTo(1.9932, 4);
    }
  });

  it('has Rozenberg 1966 for low twilight (our evaluation of the published formula)', () => {
    const values = [0, 5, 10, 30].map((altitudeDeg) => lowAirmass(Math.sin(toRad(altitudeDeg))));
    expect(values[0]).toBeCloseTo(40, 3);
    expect(values[1]).toBeCloseTo(10.337, 3);
    expect(values[2]).toBeCloseTo(5.639, 3);
    expect(values[3]).toBeCloseTo(1.9996, 4);
  });

  it('dims as the table of Green 1992 (ICQ 14, 55; airmass of Rozenberg)', () => {
    const dimming = (zenithDeg: number, heightKm: number): number =>
      extinctionForElevation(heightKm * 1000) * lowAirmass(Math.cos(toRad(zenithDeg)));
    expect([0, 1, 2].map((km) => dimming(60, km).toFixed(2))).toEqual(['0.56', '0.41', '0.32']);
    expect(dimming(80, 0).toFixed(2)).toBe('1.59');
  });

  it('lifts 33.246 arcmin by 24.618 arcmin (Meeus, example 16.a)', () => {
    expect(refractionTrueToApparent(33.246 * ARCMIN) / ARCMIN).toBeCloseTo(24.618, 2);
  });
});

describe('twilight', () => {
  it('is Patat, Ugolnikov & Postylyakov 2006 from 6 to 15 degrees (our evaluation of their table 1)', () => {
    const values = [6, 8, 10, 12, 15].map((depression) => zenithTwilightMag(depression).toFixed(2));
    expect(values).toEqual(['13.30', '15.88', '18.00', '19.67', '21.32']);
  });

  it('gives that sky back when added to the night it was measured in', () => {
    for (const depression of [6, 8, 10, 12, 15]) {
      const total = zenithTwilight(toRad(-depression)) + magToLuminance(21.61);
      expect(luminanceToMag(total)).toBeCloseTo(zenithTwilightMag(depression), 9);
    }
  });

  it('lies between the two sites of Koomen et al. 1952 within the scatter of Patat', () => {
    // JOSA 42, 353 (from a secondary transcription): zenith, cd/m2.
    const depressions = [0, 3, 6, 9, 12, 15];
    const mountain = [86, 10.8, 0.237, 8.1e-3, 8.2e-4, 2.2e-4];
    const lowland = [161, 21.5, 0.65, 1.6e-2, 1.3e-3, 4.3e-4];
    const scatter = 10 ** (0.4 * 0.18);
    depressions.forEach((depression, i) => {
      const luminance = candela(zenithTwilight(toRad(-depression)) + magToLuminance(21.61));
      expect(luminance).toBeGreaterThan(mountain[i]! / scatter);
      expect(luminance).toBeLessThan(lowland[i]! * scatter);
    });
  });

  it('has the formula of Schaefer 1998 (our evaluation at the zenith, extinction 0.2)', () => {
    const zenith = (sunDeg: number): string =>
      luminanceToMag(schaeferTwilight(toRad(sunDeg), 0, toRad(90 - sunDeg), 0.2)).toFixed(2);
    expect([-6, -9, -12].map(zenith)).toEqual(['13.65', '16.68', '19.71']);
  });

  it('spreads over the sky as an independent evaluation of Schaefer 1998', () => {
    const light = createSkyLight();
    expect(expected.twilight.rows).toHaveLength(240);
    for (const [sun, altitude, away, extinction, timesZenith] of expected.twilight.rows) {
      const site = { zenithMagPerArcsec2: NO_NIGHT, extinctionMagPerAirmass: extinction!, domes: [] };
      setSkyLight(light, site, toRad(sun!), toRad(260), MOON_DOWN, 0, MEAN_MOON_AU);
      const there = skyLuminance(light, Math.sin(toRad(altitude!)), toRad(260 + away!), 0);
      expect(there / zenithTwilight(toRad(sun!)) / timesZenith!).toBeCloseTo(1, 9);
    }
  });
});

describe('moonlight and the dark sky off the zenith', () => {
  it('agrees with an independent evaluation of Krisciunas & Schaefer 1991 within 1%', () => {
    expect(expected.moonlight.rows).toHaveLength(960);
    for (const [phase, separation, zenith, moonZenith, extinction, nL] of expected.moonlight.rows) {
      const moon = { phaseAngleDeg: phase!, separationDeg: separation!, zenithDistanceDeg: moonZenith! };
      expect(Math.abs(skyAt(NO_NIGHT, extinction!, zenith!, moon) / nL! - 1)).toBeLessThan(0.01);
    }
    expect(expected.night.rows).toHaveLength(72);
    for (const [mag, zenith, extinction, nL] of expected.night.rows) {
      expect(Math.abs(skyAt(mag!, extinction!, zenith!, null) / nL! - 1)).toBeLessThan(0.01);
    }
  });

  it('is 389.5 nL, 19.855 mag/arcsec2, in the example of the specsim documentation', () => {
    const moon = { phaseAngleDeg: 45, zenithDistanceDeg: 70, separationDeg: 50 };
    const luminance = skyAt(NO_NIGHT, 0.15, 20, moon);
    expect(luminance).toBeCloseTo(389.5, 1);
    expect(luminanceToMag(luminance)).toBeCloseTo(19.855, 3);
  });

  it('brightens a 79 nL sky by 3.018, 1.615 and 0.940 mag (our evaluation)', () => {
    const cases = [
      [0, 1338.6, -3.018],
      [60, 303.3, -1.615],
      [90, 121.8, -0.94],
    ] as const;
    const dark = skyAt(luminanceToMag(79), 0.172, 30, null);
    for (const [phaseAngleDeg, nL, change] of cases) {
      const moon = { phaseAngleDeg, zenithDistanceDeg: 45, separationDeg: 60 };
      const total = skyAt(luminanceToMag(79), 0.172, 30, moon);
      expect(total - dark).toBeCloseTo(nL, 1);
      expect(-2.5 * Math.log10(total / dark)).toBeCloseTo(change, 3);
    }
  });

  it('takes the larger branch near the Moon, where the published two differ by 14%', () => {
    const at = (deg: number): number => moonScatter(Math.cos(toRad(deg)));
    const rayleigh = (deg: number): number => 10 ** 5.36 * (1.06 + Math.cos(toRad(deg)) ** 2);
    expect((rayleigh(10) + 6.2e7 / 100) / at(10)).toBeCloseTo(0.86, 2);
    expect(at(9.999) / at(10.001)).toBeCloseTo(1, 3);
    expect(at(9)).toBeCloseTo(rayleigh(9) + 10 ** (6.15 - 9 / 40), -1);
    expect(at(5)).toBeCloseTo(rayleigh(5) + 6.2e7 / 25, -1);
  });

  it('lights 0.6786 of the Moon at a phase angle of 69.076 degrees (Meeus, example 48.a)', () => {
    expect(moonIlluminatedFraction(toRad(69.076))).toBeCloseTo(0.6786, 4);
  });
});

describe('night-sky base', () => {
  it('converts 21.83 mag/arcsec2 to 63.2 nL and 2.00e-4 cd/m2', () => {
    expect(magToLuminance(21.83)).toBeCloseTo(63.2, 1);
    expect(candela(magToLuminance(21.83)) * 1e4).toBeCloseTo(2.0, 1);
    expect(magToCandela(21.83) * 1e4).toBeCloseTo(2.0, 2);
  });

  it('keeps the three conversions in use within half a percent of each other', () => {
    const meters = 1.08e5 * 10 ** (-0.4 * 20);
    expect(candela(magToLuminance(20)) / meters).toBeCloseTo(1.004, 3);
    expect(magToCandela(20) / meters).toBeCloseTo(0.997, 3);
  });

  it('adds skies as light', () => {
    expect(magAdded(21.5, 21.5)).toBeCloseTo(20.747, 3);
    expect(magAdded(22, 20)).toBeCloseTo(19.84, 3);
  });

  it('places each Bortle class between its limits (common practice)', () => {
    const limits = [21.99, 21.89, 21.69, 20.49, 19.5, 18.94, 18.38];
    limits.forEach((limit, i) => {
      expect(skyFromBortle(i + 1)).toBeGreaterThan(limit);
      if (i > 0) expect(skyFromBortle(i + 1)).toBeLessThan(limits[i - 1]!);
    });
    expect(skyFromBortle(8)).toBeLessThan(18.38);
    expect(skyFromBortle(9)).toBeLessThan(skyFromBortle(8));
  });
});

/** Crumey's pair for dark skies alone (eqs 26 and 37), in which most of his published numbers are worked. */
const DARK_PAIR: ContrastPair = {
  small: (x) => (6.505e-4 * x - 8.461e-4) ** 2,
  large: (x) => 7.633e-3 * x - 7.174e-3,
};

function eye(fieldFactor: number, pupilMm = 7): View {
  return { apertureMm: pupilMm, magnification: 1, dimming: 1, observerFactor: fieldFactor, pupilMm };
}

function discArea(diameterArcmin: number): number {
  return (Math.PI / 4) * (diameterArcmin * ARCMIN) ** 2;
}

/** Magnitude per square arcsecond of the faintest boundless glow on a sky, from the limit of a huge disc. */
function faintestGlow(pair: ContrastPair, mag: number): number {
  const area = 1e12;
  return viewLimit(pair, eye(1), magToCandela(mag), area) + 2.5 * Math.log10(area * 206264.806 ** 2);
}

describe('visibility, Crumey 2014', () => {
  const view200: View = {
    apertureMm: 200,
    magnification: 50,
    dimming: 1.33,
    observerFactor: 2 * Math.SQRT2,
    pupilMm: 7,
  };

  it('has the paper’s limits on a 2e-4 cd/m2 sky', () => {
    expect(viewLimit(DARK_PAIR, eye(1), 2e-4, 0).toFixed(2)).toBe('6.93');
    expect(viewLimit(DARK_PAIR, eye(2), 2e-4, 0).toFixed(2)).toBe('6.18');
    expect(12.58 - 2.5 * Math.log10(2e-4 * DARK_PAIR.large(2e-4 ** -0.25))).toBeCloseTo(24.94, 2);
    expect(faintestGlow(DARK_PAIR, 12.58 - 2.5 * Math.log10(2e-4))).toBeCloseTo(24.94, 1);
  });

  it('has the paper’s differences between the limits of points and of glows', () => {
    const large = (mag: number): number =>
      12.58 - 2.5 * Math.log10(magToCandela(mag) * DARK_PAIR.large(magToCandela(mag) ** -0.25));
    const point = (mag: number): number => viewLimit(DARK_PAIR, eye(1), magToCandela(mag), 0);
    expect([22, 21.5, 20].map((mag) => (large(mag) - point(mag)).toFixed(2))).toEqual([
      '18.06',
      '17.90',
      '17.40',
    ]);
    expect((point(22) - point(21)).toFixed(2)).toBe('0.40');
  });

  it('has the paper’s Ricco radius of 37.6 arcmin at 21.83 mag/arcsec2', () => {
    const x = magToCandela(21.83) ** -0.25;
    expect(Math.sqrt(DARK_PAIR.small(x) / DARK_PAIR.large(x) / Math.PI) / ARCMIN).toBeCloseTo(37.6, 1);
  });

  it('reaches 12.7 with 100 mm at high power, as the paper: one eye, field factor 2', () => {
    const view = {
      apertureMm: 100,
      magnification: 300,
      dimming: 1.33,
      observerFactor: 2 * Math.SQRT2,
      pupilMm: 7,
    };
    expect(viewLimit(DARK_PAIR, view, magToCandela(21.83), 0).toFixed(1)).toBe('12.7');
  });

  it('has our evaluation for 200 mm at 50 times, points and a 10 arcmin disc', () => {
    const skies = [21.83, 21, 20, 18].map(magToCandela);
    const points = skies.map((sky) => viewLimit(DARK_PAIR, view200, sky, 0).toFixed(2));
    const discs = skies.map((sky) => viewLimit(DARK_PAIR, view200, sky, discArea(10)).toFixed(2));
    expect(points).toEqual(['13.42', '13.06', '12.65', '11.92']);
    expect(discs).toEqual(['9.54', '8.96', '8.27', '6.91']);
  });

  it('has our evaluation for a 30 arcmin comet and the naked eye', () => {
    const limits = [21.83, 20].map((mag) =>
      viewLimit(DARK_PAIR, eye(2), magToCandela(mag), discArea(30)).toFixed(2),
    );
    expect(limits).toEqual(['5.66', '4.80']);
  });

  it('keeps its two pairs as far apart as they are known to be', () => {
    const apart = (mag: number): number =>
      Math.abs(
        viewLimit(FULL_PAIR, eye(2), magToCandela(mag), 0) -
          viewLimit(DARK_PAIR, eye(2), magToCandela(mag), 0),
      );
    expect(apart(21.8)).toBeCloseTo(0.01, 2);
    expect(apart(19)).toBeCloseTo(0.04, 2);
    expect(apart(17)).toBeCloseTo(0.08, 2);
  });

  it('agrees with an independent solution of the threshold equation over instruments, skies and sizes', () => {
    expect(expected.limits.rows).toHaveLength(504);
    for (const row of expected.limits.rows) {
      const [apertureMm, magnification, dimming, pupilMm, observerFactor, sky, diameter, limit] = row as [
        number,
        number,
        number,
        number,
        number,
        number,
        number,
        number,
      ];
      const view = { apertureMm, magnification, dimming, observerFactor, pupilMm };
      expect(viewLimit(FULL_PAIR, view, magToCandela(sky), discArea(diameter))).toBeCloseTo(limit, 6);
    }
  });

  it('offers the best of an instrument’s powers', () => {
    const instrument: Instrument = {
      name: 'Test reflector',
      kind: 'telescope',
      apertureMm: 200,
      magnifications: [25, 50, 200],
      eyes: 1,
      transmission: 1 / 1.33,
    };
    const alone = instrument.magnifications.map((magnification) =>
      viewLimit(FULL_PAIR, { ...view200, magnification }, magToCandela(21), discArea(10)),
    );
    const best = limitingMagnitude(instrument, 21, 10, 10, { pupilMm: 7, fieldFactor: 2 });
    expect(best).toBeCloseTo(Math.max(...alone), 12);
  });
});

describe('visibility, Schaefer 1990', () => {
  it('has our evaluation of the zero-extinction shorthand, and agrees with it by night vision', () => {
    const shorthand = (mag: number): number => 7.93 - 5 * Math.log10(10 ** (4.316 - mag / 5) + 1);
    expect([22, 21, 20, 18].map((mag) => shorthand(mag).toFixed(2))).toEqual([
      '6.62',
      '6.12',
      '5.49',
      '3.97',
    ]);
    for (const mag of [22, 21, 20]) {
      expect(Math.abs(nakedEyeLimit(magToLuminance(mag), 0) - shorthand(mag))).toBeLessThan(0.002);
    }
  });

  it('follows the published constants on both sides of 1500 nL', () => {
    const illuminance = (logC: number, logK: number, nL: number): number =>
      -16.57 - 2.5 * (logC + 2 * Math.log10(1 + Math.sqrt(10 ** logK * nL)));
    expect(nakedEyeLimit(1499, 0.3)).toBeCloseTo(illuminance(-9.8, -1.9, 1499) - 0.3, 9);
    expect(nakedEyeLimit(1501, 0.3)).toBeCloseTo(illuminance(-8.35, -5.9, 1501) - 0.3, 9);
  });
});

describe('the whole chain', () => {
  // Zenith 21.3, extinction 0.25; a comet of magnitude 7.5 and 8 arcmin at zenith distance 60 in a 10×50, with
  // and without a half-lit Moon.
  const checks = { pupilMm: 7, fieldFactor: 2 };
  const skies = [
    skyAt(21.3, 0.25, 60, null),
    skyAt(21.3, 0.25, 60, { phaseAngleDeg: 90, zenithDistanceDeg: 50, separationDeg: 70 }),
  ].map(luminanceToMag);
  const extinction = 0.25 * airmass(toRad(30));

  it('has our evaluation of the skies and, with the dark pair, of the margins', () => {
    expect(skies[0]).toBeCloseTo(20.83, 2);
    expect(skies[1]).toBeCloseTo(19.96, 2);
    expect(7.5 + extinction).toBeCloseTo(8.0, 2);
    const view = { apertureMm: 50, magnification: 10, dimming: 1.25, observerFactor: 2, pupilMm: 7 };
    const margins = skies.map(
      (sky) => viewLimit(DARK_PAIR, view, magToCandela(sky), discArea(8)) - 7.5 - extinction,
    );
    expect(margins.map((margin) => margin.toFixed(2))).toEqual(['0.87', '0.38']);
  });

  it('gives the margins of an independent evaluation with the full pair', () => {
    const comet = { magnitude: 7.5, majorArcmin: 8, minorArcmin: 8 };
    expect(BINOCULAR_10X50).toMatchObject({ transmission: 0.8, eyes: 2, magnifications: [10] });
    skies.forEach((sky, i) => {
      expect(sky).toBeCloseTo(expected.chain.skyMags[i]!, 6);
      const margin = visibilityMargin(BINOCULAR_10X50, comet, sky, extinction, checks);
      expect(margin).toBeCloseTo(expected.chain.margins[i]!, 6);
    });
  });

  it('shows the naked eye a star of the limit itself with no margin', () => {
    const limit = limitingMagnitude(NAKED_EYE, 21, 0, 0);
    expect(visibilityMargin(NAKED_EYE, { magnitude: limit, majorArcmin: 0, minorArcmin: 0 }, 21, 0)).toBe(0);
  });
});
