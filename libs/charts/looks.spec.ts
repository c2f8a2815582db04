import { constellationFigures, deepSkyObjects, loadStars } from '#catalogue';
import { buildScene } from './buildScene';
import { localSky } from './horizon';
import type { DiscInset } from './inset';
import { isInside } from './plate';
import { phaseMarks } from './phase';
import { ChartProblem, type ChartRequest, type ChartTarget } from './request';
import type { Mark, Scene } from './scene';

const degree = Math.PI / 180;
const stars = loadStars();
const deepSky = deepSkyObjects();
const figures = constellationFigures();

function draw(target: Partial<ChartTarget>, more: Partial<ChartRequest> = {}): Scene {
  return buildScene(stars, deepSky, figures, {
    scale: 'eyepiece',
    fieldDeg: null,
    orientation: 'upright',
    paper: 'a4',
    target: {
      name: 'Jupiter',
      raRad: 142 * degree,
      decRad: 16 * degree,
      magnitude: -2.4,
      kind: 'planet',
      majorArcmin: 0.7,
      minorArcmin: 0.7,
      positionAngleDeg: null,
      ...target,
    },
    path: [],
    view: null,
    words: { title: 'T', subtitle: 'S', notes: ['N'], cautions: ['C'], foot: 'F' },
    ...more,
  });
}

const marksOf = (scene: Scene, role: string): Mark[] => scene.marks.filter((mark) => mark.role === role);

const jupiter: DiscInset = {
  kind: 'disc',
  diameterArcsec: 44,
  litFraction: 0.998,
  brightLimbDeg: 100,
  axisDeg: 10,
  moons: [
    { letter: 'I', name: 'Io', eastArcsec: 80, northArcsec: 5, state: 'clear' },
    { letter: 'E', name: 'Europa', eastArcsec: -10, northArcsec: 0, state: 'behind' },
    { letter: 'G', name: 'Ganymede', eastArcsec: 84, northArcsec: 8, state: 'clear' },
    { letter: 'C', name: 'Callisto', eastArcsec: -400, northArcsec: -60, state: 'clear' },
  ],
};

describe('the inset of Jupiter', () => {
  const moonDots = (scene: Scene): Map<string, { x: number; y: number }> => {
    const planet = marksOf(scene, 'inset').find((mark) => mark.shape === 'circle' && mark.of === 'Jupiter');
    if (planet?.shape !== 'circle') throw new Error('the planet is a circle');
    return new Map(
      marksOf(scene, 'inset').flatMap((mark) =>
        mark.shape === 'circle' && mark.of?.startsWith('Jupiter ') === true
          ? [[mark.of.slice(8), { x: mark.xMm - planet.xMm, y: mark.yMm - planet.yMm }] as const]
          : [],
      ),
    );
  };

  it('has the moons that can be seen at their true offsets, east to the left, each with its letter', () => {
    const scene = draw({}, { inset: jupiter });
    const dots = moonDots(scene);
    expect([...dots.keys()].sort()).toEqual(['C', 'G', 'I']);
    const scale = dots.get('C')!.x / 400;
    expect(scale).toBeGreaterThan(0);
    expect(dots.get('I')!.x).toBeCloseTo(-80 * scale, 6);
    expect(dots.get('I')!.y).toBeCloseTo(-5 * scale, 6);
    const words = scene.texts.map(({ text }) => text);
    for (const letter of ['I', 'G', 'C']) expect(words).toContain(letter);
    expect(words).toContain('I Io, G Ganymede, C Callisto; Europa behind the planet');
  });

  it('is turned and mirrored as the chart is', () => {
    const upright = moonDots(draw({}, { inset: jupiter }));
    const rotated = moonDots(draw({}, { inset: jupiter, orientation: 'rotated' }));
    const mirrored = moonDots(draw({}, { inset: jupiter, orientation: 'mirrored' }));
    for (const [letter, { x, y }] of upright) {
      expect(rotated.get(letter)!.x).toBeCloseTo(-x, 9);
      expect(rotated.get(letter)!.y).toBeCloseTo(-y, 9);
      expect(mirrored.get(letter)!.x).toBeCloseTo(-x, 9);
      expect(mirrored.get(letter)!.y).toBeCloseTo(y, 9);
    }
  });

  it('keeps all its words and marks inside its box, and has none on the eye’s sheet', () => {
    for (const orientation of ['upright', 'rotated', 'mirrored'] as const) {
      const scene = draw({}, { inset: jupiter, orientation });
      const box = marksOf(scene, 'inset').find(({ shape }) => shape === 'polygon');
      if (box?.shape !== 'polygon') throw new Error('an inset has a frame');
      const [[left, top], , [right, bottom]] = [box.points[0]!, box.points[1]!, box.points[2]!];
      const inside = scene.texts.filter(({ xMm, yMm }) => xMm > left && yMm > top && yMm < bottom);
      expect(inside.length).toBeGreaterThan(5);
      for (const { xMm, widthMm } of inside) expect(xMm + widthMm).toBeLessThan(right);
      for (const mark of marksOf(scene, 'inset')) {
        if (mark.shape === 'circle') expect(mark.xMm + mark.radiusMm).toBeLessThan(right);
      }
    }
    expect(marksOf(draw({}, { inset: jupiter, scale: 'eye' }), 'inset')).toEqual([]);
  });
});

describe('the inset of Saturn', () => {
  it('draws the near half of the ring before the ball: the southern where the northern face shows', () => {
    const saturn = (showsNorth: boolean): DiscInset => ({
      kind: 'disc',
      diameterArcsec: 18,
      litFraction: 1,
      brightLimbDeg: 0,
      axisDeg: 0,
      rings: { majorArcsec: 42, minorArcsec: 12, innerShare: 0.67, showsNorth },
    });
    const lastHalf = (showsNorth: boolean): number => {
      const marks = marksOf(draw({ name: 'Saturn' }, { inset: saturn(showsNorth) }), 'inset');
      const ball = marks.findIndex(({ shape }) => shape === 'circle');
      const near = marks.slice(ball + 1).find(({ shape }) => shape === 'polygon');
      const disc = marks[ball]!;
      if (near?.shape !== 'polygon' || disc.shape !== 'circle') throw new Error('ball, then half a ring');
      return near.points.reduce((sum, [, y]) => sum + y, 0) / near.points.length - disc.yMm;
    };
    expect(lastHalf(true)).toBeGreaterThan(0);
    expect(lastHalf(false)).toBeLessThan(0);
  });
});

describe('phaseMarks', () => {
  const area = (litFraction: number, angle = 0): number => {
    const [mark] = phaseMarks([0, 0], 10, litFraction, angle, 'inset', 'Moon');
    if (mark?.shape !== 'polygon') return 0;
    const { points } = mark;
    const twice = points.reduce((sum, [x, y], index) => {
      const [nextX, nextY] = points[(index + 1) % points.length]!;
      return sum + x * nextY - nextX * y;
    }, 0);
    return Math.abs(twice) / 2 / (Math.PI * 100);
  };

  it('leave unlit the share of the disc that is', () => {
    for (const lit of [0.02, 0.3, 0.5, 0.8, 0.95]) expect(area(lit, lit)).toBeCloseTo(1 - lit, 2);
    expect(phaseMarks([0, 0], 10, 0.99, 0, 'inset', 'Mars')).toEqual([]);
  });

  it('lie away from the bright limb', () => {
    const [mark] = phaseMarks([0, 0], 10, 0.4, Math.PI / 2, 'inset', 'Moon');
    if (mark?.shape !== 'polygon') throw new Error('an area');
    expect(Math.min(...mark.points.map(([, y]) => y))).toBeCloseTo(-10, 6);
  });
});

describe('a double star', () => {
  const pair = { kind: 'pair', separationArcsec: 35, positionAngleDeg: 55, magnitudes: [7.2, 8] } as const;
  const place = {
    name: 'Pair',
    kind: 'doubleStar',
    raRad: 2,
    decRad: 1.4,
    magnitude: 7,
    majorArcmin: 0,
    minorArcmin: 0,
  };

  it('is two dots on a chart that shows them apart, at their separation and angle', () => {
    const scene = draw(place, { inset: pair, fieldDeg: 0.5 });
    expect(marksOf(scene, 'inset')).toEqual([]);
    const companion = marksOf(scene, 'target').find(({ shape }) => shape === 'circle');
    if (companion?.shape !== 'circle') throw new Error('the second star is a dot');
    const [x, y] = [companion.xMm - scene.target.xMm, companion.yMm - scene.target.yMm];
    const arcsec = (Math.hypot(x, y) / scene.plate.mmPerRadian / degree) * 3600;
    expect(arcsec).toBeCloseTo(35, 3);
    // From north (up) through east (left).
    expect((Math.atan2(-x, -y) / degree + 360) % 360).toBeCloseTo(55, 3);
  });

  it('is an inset with both figures where they would run together', () => {
    const scene = draw(place, { inset: pair, scale: 'binocular' });
    expect(marksOf(scene, 'inset').length).toBeGreaterThan(2);
    expect(scene.texts.map(({ text }) => text)).toContain('35″ apart, position angle 55°');
  });
});

describe('a comet', () => {
  const comet = { name: 'Tarn', kind: 'comet', magnitude: 8, majorArcmin: 6, minorArcmin: 6 };

  it('has a fan the way its tail points, outside its ring', () => {
    for (const [orientation, turned] of [
      ['upright', 1],
      ['rotated', -1],
    ] as const) {
      const scene = draw({ ...comet, tailDeg: 90 }, { orientation });
      const fan = marksOf(scene, 'tail');
      expect(fan).toHaveLength(3);
      for (const mark of fan) {
        if (mark.shape !== 'polyline') throw new Error('a fan is lines');
        const [from, to] = mark.points;
        // East is left on an upright sheet.
        expect(turned * (to![0] - from![0])).toBeLessThan(-5);
        expect(Math.abs(from![0] - scene.target.xMm)).toBeGreaterThan(4);
      }
      expect(scene.texts.map(({ text }) => text)).toContain('which way its tail points');
    }
    expect(marksOf(draw(comet), 'tail')).toEqual([]);
  });

  it('shows where it stands as the public hours begin and end, unless that is one spot', () => {
    const place = (at: string, shiftDeg: number) => ({
      at,
      utcMs: 0,
      raRad: (142 + shiftDeg) * degree,
      decRad: 16 * degree,
    });
    const wide = draw(comet, { publicHours: { opens: place('20:00', -0.2), closes: place('23:00', 0.2) } });
    expect(marksOf(wide, 'place')).toHaveLength(2);
    expect(wide.labels.map(({ text }) => text)).toEqual(
      expect.arrayContaining(['opens 20:00', 'closes 23:00']),
    );
    const near = draw(comet, { publicHours: { opens: place('20:00', 0), closes: place('23:00', 0.01) } });
    expect(marksOf(near, 'place')).toEqual([]);
  });
});

describe('a site’s skyline', () => {
  const view = {
    utcMs: Date.parse('2027-07-01T21:30:00Z'),
    latitudeRad: 47 * degree,
    longitudeRad: 8 * degree,
  };
  const skyline = [
    { azimuthDeg: 0, altitudeDeg: 3 },
    { azimuthDeg: 170, altitudeDeg: 8 },
    { azimuthDeg: 190, altitudeDeg: 12 },
    { azimuthDeg: 210, altitudeDeg: 4 },
  ];
  const m4 = {
    name: 'M 4',
    kind: 'globularCluster',
    raRad: 245.897 * degree,
    decRad: -26.526 * degree,
    magnitude: 5.6,
  };
  const scene = draw(m4, { scale: 'eye', view, skyline });
  const sky = localSky(view);

  it('stands at its own heights, corners and all, with the level horizon under it', () => {
    const edge = marksOf(scene, 'horizon')[0];
    if (edge?.shape !== 'polyline') throw new Error('a skyline is a line');
    const heights = edge.points.map(([x, y]) => {
      const { plate } = scene;
      // Back through the sheet's own numbers: stereographic, turned by (a, b, c, d).
      const right = (x - plate.xMm) / plate.mmPerRadian;
      const down = (y - plate.yMm) / plate.mmPerRadian;
      const east = plate.turn.a * right + plate.turn.c * down;
      const north = plate.turn.b * right + plate.turn.d * down;
      const rho = Math.hypot(east, north);
      const c = 2 * Math.atan(rho / 2);
      const ra0 = scene.centre.raDeg * degree;
      const dec0 = scene.centre.decDeg * degree;
      const decRad = Math.asin(Math.cos(c) * Math.sin(dec0) + (north * Math.sin(c) * Math.cos(dec0)) / rho);
      const raRad =
        ra0 +
        Math.atan2(
          east * Math.sin(c),
          rho * Math.cos(dec0) * Math.cos(c) - north * Math.sin(dec0) * Math.sin(c),
        );
      const { altitudeRad, azimuthRad } = sky.altAz({ raRad, decRad });
      return [azimuthRad / degree, altitudeRad / degree] as const;
    });
    for (const { azimuthDeg, altitudeDeg } of skyline.slice(1)) {
      const nearest = heights.reduce((best, one) =>
        Math.abs(one[0] - azimuthDeg) < Math.abs(best[0] - azimuthDeg) ? one : best,
      );
      expect(nearest[0]).toBeCloseTo(azimuthDeg, 3);
      expect(nearest[1]).toBeCloseTo(altitudeDeg, 3);
    }
    expect(marksOf(scene, 'levelHorizon')).toHaveLength(1);
  });

  it('hides the stars behind it, which the level horizon would show', () => {
    const level = draw(m4, { scale: 'eye', view });
    const low = (one: Scene): number =>
      one.stars.filter(({ raDeg, decDeg }) => {
        const { altitudeRad, azimuthRad } = sky.altAz({ raRad: raDeg * degree, decRad: decDeg * degree });
        return altitudeRad < 8 * degree && azimuthRad > 170 * degree && azimuthRad < 190 * degree;
      }).length;
    expect(low(level)).toBeGreaterThan(0);
    expect(low(scene)).toBe(0);
    expect(marksOf(level, 'levelHorizon')).toEqual([]);
  });

  it('is refused where a height is none', () => {
    expect(() => draw(m4, { scale: 'eye', view, skyline: [{ azimuthDeg: 0, altitudeDeg: 95 }] })).toThrow(
      ChartProblem,
    );
  });
});

describe('a wider sheet', () => {
  it('shows the frame of the next, about the target and as wide as that sheet’s field', () => {
    const scene = draw({}, { scale: 'binocular', next: { scale: 'eyepiece', fieldDeg: 1.5 } });
    const frame = marksOf(scene, 'nextFrame')[0];
    if (frame?.shape !== 'polygon') throw new Error('a frame is closed');
    for (const [x, y] of frame.points) {
      const radius =
        Math.hypot(x - scene.target.xMm, y - scene.target.yMm) / scene.plate.mmPerRadian / degree;
      expect(radius).toBeCloseTo(0.75, 2);
      expect(isInside(scene.frame, x, y, 0)).toBe(true);
    }
  });

  it('lays its key out over as many rows as it needs, clear of the words under it', () => {
    const place = (at: string, shiftDeg: number) => ({
      at,
      utcMs: 0,
      raRad: (190 + shiftDeg) * degree,
      decRad: 0.2,
    });
    const scene = draw(
      {
        name: 'Tarn',
        kind: 'comet',
        magnitude: 8,
        majorArcmin: 6,
        minorArcmin: 6,
        raRad: 190 * degree,
        decRad: 0.2,
        tailDeg: 30,
      },
      {
        scale: 'binocular',
        path: [place('20:00', -1), place('21:00', 0), place('22:00', 1)],
        publicHours: { opens: place('19:30', -1.5), closes: place('22:30', 1.5) },
        next: { scale: 'eyepiece', fieldDeg: 1.5 },
      },
    );
    const key = Math.max(...scene.texts.filter(({ role }) => role === 'key').map(({ yMm }) => yMm));
    const words = scene.texts.filter(({ role }) => role === 'step' || role === 'caution' || role === 'note');
    expect(Math.min(...words.map(({ yMm }) => yMm))).toBeGreaterThan(key + 2.8);
    const rows = new Set(
      scene.texts.filter(({ role, xMm }) => role === 'key' && xMm > 100).map(({ yMm }) => yMm),
    );
    expect(rows.size).toBeGreaterThanOrEqual(5);
  });
});
