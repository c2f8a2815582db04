import type { ConstellationFigure, DeepSkyObject, StarCatalogue } from '#catalogue';
import { plateFor, standingFor } from './aim';
import { isLarge, objectsFor, outline } from './deepSky';
import { starAt, starsFor } from './drawnStars';
import { localSky, positionAngle } from './horizon';
import { fieldWords, instrumentLines, isZenithUp } from './instrument';
import { constellationWishes, labelRank, objectWishes, starWishes } from './labelWords';
import { type ChartRequest, type ChartTarget, checkRequest } from './request';
import type { Frame, Mark, Scene, SheetPoint } from './scene';
import { sceneStars } from './sceneStars';
import { layOut } from './sheet';
import { type SymbolKind, symbolMarks } from './symbols';
import { targetMark } from './targetMark';
import { isBehindDisc, targetSymbol } from './targetSymbol';
import { dotDiameterMm } from './dots';
import { figureLines, figureMarks } from './figures';
import { drawKey } from './key';
import { type Disc, type LabelWish, placeLabels, spotsAround, spotsBeside } from './labels';
import { nextFrame } from './nextFrame';
import { placePath } from './path';

const degree = Math.PI / 180;
/** A larger target's ring would be lost at the chart's edge; it gets a small one at its middle instead. */
const largestRingedMm = 12;

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
  const { scale, target } = request;
  const sky = request.view === null ? null : localSky(request.view);
  const sheet = layOut(request, instrumentLines(request, fieldDeg, sky));
  const plate = plateFor(request, fieldDeg, sheet.frame, sky);
  const targetAt = plate.toSheet(target)!;
  const standing = scale === 'eye' && sky !== null ? standingFor(sky, plate, target) : null;

  const { drawn, faintestMagnitude } = starsFor(
    stars,
    plate,
    scale,
    (star) => isBehindDisc(star, target) || (standing?.isBelowGround(star) ?? false),
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
  const path = placePath(request.path, plate, target.name);

  const next = request.next === undefined ? [] : nextFrame(request.next, plate, request);
  const symbol = targetSymbol(plate, target, drawn, faintestMagnitude);
  const outreach = symbol.semiMajorMm <= largestRingedMm ? symbol.semiMajorMm : 0;
  const ring = targetMark(
    targetAt,
    outreach,
    drawn.map(({ at }, index) => ({ at, radiusMm: dots[index]!.radiusMm })),
    target.name,
  );
  const targetDisc: Disc = { xMm: targetAt[0], yMm: targetAt[1], radiusMm: ring.clearRadiusMm };
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
    ...path.inside.map(({ at }, index) => pathWish(at, pathDiscs[index]!, index, path.inside.length)),
    ...starWishes(drawn, dots, scale, targetDisc).filter(({ owner }) => owner !== dots[own]),
    ...objectWishes(objects, objectDiscs, drawn),
    ...(scale === 'eye'
      ? constellationWishes(figures, plate, (corner) => standing?.isBelowGround(corner) ?? false)
      : []),
  ];
  const labels = placeLabels(wishes, {
    frame: plate.frame,
    discs: [targetDisc, ...dots, ...objectDiscs, ...pathDiscs, ...arrowDiscs],
    walls: [...path.pieces, ...ring.strokes, ...(standing?.walls ?? [])],
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
    hasFigures: lines.length > 0,
    hasAltitudes: standing !== null,
    next: request.next,
    upAngleRad: sky === null || isZenithUp(request) ? null : positionAngle(target, sky.zenith),
    showsDirections: standing === null,
  });

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
    ...path.marks,
    ...symbolMarks({ at: targetAt, ...symbol, role: 'target', of: target.name, widthPt: 0.8 }),
    ...ring.marks,
    frameMark(plate.frame),
    ...key.marks,
    ...sheet.marks,
  ];
  const { centre } = plate.projection;
  return {
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
    texts: [...sheet.texts, ...key.texts],
  };
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

/** The target's label may stand this far out before it is given up, millimetres. */
const targetLabelReachMm = 30;

function isStarKind(kind: string): boolean {
  return kind === 'star' || kind === 'doubleStar';
}

function targetWish(target: ChartTarget, owner: Disc): LabelWish {
  return {
    text: target.name,
    of: target.name,
    face: 'bold',
    sizePt: 11,
    gray: 0,
    spacingPt: 0,
    mayStray: true,
    rank: labelRank.target,
    owner,
    spots: spotsAround(owner, targetLabelReachMm),
  };
}

function pathWish(at: string, owner: Disc, index: number, count: number): LabelWish {
  const isEnd = index === 0 || index === count - 1;
  return {
    text: at,
    of: `path ${at}`,
    face: 'sans',
    sizePt: 8,
    gray: 0,
    spacingPt: 0,
    mayStray: false,
    rank: labelRank.path + (isEnd ? 0 : 0.1),
    owner,
    spots: spotsBeside(owner),
  };
}

function frameMark(frame: Frame): Mark {
  const shared = {
    role: 'frame',
    of: null,
    stroke: { widthPt: 1, gray: 0 },
    fillGray: null,
    layer: 'over',
    clipped: false,
  } as const;
  if (frame.shape === 'circle') {
    return { ...shared, shape: 'circle', xMm: frame.xMm, yMm: frame.yMm, radiusMm: frame.radiusMm };
  }
  const right = frame.xMm + frame.widthMm;
  const bottom = frame.yMm + frame.heightMm;
  return {
    ...shared,
    shape: 'polygon',
    points: [
      [frame.xMm, frame.yMm],
      [right, frame.yMm],
      [right, bottom],
      [frame.xMm, bottom],
    ],
  };
}

function describe(request: ChartRequest, fieldDeg: number, count: number, faintest: number): string {
  const instrument = {
    eye: 'the unaided eye',
    binocular: 'binoculars or a finder',
    eyepiece: 'a telescope’s eyepiece',
  }[request.scale];
  return (
    `Finder chart of ${request.target.name} for ${instrument}, ${fieldWords(fieldDeg)} across, ` +
    `with ${String(count)} stars to magnitude ${faintest.toFixed(1)}.`
  );
}
