import type { DeepSkyKind } from '#catalogue';
import type { Mark, MarkRole, SheetPoint, Stroke } from './scene';

/** Every kind a symbol is drawn for: the catalogue's, and what moves. */
export type SymbolKind = DeepSkyKind | 'comet' | 'disc' | 'point';

export interface SymbolPlace {
  readonly at: SheetPoint;
  readonly kind: SymbolKind;
  readonly semiMajorMm: number;
  readonly semiMinorMm: number;
  /** Of the major axis on the sheet, degrees from right through down. */
  readonly angleDeg: number;
  readonly role: MarkRole;
  readonly of: string | null;
  readonly widthPt: number;
}

/** What each symbol means, in words for the key. */
export const symbolWords: Readonly<Record<SymbolKind, string>> = {
  galaxy: 'galaxy',
  openCluster: 'open star cluster',
  globularCluster: 'globular star cluster',
  planetaryNebula: 'planetary nebula',
  diffuseNebula: 'bright nebula',
  supernovaRemnant: 'remnant of a supernova',
  clusterWithNebula: 'cluster in a nebula',
  doubleStar: 'double star',
  asterism: 'star pattern',
  starCloud: 'star cloud',
  comet: 'comet',
  disc: 'disc at true size',
  point: 'moving body',
};

/** Half the size of the symbol of an object too small to draw to scale, millimetres. */
export const smallSymbolMm = 0.9;

/** How far the strokes beside a double star's dot reach, millimetres. */
export const doubleStrokeMm = 1.1;

/**
 * The marks of one object: the shapes that printed star atlases share (common practice): ellipse for a galaxy,
 * dashed circle for an open cluster, crossed circle for a globular, circle with four spikes for a planetary,
 * box for a nebula, line through the dot for a double star.
 */
export function symbolMarks(place: SymbolPlace): Mark[] {
  const { at, kind, semiMajorMm: major, semiMinorMm: minor, angleDeg } = place;
  const [xMm, yMm] = at;
  const line: Stroke = { widthPt: place.widthPt, gray: 0 };
  const dashed: Stroke = { ...line, dashMm: [0.9, 0.6] };
  const shared = { role: place.role, of: place.of, fillGray: null, layer: 'over', clipped: true } as const;
  const ellipse = (stroke: Stroke): Mark => ({
    ...shared,
    shape: 'ellipse',
    xMm,
    yMm,
    semiMajorMm: major,
    semiMinorMm: minor,
    angleDeg,
    stroke,
  });
  const turned = (along: number, across: number): SheetPoint => {
    const angle = (angleDeg * Math.PI) / 180;
    return [
      xMm + along * Math.cos(angle) - across * Math.sin(angle),
      yMm + along * Math.sin(angle) + across * Math.cos(angle),
    ];
  };
  const strokeLine = (from: SheetPoint, to: SheetPoint): Mark => ({
    ...shared,
    shape: 'polyline',
    points: [from, to],
    stroke: line,
  });
  const box = (stroke: Stroke): Mark => ({
    ...shared,
    shape: 'polygon',
    points: [turned(-major, -minor), turned(major, -minor), turned(major, minor), turned(-major, minor)],
    stroke,
  });
  switch (kind) {
    case 'galaxy':
      return [ellipse(line)];
    case 'disc':
      // Nothing shines through the Moon or a planet, so nothing shows through its disc.
      return [{ ...ellipse(line), fillGray: 1 }];
    case 'openCluster':
      return [ellipse(dashed)];
    case 'starCloud':
      return [ellipse({ ...line, dashMm: [0.3, 0.9] })];
    case 'globularCluster':
      return [
        ellipse(line),
        strokeLine(turned(-major, 0), turned(major, 0)),
        strokeLine(turned(0, -minor), turned(0, minor)),
      ];
    case 'planetaryNebula': {
      const spike = 0.9;
      return [
        ellipse(line),
        strokeLine([xMm + major, yMm], [xMm + major + spike, yMm]),
        strokeLine([xMm - major, yMm], [xMm - major - spike, yMm]),
        strokeLine([xMm, yMm + major], [xMm, yMm + major + spike]),
        strokeLine([xMm, yMm - major], [xMm, yMm - major - spike]),
      ];
    }
    case 'diffuseNebula':
      return [box(line)];
    case 'supernovaRemnant':
      return [box(dashed)];
    case 'clusterWithNebula':
      return [box(line), ellipse(dashed)];
    case 'doubleStar':
      return [
        strokeLine([xMm - major - doubleStrokeMm, yMm], [xMm - major, yMm]),
        strokeLine([xMm + major, yMm], [xMm + major + doubleStrokeMm, yMm]),
      ];
    case 'asterism':
      return [ellipse({ ...line, dashMm: [1.6, 0.5, 0.3, 0.5] })];
    case 'comet':
      return [
        ellipse({ ...line, dashMm: [0.3, 0.6] }),
        { ...shared, shape: 'circle', xMm, yMm, radiusMm: 0.35, stroke: null, fillGray: 0 },
      ];
    case 'point':
      return [{ ...shared, shape: 'circle', xMm, yMm, radiusMm: major, stroke: null, fillGray: 0 }];
  }
}
