import { jupiterMoons } from './moons';
import { place } from './place';
import { fromSpherical, type Vector } from './vector';

function seenFromEarth(utcMs: number): Vector {
  const { astrometric, distanceAu } = place(
    { kind: 'solarSystem', name: 'Jupiter', body: 'Jupiter' },
    utcMs,
    null,
  );
  return fromSpherical(astrometric.raRad, astrometric.decRad, distanceAu!);
}

describe('jupiterMoons', () => {
  it('stand where Meeus 1998, example 44.b, has them on 1992 December 16.0 TD', () => {
    const utcMs = Date.parse('1992-12-16T00:00:00Z') - 59_184;
    const found = jupiterMoons(utcMs, seenFromEarth(utcMs));
    // The book's values in its radius of 71,398 km, from memory; 0.03 radii are half an arcsecond.
    const published = [
      ['Io', -3.4502, 0.2137],
      ['Europa', 7.4418, 0.2752],
      ['Ganymede', 1.201, 0.5899],
      ['Callisto', 7.072, 1.029],
    ] as const;
    published.forEach(([name, west, north], index) => {
      const moon = found[index]!;
      expect(moon.name).toBe(name);
      expect(Math.abs(moon.westRadii - west)).toBeLessThan(0.03);
      expect(Math.abs(moon.northRadii - north)).toBeLessThan(0.03);
      expect(moon.state).toBe('clear');
    });
  });

  it('has offsets on the sky as far from the planet as those in its radii', () => {
    const utcMs = Date.parse('2027-03-01T20:00:00Z');
    const seen = seenFromEarth(utcMs);
    const radius = 71_492 / 149_597_870.7 / Math.hypot(...seen);
    for (const { eastRad, northRad, westRadii, northRadii } of jupiterMoons(utcMs, seen)) {
      // The moons' own distances differ from the planet's by up to 0.3 %.
      expect(Math.hypot(eastRad, northRad) / radius / Math.hypot(westRadii, northRadii)).toBeCloseTo(1, 2);
    }
  });

  it('says when a moon is hidden: a month of hours has each kind, and behind only on the disc', () => {
    const states = new Map<string, number>();
    for (let hour = 0; hour < 720; hour++) {
      const utcMs = Date.parse('2027-04-15T00:00:00Z') + hour * 3_600_000;
      for (const { state, westRadii, northRadii, name } of jupiterMoons(utcMs, seenFromEarth(utcMs))) {
        states.set(state, (states.get(state) ?? 0) + 1);
        if (state === 'behind' || state === 'inFront') {
          expect(Math.hypot(westRadii, northRadii)).toBeLessThan(1);
        }
        // Callisto, the farthest, can pass over a pole; Io never can.
        if (name === 'Io' && Math.hypot(westRadii, northRadii) < 0.9) expect(state).not.toBe('clear');
      }
    }
    expect([...states.keys()].sort()).toEqual(['behind', 'clear', 'inFront', 'inShadow']);
    expect(states.get('clear')!).toBeGreaterThan(2000);
  });
});
