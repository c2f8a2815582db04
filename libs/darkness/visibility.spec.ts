import { KM_PER_AU, toRad } from '#sky';
import { airmass } from './airmass';
import { createSkyLight, setSkyLight, type SiteSky, skyLuminance } from './brightness';
import { BINOCULAR_10X50, type Instrument, InstrumentError, NAKED_EYE, TELESCOPE_200 } from './instrument';
import { luminanceToMag } from './luminance';
import { limitingMagnitude, nakedEyeLimit, ovalArea, telescopeReach, visibilityMargin } from './visibility';

const INSTRUMENTS = [NAKED_EYE, BINOCULAR_10X50, TELESCOPE_200] as const;
const point = (magnitude: number) => ({ magnitude, majorArcmin: 0, minorArcmin: 0 });

describe('limits', () => {
  it.each(INSTRUMENTS)('fade with a brighter sky for $name', (instrument) => {
    for (const size of [0, 1, 20, 120]) {
      for (let mag = 2; mag < 23; mag += 0.05) {
        const gain =
          limitingMagnitude(instrument, mag + 0.05, size, size) -
          limitingMagnitude(instrument, mag, size, size);
        // The published law for points turns back by 0.03 mag between about 13.5 and 17 mag/arcsec2.
        expect(gain).toBeGreaterThan(-0.005);
      }
    }
  });

  it.each(INSTRUMENTS)('turn back by no more than 0.05 mag anywhere for $name', (instrument) => {
    let highest = -Infinity;
    for (let mag = 2; mag < 23; mag += 0.05) {
      const limit = telescopeReach(instrument, mag);
      expect(limit).toBeGreaterThan(highest - 0.05);
      highest = Math.max(highest, limit);
    }
  });

  it('fade with size and grow with the instrument', () => {
    for (const instrument of INSTRUMENTS) {
      const limits = [0, 1, 5, 30, 120].map((size) => limitingMagnitude(instrument, 21, size, size));
      expect([...limits].sort((a, b) => b - a)).toEqual(limits);
    }
    const [eye, binocular, telescope] = INSTRUMENTS.map((instrument) => telescopeReach(instrument, 21));
    expect(eye).toBeLessThan(binocular!);
    expect(binocular).toBeLessThan(telescope!);
  });

  it('are better for keen observers and for two eyes', () => {
    const keen = limitingMagnitude(BINOCULAR_10X50, 21, 5, 5, { pupilMm: 6, fieldFactor: 1.4 });
    expect(keen - limitingMagnitude(BINOCULAR_10X50, 21, 5, 5)).toBeCloseTo(2.5 * Math.log10(2 / 1.4), 9);
    const one = telescopeReach({ ...BINOCULAR_10X50, eyes: 1 }, 21);
    expect(telescopeReach(BINOCULAR_10X50, 21) - one).toBeCloseTo(2.5 * Math.log10(Math.SQRT2), 9);
  });

  it('have no jump at 12 mag/arcsec2, where instruments begin to fall short', () => {
    expect(telescopeReach(TELESCOPE_200, 11.999)).toBeCloseTo(telescopeReach(TELESCOPE_200, 12.001), 2);
  });

  it('take an oval by its area, whichever side is named first', () => {
    expect(ovalArea(20, 5)).toBeCloseTo(ovalArea(10, 10), 15);
    expect(ovalArea(5, 20)).toBe(ovalArea(20, 5));
    expect(ovalArea(70, 2)).toBeCloseTo(ovalArea(70, 10), 15);
    expect(ovalArea(14, 0)).toBeCloseTo(ovalArea(14, 2), 15);
    expect(ovalArea(0, 0)).toBe(0);
  });

  it('have their best power by the target: low for wide glows, high for stars', () => {
    const at = (power: number, size: number): number =>
      limitingMagnitude({ ...TELESCOPE_200, magnifications: [power] }, 20, size, size);
    expect(at(200, 0)).toBeGreaterThan(at(40, 0));
    expect(at(40, 60)).toBeGreaterThan(at(200, 60));
  });
});

describe('instruments no one can look through', () => {
  const refused = (change: Partial<Instrument>): InstrumentError => {
    try {
      telescopeReach({ ...TELESCOPE_200, ...change }, 21);
    } catch (error) {
      if (error instanceof InstrumentError) return error;
    }
    throw new Error('expected an InstrumentError');
  };

  it('are refused with the field, its value and what would be right', () => {
    expect(refused({ apertureMm: 0 })).toMatchObject({ field: 'apertureMm', value: 0 });
    expect(refused({ magnifications: [] }).message).toBe(
      'magnifications was []; give at least one power, each more than 0.',
    );
    expect(refused({ magnifications: [50, -1] }).field).toBe('magnifications');
    expect(refused({ transmission: 75 }).right).toMatch(/at most 1/);
    expect(refused({ transmission: NaN }).field).toBe('transmission');
  });

  it('do not include the naked eye, whatever its aperture is said to be', () => {
    expect(telescopeReach({ ...NAKED_EYE, apertureMm: 0, magnifications: [] }, 21)).toBe(
      telescopeReach(NAKED_EYE, 21),
    );
  });
});

describe('margins', () => {
  it('are the limit less the dimmed magnitude', () => {
    const galaxy = { magnitude: 9, majorArcmin: 10, minorArcmin: 6 };
    expect(visibilityMargin(TELESCOPE_200, galaxy, 20.5, 0.4)).toBeCloseTo(
      limitingMagnitude(TELESCOPE_200, 20.5, 10, 6) - 9.4,
      12,
    );
  });

  it('take the core of a condensed comet where that shows better', () => {
    const comet = { magnitude: 8.5, majorArcmin: 15, minorArcmin: 15 };
    const whole = visibilityMargin(BINOCULAR_10X50, comet, 19, 0.3);
    const condensed = { ...comet, coreArcmin: 2, coreMagnitude: 9 };
    const core = visibilityMargin(BINOCULAR_10X50, condensed, 19, 0.3);
    expect(core).toBeGreaterThan(whole);
    expect(core).toBeCloseTo(limitingMagnitude(BINOCULAR_10X50, 19, 2, 2) - 9.3, 12);
    expect(visibilityMargin(BINOCULAR_10X50, { ...condensed, coreMagnitude: 14 }, 19, 0.3)).toBe(whole);
    const star = { ...comet, coreMagnitude: 9.2 };
    expect(visibilityMargin(BINOCULAR_10X50, star, 19, 0.3)).toBeCloseTo(
      telescopeReach(BINOCULAR_10X50, 19) - 9.5,
      12,
    );
  });
});

describe('the naked eye after Schaefer 1990', () => {
  it('loses what the air takes, and sees less on a brighter sky', () => {
    expect(nakedEyeLimit(60, 0.4)).toBeCloseTo(nakedEyeLimit(60, 0) - 0.4, 12);
    expect(nakedEyeLimit(600, 0)).toBeLessThan(nakedEyeLimit(60, 0));
    expect(nakedEyeLimit(6e6, 0)).toBeLessThan(nakedEyeLimit(6e4, 0));
  });
});

describe('what everyone who shows the sky knows (common practice)', () => {
  const site: SiteSky = { zenithMagPerArcsec2: 21.3, extinctionMagPerAirmass: 0.25, domes: [] };
  const light = createSkyLight();

  /** Margin of a target at a height and azimuth from the Sun, the Sun so far down, no Moon. */
  function margin(
    instrument: Instrument,
    target: { magnitude: number; majorArcmin: number; minorArcmin: number },
    downDeg: number,
    altitudeDeg: number,
    fromSunDeg: number,
  ): number {
    setSkyLight(light, site, toRad(-downDeg), 0, -1, 0, 384_400 / KM_PER_AU);
    const altitude = toRad(altitudeDeg);
    const sky = luminanceToMag(skyLuminance(light, Math.sin(altitude), toRad(fromSunDeg), 0));
    return visibilityMargin(instrument, target, sky, 0.25 * airmass(altitude));
  }

  it('Venus shows to the naked eye at civil dusk, even low over the sunset', () => {
    expect(margin(NAKED_EYE, point(-4), 6, 15, 0)).toBeGreaterThan(1);
    expect(margin(NAKED_EYE, point(-4), 6, 8, 20)).toBeGreaterThan(0);
  });

  it('Jupiter shows to the naked eye before civil dusk, first-magnitude stars high up at civil dusk', () => {
    expect(margin(NAKED_EYE, point(-2.2), 4, 40, 120)).toBeGreaterThan(0);
    expect(margin(NAKED_EYE, point(0.9), 6, 60, 120)).toBeGreaterThan(0);
    expect(margin(NAKED_EYE, point(0.9), 1, 60, 120)).toBeLessThan(0);
  });

  it('the Pole Star waits until after civil dusk, third magnitude until near nautical dusk', () => {
    expect(margin(NAKED_EYE, point(2), 4, 45, 90)).toBeLessThan(0);
    expect(margin(NAKED_EYE, point(2), 9, 45, 90)).toBeGreaterThan(0);
    expect(margin(NAKED_EYE, point(3.5), 6, 45, 90)).toBeLessThan(0);
    expect(margin(NAKED_EYE, point(3.5), 11, 45, 90)).toBeGreaterThan(0);
  });

  it('Saturn shows in a telescope half an hour after sunset, but not by day', () => {
    const saturn = { magnitude: 0.7, majorArcmin: 0.6, minorArcmin: 0.3 };
    expect(margin(TELESCOPE_200, saturn, 4, 25, 100)).toBeGreaterThan(0.5);
    expect(margin(TELESCOPE_200, saturn, -10, 25, 100)).toBeLessThan(0);
  });

  it('a telescope of 200 mm shows stars to third or fourth magnitude by day', () => {
    const limit = telescopeReach(TELESCOPE_200, 4);
    expect(limit).toBeGreaterThan(2.5);
    expect(limit).toBeLessThan(4.5);
  });

  it('a galaxy of eighth magnitude stays hidden until after nautical dusk, and shows at night', () => {
    const galaxy = { magnitude: 8, majorArcmin: 20, minorArcmin: 10 };
    for (const downDeg of [4, 6, 8, 10, 12]) {
      for (const instrument of INSTRUMENTS) {
        expect(margin(instrument, galaxy, downDeg, 50, 90)).toBeLessThan(0);
      }
    }
    expect(margin(TELESCOPE_200, galaxy, 18, 50, 90)).toBeGreaterThan(0);
    expect(margin(NAKED_EYE, galaxy, 18, 50, 90)).toBeLessThan(0);
  });
});
