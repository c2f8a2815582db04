import { MOON_SHARE, perturberPlace, PERTURBERS, perturberTable, tableCovers, ttMs } from './perturbers';
import { earthState, geocentricMoon, heliocentricPlace } from './solarSystem';
import { ttJdToUtcMs } from './time';
import { add, norm, scale, subtract, type Vector } from './vector';

const FROM = 2_460_900.5;
const TO = FROM + 1_065;
const table = perturberTable(FROM, TO);

describe('perturberTable', () => {
  test.each(PERTURBERS.map((name, i) => [name, i] as const))('holds %s to 3e-7 au', (name, i) => {
    const out = new Float64Array(3);
    for (let n = 0; n <= 160; n++) {
      const ttJd = FROM + ((n * 0.6180339887) % 1) * (TO - FROM);
      const utcMs = ttJdToUtcMs(ttJd);
      const place =
        name === 'Earth and Moon'
          ? add(earthState(utcMs).position, scale(geocentricMoon(utcMs), MOON_SHARE))
          : heliocentricPlace(name, utcMs);
      perturberPlace(table, i, ttMs(ttJd), out);
      expect(norm(subtract([...out] as unknown as Vector, place))).toBeLessThan(3e-7);
    }
  });

  it('knows the span it covers', () => {
    expect(tableCovers(table, FROM, TO)).toBe(true);
    expect(tableCovers(table, FROM - 1, TO)).toBe(false);
    expect(tableCovers(table, FROM, TO + 1)).toBe(false);
  });
});
