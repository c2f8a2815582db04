import type { DeepSkyKind, DeepSkyObject } from '#catalogue';
import { dotDiameterMm } from './dots';
import { type DrawnStar, starAt } from './drawnStars';
import type { Line } from './lines';
import { sheetAngle } from './orientation';
import { isInside, type Plate } from './plate';
import { positionAngle } from './horizon';
import type { ChartScale, ChartTarget } from './request';
import type { SheetPoint } from './scene';
import { smallSymbolMm, type SymbolKind } from './symbols';

const arcmin = Math.PI / 180 / 60;

/** The faintest objects worth a symbol at each scale (trade practice: what such an instrument shows). */
const faintest: Readonly<Record<ChartScale, number>> = { eye: 6.3, binocular: 10, eyepiece: Infinity };

/** Objects this big on the sheet are drawn to scale, millimetres along the major axis. */
const toScaleFromMm = 1;

/** Doubles wider than this are split by steadied binoculars (trade practice), arcseconds. */
const binocularPairArcsec = 15;

function isWorthIt(object: DeepSkyObject, scale: ChartScale): boolean {
  if (object.magnitude > faintest[scale]) return false;
  if (object.kind !== 'doubleStar' || scale === 'eyepiece') return true;
  return scale === 'binocular' && (object.double?.separationArcsec ?? 0) >= binocularPairArcsec;
}

export interface PlacedObject {
  readonly object: DeepSkyObject;
  readonly at: SheetPoint;
  readonly size: SymbolSize;
}

export interface SymbolSize {
  readonly semiMajorMm: number;
  readonly semiMinorMm: number;
  readonly angleDeg: number;
}

/** The catalogued objects a sheet shows besides its target, brightest first, thinned where symbols would meet. */
export function objectsFor(
  deepSky: readonly DeepSkyObject[],
  plate: Plate,
  scale: ChartScale,
  target: ChartTarget,
  drawn: readonly DrawnStar[],
  faintestStar: number,
): PlacedObject[] {
  const placed: PlacedObject[] = [];
  const sorted = deepSky
    .filter((object) => isWorthIt(object, scale) && !isTarget(object, target))
    .sort((one, other) => one.magnitude - other.magnitude || (one.id < other.id ? -1 : 1));
  for (const object of sorted) {
    const place = { raRad: (object.raDeg * Math.PI) / 180, decRad: (object.decDeg * Math.PI) / 180 };
    // A double's sign belongs to its dot, wherever the star's own catalogue puts that.
    const own = object.kind === 'doubleStar' ? drawn[starAt(drawn, place)] : undefined;
    const at = own?.at ?? plate.toSheet(place);
    if (at === null || !isInside(plate.frame, at[0], at[1], smallSymbolMm)) continue;
    const tooNear = placed.some(
      ({ at: other }) => Math.hypot(at[0] - other[0], at[1] - other[1]) < 2 * smallSymbolMm,
    );
    if (tooNear) continue;
    placed.push({
      object,
      at,
      size: symbolSize(
        plate,
        {
          ...place,
          kind: object.kind,
          majorArcmin: object.majorArcmin,
          minorArcmin: object.minorArcmin,
          positionAngleDeg: object.positionAngleDeg,
        },
        object.kind === 'doubleStar'
          ? dotDiameterMm(own?.star.magnitude ?? object.magnitude, faintestStar) / 2
          : null,
      ),
    });
  }
  return placed;
}

/** True size and angle where that is 1 mm or more, else the small symbol; a double star's goes round its dot. */
export function symbolSize(
  plate: Plate,
  shape: Pick<ChartTarget, 'raRad' | 'decRad' | 'kind' | 'majorArcmin' | 'minorArcmin' | 'positionAngleDeg'>,
  dotRadiusMm: number | null,
): SymbolSize {
  if (dotRadiusMm !== null) {
    return { semiMajorMm: dotRadiusMm, semiMinorMm: dotRadiusMm, angleDeg: 0 };
  }
  const mmPerArcmin = localScale(plate, shape) * arcmin;
  const major = shape.majorArcmin * mmPerArcmin;
  const minor = (shape.minorArcmin > 0 ? shape.minorArcmin : shape.majorArcmin) * mmPerArcmin;
  const angleDeg =
    (localAngle(plate, shape, ((shape.positionAngleDeg ?? 90) * Math.PI) / 180) * 180) / Math.PI;
  const isRound = shape.positionAngleDeg === null && shape.kind !== 'galaxy';
  if (isRound && major >= toScaleFromMm) {
    return { semiMajorMm: major / 2, semiMinorMm: Math.max(minor / 2, 0.3), angleDeg: 0 };
  }
  if (major >= toScaleFromMm) {
    return { semiMajorMm: major / 2, semiMinorMm: Math.max(minor / 2, 0.3), angleDeg };
  }
  const elongated = shape.kind === 'galaxy';
  return {
    semiMajorMm: elongated ? smallSymbolMm * 1.3 : smallSymbolMm,
    semiMinorMm: elongated ? smallSymbolMm * 0.65 : smallSymbolMm,
    angleDeg: elongated ? angleDeg : 0,
  };
}

/** Objects this big are outlines that writing may stand in, not signs that it must keep off. */
export function isLarge(size: SymbolSize): boolean {
  return size.semiMajorMm > 5;
}

/** The outline of a large object as short lines, so that labels can keep off it; none for a small one. */
export function outline(at: SheetPoint, size: SymbolSize): Line[] {
  if (!isLarge(size)) return [];
  const turn = (size.angleDeg * Math.PI) / 180;
  const point = (step: number): SheetPoint => {
    const along = size.semiMajorMm * Math.cos((step * Math.PI) / 24);
    const across = size.semiMinorMm * Math.sin((step * Math.PI) / 24);
    return [
      at[0] + along * Math.cos(turn) - across * Math.sin(turn),
      at[1] + along * Math.sin(turn) + across * Math.cos(turn),
    ];
  };
  return Array.from({ length: 48 }, (_, step) => [point(step), point(step + 1)] as const);
}

/** Millimetres in a radian at a place; away from the centre the flat sky is stretched. */
function localScale(plate: Plate, { raRad, decRad }: { raRad: number; decRad: number }): number {
  const step = 1e-4;
  const one = plate.toSheet({ raRad, decRad: decRad - step / 2 });
  const other = plate.toSheet({ raRad, decRad: decRad + step / 2 });
  if (one === null || other === null) return plate.mmPerRadian;
  return Math.hypot(one[0] - other[0], one[1] - other[1]) / step;
}

/** The sheet angle (from right through down) of a position angle at a place, where north may lean. */
function localAngle(
  plate: Plate,
  place: { raRad: number; decRad: number },
  positionAngleRad: number,
): number {
  const { centre } = plate.projection;
  const separate = Math.abs(place.raRad - centre.raRad) + Math.abs(place.decRad - centre.decRad);
  if (separate < 1e-9) return sheetAngle(plate.turn, positionAngleRad);
  // A tenth of a milliradian along the position angle shows which way it goes on the sheet.
  const step = 1e-4;
  const sinDec =
    Math.sin(place.decRad) * Math.cos(step) +
    Math.cos(place.decRad) * Math.sin(step) * Math.cos(positionAngleRad);
  const ahead = {
    decRad: Math.asin(Math.max(-1, Math.min(1, sinDec))),
    raRad:
      place.raRad +
      Math.atan2(
        Math.sin(positionAngleRad) * Math.sin(step) * Math.cos(place.decRad),
        Math.cos(step) - Math.sin(place.decRad) * sinDec,
      ),
  };
  const from = plate.toSheet(place);
  const to = plate.toSheet(ahead);
  if (from === null || to === null) return sheetAngle(plate.turn, positionAngle(place, ahead));
  return Math.atan2(to[1] - from[1], to[0] - from[0]);
}

function isTarget(object: DeepSkyObject, target: ChartTarget): boolean {
  const plain = (name: string): string => name.toLowerCase().replaceAll(/\s+/g, '');
  const names = [object.id, ...object.otherNames].map(plain);
  if (names.includes(plain(target.name))) return true;
  const dRa = Math.abs((object.raDeg * Math.PI) / 180 - target.raRad) % (2 * Math.PI);
  const across = Math.min(dRa, 2 * Math.PI - dRa) * Math.cos(target.decRad);
  const along = (object.decDeg * Math.PI) / 180 - target.decRad;
  return object.kind === target.kind && Math.hypot(across, along) < arcmin;
}

const deepSkyKinds: Readonly<Record<DeepSkyKind, true>> = {
  galaxy: true,
  openCluster: true,
  globularCluster: true,
  planetaryNebula: true,
  diffuseNebula: true,
  supernovaRemnant: true,
  clusterWithNebula: true,
  doubleStar: true,
  asterism: true,
  starCloud: true,
};

/** The symbol a target's kind is drawn with. Sun, Moon and planets are discs, anything unknown a point. */
export function symbolKindOf(kind: string): SymbolKind {
  if (Object.hasOwn(deepSkyKinds, kind)) return kind as DeepSkyKind;
  if (kind === 'comet') return 'comet';
  return kind === 'Sun' || kind === 'Moon' ? 'disc' : 'point';
}
