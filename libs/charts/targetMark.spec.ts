import { distanceToLine } from './lines';
import type { Mark, SheetPoint } from './scene';
import { targetMark } from './targetMark';

/** A small repeatable generator (the numbers of Park & Miller 1988), so that a failure can be run again. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 48271) % 2147483647) / 2147483647;
}

/** From the middle of a mark's line to the edge of a dot, millimetres. */
function clearance(mark: Mark, dot: { readonly at: SheetPoint; readonly radiusMm: number }): number {
  if (mark.shape === 'polyline') {
    return distanceToLine(dot.at, mark.points[0]!, mark.points[1]!) - dot.radiusMm;
  }
  if (mark.shape !== 'arc') throw new Error(`a target mark has no ${mark.shape}`);
  let least = Infinity;
  for (let angleDeg = mark.fromDeg; angleDeg <= mark.toDeg; angleDeg += 0.5) {
    const angle = (angleDeg * Math.PI) / 180;
    const x = mark.xMm + mark.radiusMm * Math.cos(angle);
    const y = mark.yMm + mark.radiusMm * Math.sin(angle);
    least = Math.min(least, Math.hypot(x - dot.at[0], y - dot.at[1]) - dot.radiusMm);
  }
  return least;
}

describe('targetMark', () => {
  it('never lets its ring or strokes touch a dot', () => {
    const random = seeded(5);
    let arcs = 0;
    let clearest = Infinity;
    for (let run = 0; run < 200; run++) {
      const dots = Array.from({ length: 25 }, () => ({
        at: [92 + 16 * random(), 92 + 16 * random()] as SheetPoint,
        radiusMm: 0.125 + random() * 0.8,
      }));
      for (const mark of targetMark([100, 100], random() * 3, dots, 'x').marks) {
        if (mark.shape === 'arc') arcs += 1;
        for (const dot of dots) clearest = Math.min(clearest, clearance(mark, dot));
      }
    }
    expect(arcs).toBeGreaterThan(400);
    // Half the width of its line, 1.2 pt, and the paper that must show beside it.
    expect(clearest).toBeGreaterThan(0.5 * 1.2 * (25.4 / 72) + 0.1);
  });

  it('is four arcs and four strokes where no star stands near', () => {
    const { marks, clearRadiusMm } = targetMark([50, 50], 0, [], 'M 1');
    expect(marks.filter(({ shape }) => shape === 'arc')).toHaveLength(4);
    expect(marks.filter(({ shape }) => shape === 'polyline')).toHaveLength(4);
    expect(clearRadiusMm).toBeCloseTo(3.7, 6);
  });

  it('goes round a symbol larger than itself', () => {
    const ring = targetMark([50, 50], 8, [], 'M 1').marks.find(({ shape }) => shape === 'arc');
    expect(ring?.shape === 'arc' && ring.radiusMm).toBeCloseTo(9.1, 6);
  });
});
