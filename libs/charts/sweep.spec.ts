import { constellationFigures, deepSkyObjects, loadStars } from '#catalogue';
import { buildScene } from './buildScene';
import { localSky } from './horizon';
import { separationOf } from './landmarks';
import { comesNear, type Line } from './lines';
import { isInside } from './plate';
import type { ChartRequest, ChartScale, ChartView } from './request';
import type { Scene, SceneLabel } from './scene';
import { type Way } from './way';
import { wayFor } from './wayFor';

const degree = Math.PI / 180;
const stars = loadStars();
const deepSky = deepSkyObjects();
const figures = constellationFigures();
const runs = 300;

/** A small repeatable generator (the numbers of Park & Miller 1988), so that a failure can be run again. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 48271) % 2147483647) / 2147483647;
}

/** A random moving target, up over a random site with a rugged skyline at a random time. */
function randomRequest(scale: ChartScale, random: () => number): ChartRequest {
  for (;;) {
    const raRad = 2 * Math.PI * random();
    const decRad = Math.asin(2 * random() - 1);
    const view: ChartView = {
      utcMs: Date.UTC(2027, 0, 1) + Math.floor(365 * 86_400 * random()) * 1000,
      latitudeRad: Math.asin(1.8 * random() - 0.9),
      longitudeRad: 2 * Math.PI * (random() - 0.5),
      clock: '21:30',
    };
    if (localSky(view).altAz({ raRad, decRad }).altitudeRad < 6 * degree) continue;
    const heading = 2 * Math.PI * random();
    const pace = 10 ** (-2.5 + 2.3 * random());
    const at = (step: number): { raRad: number; decRad: number } => ({
      raRad: raRad + (step * pace * degree * Math.sin(heading)) / Math.max(0.05, Math.cos(decRad)),
      decRad: Math.max(-1.57, Math.min(1.57, decRad + step * pace * degree * Math.cos(heading))),
    });
    const place = (step: number, label: string) => ({
      at: label,
      utcMs: view.utcMs + step * 600_000,
      ...at(step),
    });
    return {
      scale,
      fieldDeg: null,
      orientation: (['upright', 'rotated', 'mirrored'] as const)[Math.floor(3 * random())]!,
      paper: random() < 0.5 ? 'a4' : 'letter',
      target: {
        name: 'Comet Tarn',
        raRad,
        decRad,
        magnitude: 4 + 6 * random(),
        kind: 'comet',
        majorArcmin: 12 * random(),
        minorArcmin: 0,
        positionAngleDeg: null,
        tailDeg: 360 * random(),
      },
      path: [-3, -2, -1, 0, 1, 2, 3].map((step) => place(step, `21:${String(30 + 5 * step)}`)),
      publicHours: { opens: place(-2.4, '20:00'), closes: place(2.7, '23:00') },
      view,
      skyline: [0, 45, 90, 135, 180, 225, 270, 315].map((azimuthDeg) => ({
        azimuthDeg,
        altitudeDeg: 5 * random(),
      })),
      ...(scale === 'eyepiece'
        ? {}
        : {
            next:
              scale === 'eye'
                ? { scale: 'binocular' as const, fieldDeg: 8 }
                : { scale: 'eyepiece' as const, fieldDeg: 1.5 },
          }),
      words: {
        title: 'Comet Tarn',
        subtitle: 'Friday',
        notes: ['A note.'],
        cautions: ['Mind.'],
        foot: 'Foot',
      },
    };
  }
}

const gapTo = ({ box: [left, top, right, bottom] }: SceneLabel, x: number, y: number): number =>
  Math.hypot(Math.max(left - x, 0, x - right), Math.max(top - y, 0, y - bottom));

function linesOf(scene: Scene, role: string): Line[] {
  return scene.marks.flatMap((mark) =>
    mark.role === role && mark.shape === 'polyline'
      ? mark.points.slice(1).map((point, index): Line => [mark.points[index]!, point])
      : [],
  );
}

function faults(scene: Scene): string[] {
  const found: string[] = [];
  const lines = [...linesOf(scene, 'path'), ...linesOf(scene, 'tail'), ...linesOf(scene, 'way')];
  const dots = scene.stars.map(({ xMm, yMm, radiusMm }) => ({ xMm, yMm, radiusMm }));
  scene.labels.forEach((label, index) => {
    const [left, top, right, bottom] = label.box;
    for (const other of scene.labels.slice(index + 1)) {
      const [l, t, r, b] = other.box;
      if (left < r && right > l && top < b && bottom > t) found.push(`${label.text} overlaps ${other.text}`);
    }
    if (gapTo(label, scene.target.xMm, scene.target.yMm) < 3.2) found.push(`${label.text} covers the target`);
    for (const star of dots) {
      // Only what lies beside the box need be measured.
      if (star.xMm < left - 3 || star.xMm > right + 3 || star.yMm < top - 3 || star.yMm > bottom + 3) {
        continue;
      }
      if (gapTo(label, star.xMm, star.yMm) < star.radiusMm) found.push(`${label.text} covers a star`);
    }
    for (const line of lines) if (comesNear(label.box, line, 0)) found.push(`${label.text} lies on a line`);
    for (const x of [left, right]) {
      for (const y of [top, bottom]) {
        if (!isInside(scene.frame, x, y, 0)) found.push(`${label.text} leaves the frame`);
      }
    }
  });
  return found;
}

/** Labels of stars that stand nearer to another star's dot than to their own. */
function strays(scene: Scene): string[] {
  const found: string[] = [];
  for (const label of scene.labels) {
    // A line leads from it to its own.
    if (label.leader !== undefined) continue;
    const own = scene.stars.filter((star) => star.label === label.text);
    if (own.length === 0) continue;
    const clear = (star: { xMm: number; yMm: number; radiusMm: number }): number =>
      gapTo(label, star.xMm, star.yMm) - star.radiusMm;
    const nearest = Math.min(...own.map(clear));
    // A name on the ring of a step stands off its dot by the ring.
    if (nearest > 4.5) continue;
    const others = scene.stars.filter((star) => star.label !== label.text);
    if (Math.min(...others.map(clear)) < nearest) found.push(label.text);
  }
  return found;
}

/** What is wrong with the way a sheet shows: hops too long, landings not drawn, steps miscounted. */
function wrongSteps(scene: Scene, request: ChartRequest, way: Way): string[] {
  if (way.kind !== 'hops') return [];
  const wrong: string[] = [];
  const rings = scene.marks.flatMap((mark) => (mark.role === 'way' && mark.shape === 'circle' ? [mark] : []));
  for (const ring of rings) {
    const isOnStar = scene.stars.some(({ xMm, yMm }) => xMm === ring.xMm && yMm === ring.yMm);
    if (!isOnStar) wrong.push('a ring without a star');
  }
  let seen = 0;
  for (const { from, to, lengthRad } of way.hops) {
    const apart = separationOf(from.star, to?.star ?? request.target);
    if (Math.abs(apart - lengthRad) > 1e-9) {
      wrong.push(`a hop of ${String(apart)} is told as ${String(lengthRad)}`);
    }
    if (apart > 6 * degree) wrong.push(`a hop of ${String(apart / degree)} degrees`);
    if (to !== null && to.star.magnitude > 7) {
      wrong.push(`a landing of magnitude ${String(to.star.magnitude)}`);
    }
    const isDrawn = scene.stars.some(
      ({ raDeg, decDeg }) =>
        Math.abs(raDeg - from.star.raRad / degree) < 1e-9 &&
        Math.abs(decDeg - from.star.decRad / degree) < 1e-9,
    );
    if (isDrawn) seen += 1;
  }
  if (rings.length !== seen) {
    wrong.push(`${String(rings.length)} rings round ${String(seen)} stars of the way`);
  }
  if (way.hops[0]!.from.star.magnitude > 3.5) wrong.push('a start too faint for the eye');
  const numbers = scene.texts.filter(({ role, face }) => role === 'step' && face === 'bold').slice(1);
  const told = numbers.map(({ text }) => text).join();
  if (told !== way.hops.map((_, step) => String(step + 1)).join()) wrong.push(`steps ${told}`);
  return wrong;
}

describe.each(['eye', 'binocular', 'eyepiece'] as const)(`${String(runs)} random %s sheets`, (scale) => {
  const onLabels: string[] = [];
  const astray: string[] = [];
  const onSteps: string[] = [];
  const counts = { labels: 0, named: 0, hops: 0 };

  beforeAll(() => {
    const random = seeded(scale.length * 1009);
    for (let run = 0; run < runs; run++) {
      const request = randomRequest(scale, random);
      const scene = buildScene(stars, deepSky, figures, request);
      onLabels.push(...faults(scene));
      astray.push(...strays(scene));
      counts.labels += scene.labels.length;
      if (scene.labels.some(({ of }) => of === 'Comet Tarn')) counts.named += 1;
      if (scale === 'eyepiece') continue;
      const { way } = wayFor(stars, request, localSky(request.view!));
      onSteps.push(...wrongSteps(scene, request, way));
      if (way.kind === 'hops') counts.hops += way.hops.length;
    }
  }, 120_000);

  it('have no label on another, on a star, the target, a line or over the edge', () => {
    expect(onLabels).toEqual([]);
    expect(counts.labels).toBeGreaterThan(runs * 3);
  });

  it('have every star’s label nearer to its own dot than to any other', () => {
    expect(astray).toEqual([]);
  });

  it('name their target, every one', () => {
    expect(counts.named).toBe(runs);
  });

  if (scale === 'eyepiece') return;

  it('lead to it in hops within the finder’s field, each on a drawn star', () => {
    expect(onSteps).toEqual([]);
    expect(counts.hops).toBeGreaterThan(runs);
  });
});
