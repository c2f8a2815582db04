import { ARCSEC, toDeg } from './angles';
import { place } from './place';
import { saturnRings } from './rings';
import { fromSpherical } from './vector';

describe('saturnRings', () => {
  it('are those of Meeus 1998, example 45.a, on 1992 December 16.0 TD', () => {
    const utcMs = Date.parse('1992-12-16T00:00:00Z') - 59_184;
    const { astrometric, distanceAu } = place(
      { kind: 'solarSystem', name: 'Saturn', body: 'Saturn' },
      utcMs,
      null,
    );
    const rings = saturnRings(utcMs, fromSpherical(astrometric.raRad, astrometric.decRad, distanceAu!));
    // From memory: B 16.442°, B′ 14.679°, P 6.741° (equator of date), a 35.87″, b 10.15″.
    expect(Math.abs(toDeg(rings.tiltRad) - 16.442)).toBeLessThan(0.03);
    expect(Math.abs(toDeg(rings.sunTiltRad) - 14.679)).toBeLessThan(0.03);
    // Precession of 7 years turns the pole by some hundredths of a degree.
    expect(Math.abs(toDeg(rings.axisAngleRad) - 6.741)).toBeLessThan(0.06);
    // The outer edge was then taken 0.5 % smaller.
    expect(Math.abs(rings.majorRad / ARCSEC - 35.87)).toBeLessThan(0.25);
    expect(Math.abs(rings.minorRad / ARCSEC - 10.15)).toBeLessThan(0.1);
  });
});
