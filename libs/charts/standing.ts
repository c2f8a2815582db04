import { COMPASS, type CompassPoint, compassPoint } from '#sky';
import type { LocalSky } from './horizon';
import { type LabelWish } from './labels';
import { spotAt, spotsBeside } from './labelSpots';
import type { Box, Line } from './lines';
import { labelRank } from './labelWords';
import { isInside, type Plate } from './plate';
import type { SkyPoint } from './projection';
import type { Mark, SheetPoint } from './scene';
import { skylineCorners, skylineOf, type SkylinePoint } from './skyline';

const degree = Math.PI / 180;

/** What an eye chart adds for one who stands there: the ground, the compass, heights at the sides. */
export interface Standing {
  readonly marks: readonly Mark[];
  readonly wishes: readonly LabelWish[];
  readonly walls: readonly Line[];
  readonly isBelowGround: (point: SkyPoint) => boolean;
  /** True where a label other than the compass's own would stand on the ground. */
  readonly bars: (box: Box, wish: LabelWish) => boolean;
}

/** Half as far round the compass as the ground is drawn, and the step of its outline, degrees. */
const groundHalfDeg = 100;
const groundStepDeg = 1;

/**
 * The ground with the site's skyline, compass points and altitude ticks of a sky over a plate, for a target at
 * an azimuth.
 */
export function standingUnder(
  sky: LocalSky,
  plate: Plate,
  targetAzimuthRad: number,
  skylinePoints: readonly SkylinePoint[],
): Standing {
  const skyline = skylineOf(skylinePoints);
  const { along, level, below } = groundOutline(sky, plate, skyline, skylinePoints);
  const isGround = (place: SkyPoint): boolean => {
    const { altitudeRad, azimuthRad } = sky.altAz(place);
    return altitudeRad < skyline(azimuthRad);
  };
  const showsGround = along.some(([x, y]) => isInside(plate.frame, x, y, 0));
  const ticks = altitudeTicks(sky, plate, isGround);
  const zenith = zenithMark(sky, plate);
  const altitude = { marks: [...ticks.marks, ...zenith.marks], wishes: [...ticks.wishes, ...zenith.wishes] };
  if (!showsGround) {
    return { ...altitude, walls: [], isBelowGround: isGround, bars: () => false };
  }
  const shared = { of: null, layer: 'under', clipped: true } as const;
  const facing = compassPoint(targetAzimuthRad, 8);
  const marks: Mark[] = [
    {
      ...shared,
      shape: 'polygon',
      role: 'ground',
      points: [...along, ...below],
      stroke: null,
      fillGray: 0.88,
    },
    {
      ...shared,
      shape: 'polyline',
      role: 'horizon',
      points: along,
      stroke: { widthPt: 1.4, gray: 0 },
      fillGray: null,
    },
  ];
  if (skylinePoints.length > 0) {
    marks.push({
      ...shared,
      shape: 'polyline',
      role: 'levelHorizon',
      points: level,
      stroke: { widthPt: 0.4, gray: 0.35, dashMm: [0.6, 0.8] },
      fillGray: null,
    });
  }
  marks.push(...altitude.marks);
  const wishes: LabelWish[] = [...altitude.wishes, ...compassWishes(sky, plate, facing)];
  const pointer = pointerUnder(sky, plate, targetAzimuthRad);
  if (pointer !== null) {
    marks.push({
      shape: 'polygon',
      role: 'facing',
      of: null,
      points: pointer,
      stroke: null,
      fillGray: 0,
      layer: 'over',
      clipped: true,
    });
  }
  return {
    marks,
    wishes,
    walls: along.slice(1).map((point, index) => [along[index]!, point]),
    isBelowGround: isGround,
    bars: ([left, top, right, bottom], wish) =>
      wish.rank !== labelRank.facing && isGround(plate.toSky((left + right) / 2, (top + bottom) / 2)),
  };
}

/** The skyline, the level horizon and a line far below it, as far round the compass as a sheet may show. */
function groundOutline(
  sky: LocalSky,
  plate: Plate,
  skyline: (azimuthRad: number) => number,
  skylinePoints: readonly SkylinePoint[],
): { along: SheetPoint[]; level: SheetPoint[]; below: SheetPoint[] } {
  const centre = sky.altAz(plate.projection.centre).azimuthRad;
  const aside: number[] = [];
  for (let step = -groundHalfDeg; step <= groundHalfDeg; step += groundStepDeg) aside.push(step * degree);
  for (const corner of skylineCorners(skylinePoints)) {
    const turn = Math.atan2(Math.sin(corner - centre), Math.cos(corner - centre));
    if (Math.abs(turn) < groundHalfDeg * degree) aside.push(turn);
  }
  aside.sort((one, other) => one - other);
  const along: SheetPoint[] = [];
  const level: SheetPoint[] = [];
  const below: SheetPoint[] = [];
  for (const turn of aside) {
    const azimuth = centre + turn;
    const at = plate.toSheet(sky.placeAt(skyline(azimuth), azimuth));
    const flat = plate.toSheet(sky.placeAt(0, azimuth));
    const under = plate.toSheet(sky.placeAt(-50 * degree, azimuth));
    if (at !== null && flat !== null && under !== null) {
      along.push(at);
      level.push(flat);
      below.unshift(under);
    }
  }
  return { along, level, below };
}

/** The letters of the compass under the level horizon, the one to face larger. */
function compassWishes(sky: LocalSky, plate: Plate, facing: CompassPoint): LabelWish[] {
  return COMPASS.flatMap((point) => {
    const spot = underHorizon(sky, plate, point.azimuthRad, point === facing ? 4.6 : 3.8);
    if (spot === null) return [];
    return [
      {
        text: point.letters,
        of: point.word,
        face: point.letters.length === 3 ? 'sans' : 'bold',
        sizePt: point === facing ? 16 : point.letters.length === 3 ? 8 : 11,
        gray: 0,
        spacingPt: 0,
        mayStray: false,
        rank: labelRank.facing,
        owner: null,
        spots: spotAt(spot),
      } satisfies LabelWish,
    ];
  });
}

/** The direction on the sheet, a unit vector, from the horizon up at an azimuth. */
function upAt(sky: LocalSky, plate: Plate, azimuthRad: number): { at: SheetPoint; up: SheetPoint } | null {
  const at = plate.toSheet(sky.placeAt(0, azimuthRad));
  const above = plate.toSheet(sky.placeAt(degree, azimuthRad));
  if (at === null || above === null) return null;
  const length = Math.hypot(above[0] - at[0], above[1] - at[1]);
  return { at, up: [(above[0] - at[0]) / length, (above[1] - at[1]) / length] };
}

function underHorizon(sky: LocalSky, plate: Plate, azimuthRad: number, depthMm: number): SheetPoint | null {
  const place = upAt(sky, plate, azimuthRad);
  if (place === null) return null;
  return [place.at[0] - place.up[0] * depthMm, place.at[1] - place.up[1] * depthMm];
}

/** A small triangle on the horizon, pointing up, at the azimuth to face. */
function pointerUnder(sky: LocalSky, plate: Plate, azimuthRad: number): SheetPoint[] | null {
  const place = upAt(sky, plate, azimuthRad);
  if (place === null) return null;
  const { at, up } = place;
  const corner = (rise: number, aside: number): SheetPoint => [
    at[0] + up[0] * rise - up[1] * aside,
    at[1] + up[1] * rise + up[0] * aside,
  ];
  return [corner(3.4, 0), corner(0, 1.5), corner(0, -1.5)];
}

/** Ticks at both sides where the sky stands a whole number of tens of degrees high, named at the left. */
function altitudeTicks(
  sky: LocalSky,
  plate: Plate,
  isGround: (place: SkyPoint) => boolean,
): { marks: Mark[]; wishes: LabelWish[] } {
  const marks: Mark[] = [];
  const wishes: LabelWish[] = [];
  const { frame } = plate;
  if (frame.shape !== 'rectangle') return { marks, wishes };
  const tickMm = 2.2;
  for (const [edge, inward] of [
    [frame.xMm, 1],
    [frame.xMm + frame.widthMm, -1],
  ] as const) {
    const heightAt = (yMm: number): number => sky.altAz(plate.toSky(edge, yMm)).altitudeRad / degree;
    const stepMm = 1;
    for (let yMm = frame.yMm; yMm + stepMm <= frame.yMm + frame.heightMm; yMm += stepMm) {
      const upper = heightAt(yMm);
      const lower = heightAt(yMm + stepMm);
      const tens = Math.round((upper + lower) / 20) * 10;
      if (tens < 10 || (upper - tens) * (lower - tens) > 0 || upper === lower) continue;
      const at = yMm + (stepMm * (upper - tens)) / (upper - lower);
      if (isGround(plate.toSky(edge, at))) continue;
      marks.push({
        shape: 'polyline',
        role: 'altitude',
        of: null,
        points: [
          [edge, at],
          [edge + inward * tickMm, at],
        ],
        stroke: { widthPt: 0.8, gray: 0 },
        fillGray: null,
        layer: 'over',
        clipped: true,
      });
      if (inward === 1) {
        wishes.push({
          text: `${String(tens)}°`,
          of: 'altitude',
          face: 'sans',
          sizePt: 8,
          gray: 0,
          spacingPt: 0,
          mayStray: false,
          rank: labelRank.altitude,
          owner: null,
          spots: (size) => [
            { xMm: edge + tickMm + 0.6, yMm: at + (size.above - size.below) / 2, cost: 0 },
            { xMm: edge + 1, yMm: at - 0.6 - size.below, cost: 1 },
            { xMm: edge + 1, yMm: at + 0.6 + size.above, cost: 1.1 },
          ],
        });
      }
    }
  }
  return { marks, wishes };
}

/** A small cross straight overhead, named, where the sheet reaches so high. */
function zenithMark(sky: LocalSky, plate: Plate): { marks: Mark[]; wishes: LabelWish[] } {
  const at = plate.toSheet(sky.zenith);
  if (at === null || !isInside(plate.frame, at[0], at[1], 2)) return { marks: [], wishes: [] };
  const armMm = 1.6;
  const marks: Mark[] = [[armMm, 0] as const, [0, armMm] as const].map(([dx, dy]) => ({
    shape: 'polyline',
    role: 'altitude',
    of: 'zenith',
    points: [
      [at[0] - dx, at[1] - dy],
      [at[0] + dx, at[1] + dy],
    ],
    stroke: { widthPt: 0.6, gray: 0 },
    fillGray: null,
    layer: 'over',
    clipped: true,
  }));
  const disc = { xMm: at[0], yMm: at[1], radiusMm: armMm };
  const wish: LabelWish = {
    text: 'straight overhead',
    of: 'zenith',
    face: 'sans',
    sizePt: 8,
    gray: 0,
    spacingPt: 0,
    mayStray: false,
    rank: labelRank.altitude,
    owner: disc,
    spots: spotsBeside(disc),
  };
  return { marks, wishes: [wish] };
}
