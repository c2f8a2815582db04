import type { ConstellationFigure, DeepSkyObject, StarCatalogue } from '#catalogue';
import { plateFor, standingFor } from './aim';
import { isLarge, objectsFor, outline, type PlacedObject, type SymbolSize } from './deepSky';
import { type DrawnStar, starAt, starsFor } from './drawnStars';
import { localSky, positionAngle } from './horizon';
import { companionMarks, isResolved } from './companion';
import { describe } from './describe';
import { frameMark } from './frameMark';
import { drawInset, insetSize } from './insetBox';
import { instrumentLines, isZenithUp } from './instrument';
import { constellationWishes, objectWishes, starWishes } from './labelWords';
import { type ChartRequest, checkRequest } from './request';
import { placeHours } from './publicHours';
import type { Mark, Scene, SheetPoint } from './scene';
import { sceneStars } from './sceneStars';
import type { Plate } from './plate';
import { layOut } from './sheet';
import { doubleStrokeMm, type SymbolKind, symbolMarks } from './symbols';
import { targetMark } from './targetMark';
import { isBehindDisc, targetSymbol } from './targetSymbol';
import { dotDiameterMm } from './dots';
import { figureLines, figureMarks } from './figures';
import { drawKey } from './key';
import { type Disc, type LabelWish, placeLabels } from './labels';
import { placeTail } from './tail';
import { isStarKind, pathWish, targetWish } from './targetWishes';
import { phaseMarks } from './phase';
import { sheetAngle } from './orientation';
import { insetOn } from './insetOn';
import { leaderMarks } from './leader';
import { nextFrame } from './nextFrame';
import { placePath } from './path';
import { wayFor } from './wayFor';
import { placeWay } from './wayMarks';

const degree = Math.PI / 180;
/** A larger target's ring would be lost at the chart's edge; it gets a small one at its middle instead. */
const largestRingedMm = 12;

/** The strip under the chart is this high unless what it has to explain needs more, millimetres. */
const usualKeyMm = 24;

/**
 * The sheet of one target at one scale: where everything stands, in millimetres.
 * @throws ChartProblem where the request cannot be drawn.
 */
export function buildScene(
  stars: StarCatalogue,
  deepSky: readonly DeepSkyObject[],
  figures: readonly ConstellationFigure[],
  request: ChartRequest,
): Scene {
  const fieldDeg = checkRequest(request);
  const first = compose(stars, deepSky, figures, request, fieldDeg, usualKeyMm);
  return first.keyMm <= usualKeyMm
    ? first.scene
    : compose(stars, deepSky, figures, request, fieldDeg, first.keyMm).scene;
}

/** A scene that leaves the key a height, and the height that the key took. */
function compose(
  stars: StarCatalogue,
  deepSky: readonly DeepSkyObject[],
  figures: readonly ConstellationFigure[],
  request: ChartRequest,
  fieldDeg: number,
  keyRoomMm: number,
): { readonly scene: Scene; readonly keyMm: number } {
  const { scale, target } = request;
  const sky = request.view === null ? null : localSky(request.view);
  const guide = wayFor(stars, request, sky);
  const instrument = instrumentLines(request, fieldDeg, sky);
  const inset = insetOn(stars, request, fieldDeg, sky, (panel) =>
    layOut(request, instrument, guide.text, panel, keyRoomMm),
  );
  const sheet = layOut(request, instrument, guide.text, inset === null ? null : insetSize(inset), keyRoomMm);
  const plate = plateFor(request, fieldDeg, sheet.frame, sky);
  const targetAt = plate.toSheet(target)!;
  const standing =
    scale === 'eye' && sky !== null ? standingFor(sky, plate, target, request.skyline ?? []) : null;

  const { drawn, faintestMagnitude } = starsFor(
    stars,
    plate,
    scale,
    (star) => isBehindDisc(star, target) || (standing?.isBelowGround(star) ?? false),
    guide.stars,
  );
  const dots: Disc[] = drawn.map(({ star, at }) => ({
    xMm: at[0],
    yMm: at[1],
    radiusMm: dotDiameterMm(star.magnitude, faintestMagnitude) / 2,
  }));
  const lines = scale === 'eyepiece' ? [] : figureLines(figures, plate, dotRadiusFinder(dots));
  const objects = objectsFor(deepSky, plate, scale, target, drawn, faintestMagnitude).filter(
    ({ object }) =>
      standing?.isBelowGround({ raRad: object.raDeg * degree, decRad: object.decDeg * degree }) !== true,
  );

  const next = request.next === undefined ? [] : nextFrame(request.next, plate, request);
  const symbol = targetSymbol(plate, target, drawn, faintestMagnitude);
  const hours = placeHours(request.publicHours, plate, target.name);
  const path = placePath(request.path, plate, target.name, [
    ...hours.discs,
    ...(symbol.kind === 'disc' ? [{ xMm: targetAt[0], yMm: targetAt[1], radiusMm: symbol.semiMajorMm }] : []),
  ]);
  const outreach = symbol.semiMajorMm <= largestRingedMm ? symbol.semiMajorMm : 0;
  const ring = targetMark(
    targetAt,
    outreach,
    drawn.map(({ at }, index) => ({ at, radiusMm: dots[index]!.radiusMm })),
    target.name,
  );
  const targetDisc: Disc = { xMm: targetAt[0], yMm: targetAt[1], radiusMm: ring.clearRadiusMm };
  const way = placeWay(guide.way, plate, target, targetDisc, faintestMagnitude);
  const tail = placeTail(target.tailDeg ?? null, plate.turn, targetDisc, target.name);
  // A landing's ring is part of its dot as far as writing goes.
  const ringed = dots.map((dot, index): Disc => {
    const ring = way.discs.find(({ xMm, yMm }) => xMm === dot.xMm && yMm === dot.yMm);
    // So are the strokes beside a double star.
    const isDouble = objects.some(
      ({ at, object }) => object.kind === 'doubleStar' && at === drawn[index]!.at,
    );
    if (ring === undefined && !isDouble) return dot;
    const radiusMm = (ring ?? dot).radiusMm + (isDouble ? doubleStrokeMm : 0);
    return { ...dot, radiusMm, dotMm: dot.radiusMm };
  });
  const isOwnDot = ({ at, object }: PlacedObject): boolean =>
    object.kind === 'doubleStar' && drawn.some((star) => star.at === at);
  const objectDiscs: Disc[] = objects.map(({ at, size }) => ({
    xMm: at[0],
    yMm: at[1],
    // Writing may run inside the outline of something large, as it does across a big nebula.
    radiusMm: isLarge(size) ? 0.6 : size.semiMajorMm + 0.4,
  }));
  const pathDiscs: Disc[] = path.inside.map(({ point }) => ({ xMm: point[0], yMm: point[1], radiusMm: 1.2 }));

  const arrowDiscs: Disc[] =
    path.arrow === null ? [] : [{ xMm: path.arrow[0], yMm: path.arrow[1], radiusMm: 1.3 }];

  // A star that is itself the target is named once.
  const own = isStarKind(target.kind) ? starAt(drawn, target) : -1;
  const wishes: LabelWish[] = [
    ...(standing?.wishes ?? []),
    targetWish(target, targetDisc),
    ...way.wishes,
    ...hours.wishes,
    ...tail.wishes,
    ...path.inside.map(({ at }, index) => pathWish(at, pathDiscs[index]!, index, path.inside.length)),
    ...starWishes(drawn, ringed, scale, targetDisc, guide.stars).filter(({ owner }) => owner !== ringed[own]),
    ...objectWishes(objects, objectDiscs, drawn),
    ...(scale === 'eye'
      ? constellationWishes(figures, plate, (corner) => standing?.isBelowGround(corner) ?? false)
      : []),
  ];
  const labels = placeLabels(wishes, {
    frame: plate.frame,
    discs: [
      targetDisc,
      ...ringed,
      ...objectDiscs.filter((_, index) => !isOwnDot(objects[index]!)),
      ...pathDiscs,
      ...arrowDiscs,
      ...hours.discs,
    ],
    walls: [
      ...path.pieces,
      ...way.lines,
      ...way.barbs,
      ...tail.lines,
      ...ring.strokes,
      ...(standing?.walls ?? []),
    ],
    threads: [
      ...lines.map(({ line }) => line),
      ...objects.flatMap(({ at, size }) => outline(at, size)),
      ...outline(targetAt, symbol),
      ...next.flatMap(({ points }) =>
        points.map((point, index) => [point, points[(index + 1) % points.length]!] as const),
      ),
    ],
    isBarred: standing === null ? () => false : (box, wish) => standing.bars(box, wish),
  });

  const used = new Set<SymbolKind>(objects.map(({ object }) => object.kind));
  // A planet's dot or disc needs no word: the ring round it is explained by the target's name.
  if (symbol.kind !== 'point' && symbol.kind !== 'disc') used.add(symbol.kind);
  const key = drawKey(sheet, {
    scale,
    orientation: request.orientation,
    turn: plate.turn,
    mmPerRadian: plate.mmPerRadian,
    faintestMagnitude,
    brightestMagnitude: drawn[0]?.star.magnitude ?? faintestMagnitude,
    symbols: [...used].sort(),
    targetName: target.name,
    hasPath: path.pieces.length > 0,
    hasHours: hours.marks.length > 0,
    hasTail: tail.marks.length > 0,
    hasWay: way.lines.length > 0,
    hasFigures: lines.length > 0,
    hasAltitudes: standing !== null,
    next: request.next,
    upAngleRad: sky === null || isZenithUp(request) ? null : positionAngle(target, sky.zenith),
    showsDirections: standing === null,
  });

  const box =
    inset === null || sheet.panel === null
      ? { marks: [], texts: [] }
      : drawInset({ inset, name: target.name, turn: plate.turn, clock: request.view?.clock }, sheet.panel);
  const look = lookMarks(request, plate, targetAt, symbol, drawn, faintestMagnitude);

  const marks: Mark[] = [
    ...figureMarks(
      lines,
      labels.map(({ box }) => box),
    ),
    ...(standing?.marks ?? []),
    ...objects.flatMap(({ object, at, size }) =>
      symbolMarks({ at, kind: object.kind, ...size, role: 'deepSky', of: object.id, widthPt: 0.6 }),
    ),
    ...next,
    ...way.marks(labels.map(({ box }) => box)),
    ...path.marks,
    ...leaderMarks(labels),
    ...hours.marks,
    ...symbolMarks({ at: targetAt, ...symbol, role: 'target', of: target.name, widthPt: 0.8 }),
    ...look,
    ...tail.marks,
    ...ring.marks,
    frameMark(plate.frame),
    ...box.marks,
    ...key.marks,
    ...sheet.marks,
  ];
  const { centre } = plate.projection;
  const scene: Scene = {
    title: request.words.title,
    language: 'en',
    description: describe(request, fieldDeg, drawn.length, faintestMagnitude),
    widthMm: sheet.widthMm,
    heightMm: sheet.heightMm,
    scale,
    orientation: request.orientation,
    fieldDeg,
    projection: plate.projection.kind,
    centre: { raDeg: centre.raRad / degree, decDeg: centre.decRad / degree },
    plate: { xMm: plate.xMm, yMm: plate.yMm, mmPerRadian: plate.mmPerRadian, turn: plate.turn },
    frame: plate.frame,
    faintestMagnitude,
    stars: sceneStars(drawn, dots, labels),
    labels,
    target: { name: target.name, xMm: targetAt[0], yMm: targetAt[1] },
    path: path.points,
    marks,
    texts: [...sheet.texts, ...key.texts, ...box.texts],
  };
  return { scene, keyMm: key.heightMm };
}

/** What a target shows beyond its outline: the unlit part of a large disc, the second star of a wide pair. */
function lookMarks(
  { inset, target }: ChartRequest,
  plate: Plate,
  at: SheetPoint,
  symbol: SymbolSize & { readonly kind: SymbolKind },
  drawn: readonly DrawnStar[],
  faintestMagnitude: number,
): Mark[] {
  if (inset === undefined) return [];
  if (inset.kind === 'pair') {
    return isResolved(inset, plate.mmPerRadian, faintestMagnitude)
      ? companionMarks(inset, plate, at, drawn, faintestMagnitude, target.name)
      : [];
  }
  if (symbol.kind !== 'disc') return [];
  const bright = sheetAngle(plate.turn, inset.brightLimbDeg * degree);
  return phaseMarks(at, symbol.semiMajorMm, inset.litFraction, bright, 'target', target.name);
}

function dotRadiusFinder(dots: readonly Disc[]): (point: SheetPoint) => number {
  // A figure's corner is a star of the catalogue, so its dot lies within rounding of the same place.
  const near = 0.3;
  return ([x, y]) => {
    for (const dot of dots) {
      if (dot.xMm > x - near && dot.xMm < x + near && dot.yMm > y - near && dot.yMm < y + near) {
        return dot.radiusMm;
      }
    }
    return 0;
  };
}
