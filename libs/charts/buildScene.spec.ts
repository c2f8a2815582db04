import { constellationFigures, deepSkyObjects, loadStars, starsInCone } from '#catalogue';
import { buildScene } from './buildScene';
import { dotDiameterMm } from './dots';
import { localSky } from './horizon';
import { isInside } from './plate';
import { ChartProblem, type ChartRequest, type ChartScale, type ChartTarget } from './request';
import type { Scene } from './scene';

const degree = Math.PI / 180;
const stars = loadStars();
const deepSky = deepSkyObjects();
const figures = constellationFigures();
const scales: ChartScale[] = ['eye', 'binocular', 'eyepiece'];

function target(name: string, raDeg: number, decDeg: number, more: Partial<ChartTarget> = {}): ChartTarget {
  return {
    name,
    raRad: raDeg * degree,
    decRad: decDeg * degree,
    magnitude: 8,
    kind: 'comet',
    majorArcmin: 4,
    minorArcmin: 4,
    positionAngleDeg: null,
    ...more,
  };
}

function request(more: Partial<ChartRequest> = {}): ChartRequest {
  return {
    scale: 'binocular',
    fieldDeg: null,
    orientation: 'upright',
    paper: 'a4',
    target: target('Comet Tarn', 305, 38),
    path: [],
    view: null,
    words: {
      title: 'Comet Tarn',
      subtitle: 'Friday',
      notes: ['A note.'],
      cautions: ['Mind it.'],
      foot: 'Foot',
    },
    ...more,
  };
}

const draw = (more: Partial<ChartRequest> = {}): Scene => buildScene(stars, deepSky, figures, request(more));

type Vector = [number, number, number];
const dot = (u: Vector, v: Vector): number => u[0] * v[0] + u[1] * v[1] + u[2] * v[2];

/**
 * Millimetres right and down of the chart's middle, worked by vectors rather than by the formulas of the code:
 * the sphere seen from the antipode (stereographic) or its centre (gnomonic) on the plane touching at `centre`,
 * with axes east and north there (Snyder 1987, pages 154 and 164, give the construction).
 */
function byVectors(scene: Scene, raDeg: number, decDeg: number, upDeg = 0): [number, number] {
  const sphere = (ra: number, dec: number): Vector => [
    Math.cos(dec * degree) * Math.cos(ra * degree),
    Math.cos(dec * degree) * Math.sin(ra * degree),
    Math.sin(dec * degree),
  ];
  const { raDeg: ra0, decDeg: dec0 } = scene.centre;
  const c = sphere(ra0, dec0);
  const east: Vector = [-Math.sin(ra0 * degree), Math.cos(ra0 * degree), 0];
  const north = sphere(ra0, dec0 + 90);
  const v = sphere(raDeg, decDeg);
  const stretch = scene.projection === 'gnomonic' ? 1 / dot(v, c) : 2 / (1 + dot(v, c));
  const { frame } = scene;
  const halfWidth = frame.shape === 'circle' ? frame.radiusMm : frame.widthMm / 2;
  const half = (scene.fieldDeg / 2) * degree;
  const unit = halfWidth / (scene.projection === 'gnomonic' ? Math.tan(half) : 2 * Math.tan(half / 2));
  const x = -unit * stretch * dot(v, east);
  const y = -unit * stretch * dot(v, north);
  const up = upDeg * degree;
  return [x * Math.cos(up) - y * Math.sin(up), x * Math.sin(up) + y * Math.cos(up)];
}

function middle({ frame }: Scene): [number, number] {
  return frame.shape === 'circle'
    ? [frame.xMm, frame.yMm]
    : [frame.xMm + frame.widthMm / 2, frame.yMm + frame.heightMm / 2];
}

function worstPlaceMm(scene: Scene): number {
  const [x0, y0] = middle(scene);
  return Math.max(
    ...scene.stars.map((star) => {
      const [x, y] = byVectors(scene, star.raDeg, star.decDeg);
      return Math.hypot(x0 + x - star.xMm, y0 + y - star.yMm);
    }),
  );
}

describe('star places', () => {
  it.each([
    ['binocular', 305, 38],
    ['binocular', 0.1, 5],
    ['binocular', 40, 89.2],
    ['eyepiece', 6, -72],
    ['eyepiece', 359.8, -0.1],
    ['eye', 245, -26],
    ['eye', 100, -90],
  ] as const)('at the %s scale about %d, %d are those of the vector form', (scale, ra, dec) => {
    const scene = draw({ scale, target: target('T', ra, dec) });
    expect(scene.stars.length).toBeGreaterThan(10);
    expect(worstPlaceMm(scene)).toBeLessThan(0.05);
  });

  it('are all that the catalogue has in the frame down to the stated magnitude', () => {
    const reachDeg = { eye: 50, binocular: 6, eyepiece: 1 };
    for (const scale of scales) {
      const scene = draw({ scale });
      const [x0, y0] = middle(scene);
      const within = starsInCone(stars, {
        raRad: 305 * degree,
        decRad: 38 * degree,
        radiusRad: reachDeg[scale] * degree,
        faintestMagnitude: scene.faintestMagnitude,
      }).filter((star) => {
        const [x, y] = byVectors(scene, star.raRad / degree, star.decRad / degree);
        return isInside(scene.frame, x0 + x, y0 + y, 0);
      });
      expect(scene.stars).toHaveLength(within.length);
    }
  });

  it('bear dots by the one rule', () => {
    for (const scale of scales) {
      const scene = draw({ scale });
      for (const star of scene.stars) {
        expect(2 * star.radiusMm).toBeCloseTo(dotDiameterMm(star.magnitude, scene.faintestMagnitude), 12);
      }
    }
  });

  it('uses a gnomonic map for eyepieces and a stereographic one for all else', () => {
    expect(draw({ scale: 'eyepiece' }).projection).toBe('gnomonic');
    expect(draw({ scale: 'eyepiece', fieldDeg: 20 }).projection).toBe('stereographic');
    expect(draw().projection).toBe('stereographic');
  });
});

describe('orientations', () => {
  it.each(scales)('rotated and mirrored %s sheets are the upright one turned or mirrored', (scale) => {
    const upright = draw({ scale });
    const [x0, y0] = middle(upright);
    const rotated = draw({ scale, orientation: 'rotated' });
    const mirrored = draw({ scale, orientation: 'mirrored' });
    expect(rotated.stars).toHaveLength(upright.stars.length);
    let worst = 0;
    upright.stars.forEach((star, index) => {
      const turned = rotated.stars[index]!;
      const flipped = mirrored.stars[index]!;
      worst = Math.max(
        worst,
        Math.abs(turned.xMm - (2 * x0 - star.xMm)),
        Math.abs(turned.yMm - (2 * y0 - star.yMm)),
        Math.abs(flipped.xMm - (2 * x0 - star.xMm)),
        Math.abs(flipped.yMm - star.yMm),
      );
    });
    expect(worst).toBeLessThan(1e-9);
  });
});

describe('an eye chart with a view', () => {
  const view = {
    utcMs: Date.parse('2027-07-01T21:30:00Z'),
    latitudeRad: 47 * degree,
    longitudeRad: 8 * degree,
  };
  const low = draw({ scale: 'eye', view, target: target('M 4', 245.897, -26.526) });

  it('has the ground at the foot, the facing letter in it, and the target above', () => {
    const horizon = low.marks.find(({ role }) => role === 'horizon');
    if (horizon?.shape !== 'polyline') throw new Error('a low target’s chart has a horizon');
    const under = horizon.points.filter(([x]) => Math.abs(x - low.target.xMm) < 6);
    const ground = under.reduce((sum, [, y]) => sum + y, 0) / under.length;
    expect(ground).toBeGreaterThan(low.target.yMm);
    const letter = low.labels.find(({ of }) => of === 'south');
    expect(letter?.text).toBe('S');
    expect(letter!.box[1]).toBeGreaterThan(ground);
    expect(low.texts.map(({ text }) => text)).toContain('Face south, look 16° up');
  });

  it('has the zenith up: the way up at the target is the way up on the sheet', () => {
    const higher = draw({ scale: 'eye', view, target: target('M 5', 229.638, 2.081) });
    const heights = higher.labels.filter(({ of }) => of === 'altitude').map(({ text, yMm }) => [text, yMm]);
    expect(heights.length).toBeGreaterThan(3);
    const sorted = [...heights].sort(
      (one, other) => Number.parseInt(String(other[0])) - Number.parseInt(String(one[0])),
    );
    expect(sorted.map(([, y]) => y)).toEqual([...sorted.map(([, y]) => Number(y))].sort((a, b) => a - b));
  });

  it('shows no star below the ground', () => {
    const horizon = low.marks.find(({ role }) => role === 'horizon');
    if (horizon?.shape !== 'polyline') throw new Error('a low target’s chart has a horizon');
    const deepest = Math.max(...horizon.points.filter(([x]) => x > 12 && x < 198).map(([, y]) => y));
    expect(Math.max(...low.stars.map(({ yMm }) => yMm))).toBeLessThan(deepest + 0.5);
  });

  it('keeps its stars where the vectors put them, turned so that the zenith is up', () => {
    // The turn is found from two stars, then must hold for all the others.
    const [x0, y0] = middle(low);
    const first = low.stars[0]!;
    const flat = byVectors(low, first.raDeg, first.decDeg);
    const turn = (Math.atan2(first.yMm - y0, first.xMm - x0) - Math.atan2(flat[1], flat[0])) / degree;
    const worst = Math.max(
      ...low.stars.map((star) => {
        const [x, y] = byVectors(low, star.raDeg, star.decDeg, turn);
        return Math.hypot(x0 + x - star.xMm, y0 + y - star.yMm);
      }),
    );
    expect(worst).toBeLessThan(0.05);
  });

  it('can have the zenith up for binoculars too, where that is asked for', () => {
    const place = target('M 13', 250.42, 36.46);
    const sky = localSky(view);
    const { altitudeRad, azimuthRad } = sky.altAz(place);
    const above = sky.placeAt(altitudeRad + degree, azimuthRad);
    const scene = draw({ view, up: 'zenith', target: { ...place, ...above } });
    // Seen from a sheet centred one degree higher, the first place lies straight below the middle.
    const lower = draw({ view, up: 'zenith', target: place });
    expect(scene.texts.map(({ text }) => text)).toContain('As you stand: overhead is up');
    const shared = lower.stars.flatMap((star) => {
      const same = scene.stars.find(({ raDeg, decDeg }) => raDeg === star.raDeg && decDeg === star.decDeg);
      return same === undefined ? [] : [same.yMm - star.yMm];
    });
    const oneDegreeMm = degree * scene.plate.mmPerRadian;
    expect(shared.length).toBeGreaterThan(20);
    for (const shift of shared) expect(Math.abs(shift - oneDegreeMm)).toBeLessThan(0.12 * oneDegreeMm);
  });

  it('refuses a target below the horizon, saying how far', () => {
    const sunk = (): Scene => draw({ scale: 'eye', view, target: target('Canopus', 95.99, -52.7) });
    expect(sunk).toThrow(ChartProblem);
    expect(sunk).toThrow(/Canopus stands \d+\.\d degrees below the horizon/);
  });
});

describe('a moving target', () => {
  const path = [0, 1, 2].map((day) => ({
    at: `${String(14 + day)} Mar`,
    utcMs: day * 86400000,
    raRad: (304 + day) * degree,
    decRad: 38 * degree,
  }));

  it('has its path where its places are, with their labels and the direction of motion', () => {
    const scene = draw({ path });
    const [x0, y0] = middle(scene);
    expect(scene.path.map(({ at }) => at)).toEqual(['14 Mar', '15 Mar', '16 Mar']);
    scene.path.forEach(({ xMm, yMm }, day) => {
      const [x, y] = byVectors(scene, 304 + day, 38);
      expect(Math.hypot(x0 + x - xMm, y0 + y - yMm)).toBeLessThan(0.05);
    });
    expect(scene.labels.map(({ text }) => text)).toEqual(expect.arrayContaining(['14 Mar', '16 Mar']));
    const head = scene.marks.find(({ role, shape }) => role === 'path' && shape === 'polygon');
    if (head?.shape !== 'polygon') throw new Error('a path ends in an arrowhead');
    expect(head.points[0]![0]).toBeLessThan(scene.path[2]!.xMm);
  });

  it('still shows which way it goes where the path leaves the sheet', () => {
    const scene = draw({ scale: 'eyepiece', path });
    const head = scene.marks.find(({ role, shape }) => role === 'path' && shape === 'polygon');
    if (head?.shape !== 'polygon') throw new Error('a path ends in an arrowhead');
    for (const [x, y] of head.points) expect(isInside(scene.frame, x, y, 0)).toBe(true);
  });
});

describe('deep-sky objects', () => {
  const m31 = target('M 31', 10.685, 41.269, {
    kind: 'galaxy',
    majorArcmin: 190,
    minorArcmin: 60,
    positionAngleDeg: 35,
  });

  it('stand at true size and angle', () => {
    const scene = draw({ target: m31 });
    const body = scene.marks.find(({ role, shape }) => role === 'target' && shape === 'ellipse');
    if (body?.shape !== 'ellipse') throw new Error('a galaxy is an ellipse');
    expect(2 * body.semiMajorMm).toBeCloseTo((190 / 60) * degree * scene.plate.mmPerRadian, 1);
    expect(2 * body.semiMinorMm).toBeCloseTo((60 / 60) * degree * scene.plate.mmPerRadian, 1);
    // 35° from north towards east, which is left: up and to the left, 180° + 55° from right through down.
    expect(((body.angleDeg % 180) + 180) % 180).toBeCloseTo(55, 1);
  });

  it('draws a catalogued target once', () => {
    const scene = draw({ target: m31 });
    expect(scene.marks.filter(({ role, of }) => role === 'deepSky' && of === 'M 31')).toEqual([]);
    expect(scene.marks.some(({ role, of }) => role === 'deepSky' && of === 'M 110')).toBe(true);
  });

  it('explains in its key the signs it uses and no others', () => {
    const words = draw({ target: m31 })
      .texts.filter(({ role }) => role === 'key')
      .map(({ text }) => text);
    expect(words).toContain('galaxy');
    expect(words).not.toContain('planetary nebula');
  });
});

describe('a star as target', () => {
  it('is named once, by the target’s own label, and drawn by its own dot', () => {
    const albireo = target('Albireo', 292.68, 27.96, {
      kind: 'doubleStar',
      magnitude: 3.1,
      majorArcmin: 0,
      minorArcmin: 0,
    });
    for (const scale of scales) {
      const scene = draw({ scale, target: albireo });
      expect(scene.labels.filter(({ text }) => text === 'Albireo' || text === 'β¹ Cyg')).toHaveLength(1);
      const nearest = scene.stars.find(
        ({ xMm, yMm }) => Math.hypot(xMm - scene.target.xMm, yMm - scene.target.yMm) < 1,
      );
      expect(nearest?.magnitude).toBeCloseTo(3.1, 0);
    }
  });
});

describe('labels of stars', () => {
  it('stand in the scene’s stars as they stand on the sheet, each once', () => {
    const scene = draw({ scale: 'eye' });
    const onStars = scene.stars.flatMap(({ label }) => (label === null ? [] : [label]));
    expect(onStars).toContain('Vega');
    const drawn = scene.labels.map(({ text }) => text);
    for (const label of new Set(onStars)) {
      expect(onStars.filter((text) => text === label).length).toBeLessThanOrEqual(
        drawn.filter((text) => text === label).length,
      );
    }
  });
});

describe('the Moon', () => {
  it('is a disc at its size with no star drawn through it', () => {
    const moon = target('Moon', 56.7, 24.1, {
      kind: 'Moon',
      magnitude: -9,
      majorArcmin: 31,
      minorArcmin: 31,
    });
    const scene = draw({ scale: 'eyepiece', target: moon });
    const disc = scene.marks.find(({ role, shape }) => role === 'target' && shape === 'ellipse');
    if (disc?.shape !== 'ellipse') throw new Error('the Moon is a disc');
    expect(disc.semiMajorMm).toBeCloseTo((15.5 / 60) * degree * scene.plate.mmPerRadian, 1);
    const within = scene.stars.filter(
      ({ xMm, yMm }) => Math.hypot(xMm - disc.xMm, yMm - disc.yMm) < disc.semiMajorMm - 0.1,
    );
    // The place is in the Pleiades, so that stars there would be many.
    expect(within).toEqual([]);
    expect(scene.stars.length).toBeGreaterThan(20);
  });
});

describe('the sheet', () => {
  it.each(['a4', 'letter'] as const)(
    'keeps everything on %s paper and writes no text under 8 points',
    (paper) => {
      for (const scale of scales) {
        const scene = draw({ paper, scale });
        for (const text of [...scene.texts, ...scene.labels]) {
          expect(text.sizePt).toBeGreaterThanOrEqual(8);
          expect(text.xMm).toBeGreaterThan(5);
          expect(text.xMm + text.widthMm).toBeLessThan(scene.widthMm - 5);
          expect(text.yMm).toBeLessThan(scene.heightMm - 5);
        }
        for (const { stroke } of scene.marks) {
          if (stroke !== null) expect(stroke.widthPt).toBeGreaterThanOrEqual(0.3);
        }
      }
    },
  );

  it('writes no two texts of its key and margins over each other', () => {
    for (const scale of scales) {
      const { texts } = draw({ scale, orientation: 'rotated', fieldDeg: scale === 'eye' ? 90 : null });
      const boxes = texts.map((text) => ({ ...text, top: text.yMm - 2, right: text.xMm + text.widthMm }));
      const clashes = boxes.flatMap((one, index) =>
        boxes
          .slice(index + 1)
          .filter(
            (other) =>
              one.xMm < other.right && one.right > other.xMm && one.top < other.yMm && one.yMm > other.top,
          )
          .map((other) => `${one.text} | ${other.text}`),
      );
      expect(clashes).toEqual([]);
    }
  });

  it('shows the outline of the next sheet at its size', () => {
    const scene = draw({ scale: 'binocular', next: { scale: 'eyepiece', fieldDeg: 1.5 } });
    const outline = scene.marks.find(({ role }) => role === 'nextFrame');
    if (outline?.shape !== 'polygon') throw new Error('the next frame is an outline');
    const radius = 0.75 * degree * scene.plate.mmPerRadian;
    for (const [x, y] of outline.points) {
      expect(Math.hypot(x - scene.target.xMm, y - scene.target.yMm)).toBeCloseTo(radius, 1);
    }
  });

  it('is the same for the same request', () => {
    expect(draw({ scale: 'eye' })).toEqual(draw({ scale: 'eye' }));
  });
});

describe('a request that cannot be drawn', () => {
  it.each([
    ['fieldDeg', { fieldDeg: 0 }, /field is 0 degrees/],
    ['fieldDeg', { fieldDeg: 200 }, /field is 200 degrees/],
    ['fieldDeg', { fieldDeg: Number.NaN }, /field is NaN degrees/],
    ['scale', { scale: 'telescope' as ChartScale }, /scale is "telescope"/],
    ['target.decRad', { target: target('X', 10, 91) }, /from -1.5708 to 1.5708/],
    ['target.raRad', { target: target('X', Infinity, 0) }, /target.raRad is Infinity/],
    ['next.fieldDeg', { next: { scale: 'eyepiece', fieldDeg: 9 } }, /narrower than this sheet's 8/],
  ] as [string, Partial<ChartRequest>, RegExp][])(
    'names %s and what would be right',
    (field, more, message) => {
      const problem = caught(() => draw(more));
      expect(problem).toBeInstanceOf(ChartProblem);
      expect((problem as ChartProblem).field).toBe(field);
      expect((problem as ChartProblem).message).toMatch(message);
    },
  );
});

function caught(run: () => unknown): unknown {
  try {
    run();
  } catch (problem) {
    return problem;
  }
  return null;
}
