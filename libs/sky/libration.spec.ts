import { Libration } from 'astronomy-engine';
import { DEG, toDeg } from './angles';
import { positionAngle } from './appearance';
import { moonLibration } from './libration';
import { place } from './place';
import { astroTime } from './time';
import { fromSpherical, type Vector } from './vector';
import { type Observer } from './observer';

function seen(utcMs: number, observer: Observer | null): Vector {
  const { astrometric, distanceAu } = place(
    { kind: 'solarSystem', name: 'Moon', body: 'Moon' },
    utcMs,
    observer,
  );
  return fromSpherical(astrometric.raRad, astrometric.decRad, distanceAu!);
}

describe('moonLibration', () => {
  it('is that of Meeus 1998, example 53.a, on 1992 April 12.0 TD', () => {
    const utcMs = Date.parse('1992-04-12T00:00:00Z') - 59_184;
    const { longitudeRad, latitudeRad, axisAngleRad } = moonLibration(utcMs, seen(utcMs, null));
    // From memory: l −1.23°, b +4.20°, P 15.08°.
    expect(Math.abs(toDeg(longitudeRad) + 1.23)).toBeLessThan(0.05);
    expect(Math.abs(toDeg(latitudeRad) - 4.2)).toBeLessThan(0.05);
    expect(Math.abs(toDeg(axisAngleRad) - 15.08)).toBeLessThan(0.1);
  });

  it('agrees from the Earth’s centre with the series in astronomy-engine over three years', () => {
    let worst = 0;
    for (let day = 0; day < 1100; day += 7) {
      const utcMs = Date.parse('2026-01-01T00:00:00Z') + day * 86_400_000;
      const { elon, elat } = Libration(astroTime(utcMs));
      const { longitudeRad, latitudeRad } = moonLibration(utcMs, seen(utcMs, null));
      worst = Math.max(worst, Math.abs(toDeg(longitudeRad) - elon), Math.abs(toDeg(latitudeRad) - elat));
    }
    expect(worst).toBeLessThan(0.1);
  });

  it('differs for an observer by up to a degree, the Moon’s parallax', () => {
    const utcMs = Date.parse('2027-03-18T19:00:00Z');
    const centre = moonLibration(utcMs, seen(utcMs, null));
    const here = moonLibration(utcMs, seen(utcMs, { latitudeRad: 50 * DEG, longitudeRad: 0, elevationM: 0 }));
    const shift = toDeg(
      Math.hypot(here.longitudeRad - centre.longitudeRad, here.latitudeRad - centre.latitudeRad),
    );
    expect(shift).toBeGreaterThan(0.1);
    expect(shift).toBeLessThan(1.05);
  });
});

describe('the bright limb', () => {
  it('of the Moon is that of Meeus 1998, example 48.a, by the position angle of the Sun', () => {
    const utcMs = Date.parse('1992-04-12T00:00:00Z') - 59_184;
    const moon = place({ kind: 'solarSystem', name: 'Moon', body: 'Moon' }, utcMs, null).apparent;
    const sun = place({ kind: 'solarSystem', name: 'Sun', body: 'Sun' }, utcMs, null).apparent;
    expect(Math.abs(toDeg(positionAngle(moon.raRad, moon.decRad, sun.raRad, sun.decRad)) - 285)).toBeLessThan(
      0.1,
    );
  });
});
