import type { DeepSkyObject } from '#catalogue';
import { objectsFor, outline, symbolSize } from './deepSky';
import { turnFor } from './orientation';
import { plateIn } from './plate';
import { projectionAbout } from './projection';
import type { ChartTarget } from './request';

const degree = Math.PI / 180;
const frame = { shape: 'rectangle', xMm: 0, yMm: 0, widthMm: 186, heightMm: 186 } as const;

function plateAbout(raDeg: number, decDeg: number, fieldDeg: number) {
  return plateIn(
    frame,
    projectionAbout('stereographic', raDeg * degree, decDeg * degree),
    turnFor('upright', 0),
    fieldDeg * degree,
  );
}

const none: ChartTarget = {
  name: 'Comet Tarn',
  raRad: 0,
  decRad: 0,
  magnitude: 8,
  kind: 'comet',
  majorArcmin: 0,
  minorArcmin: 0,
  positionAngleDeg: null,
};

function object(id: string, raDeg: number, decDeg: number, more: Partial<DeepSkyObject> = {}): DeepSkyObject {
  return {
    id,
    otherNames: [],
    kind: 'galaxy',
    raDeg,
    decDeg,
    magnitude: 8,
    majorArcmin: 60,
    minorArcmin: 20,
    positionAngleDeg: 0,
    distanceLy: null,
    constellation: 'And',
    gloss: '',
    ...more,
  };
}

describe('symbolSize', () => {
  it('lays an object along its own north, even where that leans on the sheet', () => {
    // Six degrees east of a centre near the pole, north points well to the side of the sheet's own.
    const plate = plateAbout(0, 85, 20);
    const place = { raRad: 60 * degree, decRad: 85 * degree };
    const size = symbolSize(
      plate,
      { ...place, kind: 'galaxy', majorArcmin: 60, minorArcmin: 20, positionAngleDeg: 0 },
      null,
    );
    const at = plate.toSheet(place)!;
    const north = plate.toSheet({ ...place, decRad: place.decRad + 0.3 * degree })!;
    const expected = Math.atan2(north[1] - at[1], north[0] - at[0]) / degree;
    expect(Math.abs(Math.sin((size.angleDeg - expected) * degree))).toBeLessThan(0.005);
  });

  it('grows with the stretch of the map away from its middle', () => {
    const plate = plateAbout(0, 0, 60);
    const sizeAt = (raDeg: number): number =>
      symbolSize(
        plate,
        {
          raRad: raDeg * degree,
          decRad: 0,
          kind: 'galaxy',
          majorArcmin: 120,
          minorArcmin: 60,
          positionAngleDeg: 0,
        },
        null,
      ).semiMajorMm;
    // Stereographic scale at c from the centre is 1 / cos²(c/2) (Snyder 1987, equation 21-1 with k0 = 1).
    expect(sizeAt(28) / sizeAt(0)).toBeCloseTo(1 / Math.cos(14 * degree) ** 2, 4);
  });

  it('draws what is too small to see at a fixed size', () => {
    const tiny = symbolSize(
      plateAbout(0, 0, 60),
      {
        raRad: 0,
        decRad: 0,
        kind: 'planetaryNebula',
        majorArcmin: 1,
        minorArcmin: 1,
        positionAngleDeg: null,
      },
      null,
    );
    expect(tiny).toEqual({ semiMajorMm: 0.9, semiMinorMm: 0.9, angleDeg: 0 });
  });
});

describe('objectsFor', () => {
  const plate = plateAbout(10, 40, 8);

  it('leaves out the target under any of its names, what is too faint, and what lies outside', () => {
    const deepSky = [
      object('M 31', 10, 40, { otherNames: ['Andromeda Galaxy'] }),
      object('M 32', 11, 40),
      object('faint', 9, 40, { magnitude: 13 }),
      object('far', 30, 40),
    ];
    const ids = (name: string): string[] =>
      objectsFor(deepSky, plate, 'binocular', { ...none, name }, [], 9.5).map((placed) => placed.object.id);
    expect(ids('andromeda galaxy')).toEqual(['M 32']);
    expect(ids('Comet Tarn')).toEqual(['M 31', 'M 32']);
  });

  it('shows the brighter of two whose signs would meet', () => {
    const deepSky = [object('dim', 10, 40, { magnitude: 9 }), object('bright', 10.02, 40, { magnitude: 7 })];
    expect(objectsFor(deepSky, plate, 'binocular', none, [], 9.5).map((placed) => placed.object.id)).toEqual([
      'bright',
    ]);
  });

  it('shows doubles only where the instrument splits them', () => {
    const pair = (separationArcsec: number): DeepSkyObject =>
      object(`pair ${String(separationArcsec)}`, 10, 40, {
        kind: 'doubleStar',
        double: { magnitudes: [3, 5], separationArcsec, positionAngleDeg: 54, colours: 'gold and blue' },
      });
    const shown = (scale: 'eye' | 'binocular' | 'eyepiece', separation: number): number =>
      objectsFor([{ ...pair(separation), magnitude: 3 }], plate, scale, none, [], 9.5).length;
    expect([shown('eye', 34), shown('binocular', 34), shown('binocular', 3), shown('eyepiece', 3)]).toEqual([
      0, 1, 0, 1,
    ]);
  });
});

describe('outline', () => {
  it('is closed, lies on the ellipse, and is none for a small sign', () => {
    const lines = outline([50, 50], { semiMajorMm: 20, semiMinorMm: 8, angleDeg: 90 });
    expect(lines.at(-1)![1][0]).toBeCloseTo(lines[0]![0][0], 9);
    for (const [[x, y]] of lines) expect(((y - 50) / 20) ** 2 + ((x - 50) / 8) ** 2).toBeCloseTo(1, 9);
    expect(outline([50, 50], { semiMajorMm: 3, semiMinorMm: 3, angleDeg: 0 })).toEqual([]);
  });
});
