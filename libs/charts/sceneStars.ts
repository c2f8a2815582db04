import type { DrawnStar } from './drawnStars';
import { haloMm } from './halo';
import type { Disc } from './labels';
import { starKey } from './labelWords';
import type { SceneLabel, SceneStar } from './scene';

const degree = Math.PI / 180;

/** The stars as the scene states them: place, dot, the label that found room, white edge where dots touch. */
export function sceneStars(
  drawn: readonly DrawnStar[],
  dots: readonly Disc[],
  labels: readonly SceneLabel[],
): SceneStar[] {
  const shown = new Map(labels.map((label) => [label.of, label.text]));
  // The two stars of a pair may share a name; the brighter one, which comes first, carries it.
  const take = (key: string): string | null => {
    const text = shown.get(key) ?? null;
    shown.delete(key);
    return text;
  };
  return drawn.map(({ star, at }, index) => {
    const radiusMm = dots[index]!.radiusMm;
    let halo = false;
    for (let brighter = 0; brighter < index && !halo; brighter++) {
      const other = dots[brighter]!;
      const reach = other.radiusMm + radiusMm + haloMm;
      const dx = other.xMm - at[0];
      const dy = other.yMm - at[1];
      // A dot wholly within a brighter one would turn that into a ring; unseen it hides nothing.
      const within = other.radiusMm - radiusMm;
      const square = dx * dx + dy * dy;
      halo = square < reach * reach && (within < 0 || square > within * within);
    }
    return {
      xMm: at[0],
      yMm: at[1],
      raDeg: star.raRad / degree,
      decDeg: star.decRad / degree,
      magnitude: star.magnitude,
      radiusMm,
      label: star.label === null ? null : take(starKey(star.label)),
      halo,
    };
  });
}
