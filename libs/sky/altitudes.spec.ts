import { ARCMIN, ARCSEC, toRad } from './angles';
import { moonAltitude, moonSemidiameter, sunAltitude, sunHorizontal } from './altitudes';
import { place } from './place';

const observer = { latitudeRad: toRad(-33.2), longitudeRad: toRad(-70.9), elevationM: 2200 };
const instants = Array.from(
  { length: 60 },
  (_, i) => Date.parse('2027-01-01T00:00:00Z') + i * 0.77 * 86_400_000,
);
const full = (body: 'Sun' | 'Moon', utcMs: number) =>
  place({ kind: 'solarSystem', name: body, body }, utcMs, observer);

describe('the short ways to Sun and Moon', () => {
  it('give the Sun of the full place', () => {
    for (const utcMs of instants) {
      const { altitudeRad, azimuthRad } = full('Sun', utcMs).horizontal!;
      expect(Math.abs(sunAltitude(observer)(utcMs) - altitudeRad) / ARCSEC).toBeLessThan(0.01);
      const turn = (sunHorizontal(observer)(utcMs).azimuthRad - azimuthRad) / 2;
      expect(Math.abs(Math.sin(turn) * Math.cos(altitudeRad)) / ARCSEC).toBeLessThan(0.01);
    }
  });

  it('give the Moon of the full place to half an arcsecond, and its size', () => {
    for (const utcMs of instants) {
      const { horizontal, angularDiameterRad } = full('Moon', utcMs);
      expect(Math.abs(moonAltitude(observer)(utcMs) - horizontal!.altitudeRad) / ARCSEC).toBeLessThan(0.5);
      const semidiameter = moonSemidiameter(observer)(utcMs);
      // The full place measures from where the Earth has run to in the light time, 38 km at most.
      expect(Math.abs(semidiameter - angularDiameterRad! / 2) / ARCSEC).toBeLessThan(0.1);
      // From 14.5' under foot at apogee to 17.1' overhead at perigee.
      expect(semidiameter / ARCMIN).toBeGreaterThan(14.4);
      expect(semidiameter / ARCMIN).toBeLessThan(17.1);
    }
  });
});
