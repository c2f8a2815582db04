import fc from 'fast-check';
import { KM_PER_AU, toRad } from '#sky';
import { createSkyLight, type LightDome, setSkyLight, type SiteSky, skyLuminance } from './brightness';
import { luminanceToMag, magToLuminance } from './luminance';

const MEAN_MOON = 384_400 / KM_PER_AU;
const town: LightDome = { azimuthRad: toRad(120), widthRad: toRad(50), brighteningMag: 1.5 };

function site(domes: readonly LightDome[] = [], extinction = 0.22): SiteSky {
  return { zenithMagPerArcsec2: 21.3, extinctionMagPerAirmass: extinction, domes };
}

interface Sky {
  readonly sunDeg?: number;
  readonly moonDeg?: number;
  readonly phaseDeg?: number;
}

/** Brightness in mag/arcsec2 over a site, the Sun in the west. */
function over(place: SiteSky, { sunDeg = -40, moonDeg = -40, phaseDeg = 60 }: Sky = {}) {
  const light = createSkyLight();
  setSkyLight(light, place, toRad(sunDeg), toRad(270), toRad(moonDeg), toRad(phaseDeg), MEAN_MOON);
  return (altitudeDeg: number, azimuthDeg: number, separationDeg = 60): number =>
    luminanceToMag(
      skyLuminance(light, Math.sin(toRad(altitudeDeg)), toRad(azimuthDeg), Math.cos(toRad(separationDeg))),
    );
}

describe('a moonless night', () => {
  it('is the measured value at the zenith, domes or not', () => {
    expect(over(site())(90, 0)).toBeCloseTo(21.3, 9);
    expect(over(site([town]))(90, 120)).toBeCloseTo(21.3, 9);
  });

  it('brightens towards the horizon, the same all round', () => {
    const sky = over(site());
    expect(sky(20, 10)).toBeLessThan(sky(60, 10));
    expect(sky(20, 10)).toBe(sky(20, 250));
    expect(sky(-3, 0)).toBe(sky(0, 0));
  });
});

describe('a light dome', () => {
  it('adds its brightening at the horizon under its middle', () => {
    // The published conversion rounds 0.4 ln 10 in its sixth digit.
    expect(over(site())(0, 120) - over(site([town]))(0, 120)).toBeCloseTo(1.5, 4);
  });

  it('adds half as much light at the edge of its width, an eighth 30 degrees up', () => {
    const added = (altitudeDeg: number, azimuthDeg: number): number =>
      magToLuminance(over(site([town]))(altitudeDeg, azimuthDeg)) -
      magToLuminance(over(site())(altitudeDeg, azimuthDeg));
    expect(added(0, 145) / added(0, 120)).toBeCloseTo(0.5, 9);
    expect(added(0, 95) / added(0, 120)).toBeCloseTo(0.5, 9);
    const night = magToLuminance(over(site())(30, 120));
    expect(added(30, 120) / night).toBeCloseTo((10 ** 0.6 - 1) / 8, 6);
    expect(added(0, 300)).toBeLessThan(0.02 * added(0, 120));
  });

  it('adds up with others, and a used sky can be turned to another site', () => {
    const light = createSkyLight();
    const at = (place: SiteSky): number => {
      setSkyLight(light, place, -1, 0, -1, 0, MEAN_MOON);
      return skyLuminance(light, 0.2, toRad(100), 0);
    };
    const second: LightDome = { ...town, azimuthRad: toRad(80) };
    const [none, one, other, both] = [site(), site([town]), site([second]), site([town, second])].map(at);
    expect(both! - none!).toBeCloseTo(one! - none! + (other! - none!), 9);
    expect(at(site())).toBe(none);
  });
});

describe('moonlight', () => {
  it('adds nothing while the Moon is down and more the fuller it is', () => {
    expect(over(site(), { moonDeg: -5, phaseDeg: 0 })(50, 0)).toBe(over(site())(50, 0));
    const [full, half, thin] = [0, 90, 140].map((phaseDeg) => over(site(), { moonDeg: 40, phaseDeg })(50, 0));
    expect(full).toBeLessThan(half!);
    expect(half).toBeLessThan(thin!);
  });

  it('is strongest near the Moon', () => {
    const sky = over(site(), { moonDeg: 40, phaseDeg: 30 });
    expect(sky(50, 0, 5)).toBeLessThan(sky(50, 0, 30));
    expect(sky(50, 0, 30)).toBeLessThan(sky(50, 0, 90));
  });
});

describe('twilight over the sky', () => {
  it('is brighter over the sunken Sun than opposite it, and gone with the Sun 18 degrees down', () => {
    const sky = over(site(), { sunDeg: -8 });
    expect(sky(20, 270)).toBeLessThan(sky(20, 0));
    expect(sky(20, 0)).toBeLessThan(sky(20, 90));
    expect(over(site(), { sunDeg: -18.01 })(20, 270)).toBe(over(site())(20, 270));
  });

  it('joins 13.3 mag/arcsec2 at the zenith at civil dusk', () => {
    expect(over(site(), { sunDeg: -6 })(90, 0)).toBeCloseTo(13.3, 2);
  });

  it('is a number at the point opposite the Sun', () => {
    for (const sunDeg of [-12, -11, -9, -5, -3]) {
      expect(over(site(), { sunDeg })(-sunDeg, 90)).toBeGreaterThan(3);
    }
  });
});

describe('the sky as a whole', () => {
  it('changes smoothly through the evening in every direction', () => {
    const step = 0.02;
    for (const [altitudeDeg, azimuthDeg] of [
      [5, 270],
      [30, 0],
      [90, 0],
    ] as const) {
      let before = over(site([town]), { sunDeg: 20, moonDeg: 12 })(altitudeDeg, azimuthDeg);
      for (let i = 1; i <= 2000; i++) {
        const sunDeg = 20 - i * step;
        const now = over(site([town]), { sunDeg, moonDeg: 12 - i * step })(altitudeDeg, azimuthDeg);
        // Twilight loses up to 1.5 mag a degree.
        expect(Math.abs(now - before)).toBeLessThan(1.6 * step);
        before = now;
      }
    }
  });

  it('changes smoothly from direction to direction', () => {
    const sky = over(site([town]), { sunDeg: -9, moonDeg: 20 });
    for (let i = 0; i < 1800; i++) {
      expect(Math.abs(sky(i / 20 + 0.05, 250) - sky(i / 20, 250))).toBeLessThan(0.03);
      expect(Math.abs(sky(15, i / 5 + 0.2) - sky(15, i / 5))).toBeLessThan(0.03);
    }
  });

  it('is always a brightness, never less than the night alone', () => {
    const angle = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(
        angle(-90, 90),
        angle(-90, 90),
        angle(0, 180),
        angle(-90, 90),
        angle(0, 360),
        angle(0, 180),
        angle(0, 0.8),
        (sunDeg, moonDeg, phaseDeg, altitudeDeg, azimuthDeg, separationDeg, extinction) => {
          const place = site([town], extinction);
          const found = over(place, { sunDeg, moonDeg, phaseDeg })(altitudeDeg, azimuthDeg, separationDeg);
          const night = over(place)(altitudeDeg, azimuthDeg);
          expect(found).toBeLessThanOrEqual(night + 1e-9);
          expect(found).toBeGreaterThan(-5);
        },
      ),
    );
  });
});
