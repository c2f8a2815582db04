import { dotDiameterMm } from '#charts';
import { lineAt } from './composer';
import { type PacketContent, type SkyPlace } from './content';
import { lineWidthMm } from './lettering';
import { type Ink, type Point } from './sheet';
import { numberMarks, skylineAltitude } from './skyline';

/** Stars fainter than this are left out: the map is for eyes that have just come from the car. */
export const FAINTEST_ON_MAP = 4.3;
/** Dots as on a chart that reaches this faint: larger, for one that is read overhead by red light. */
const DOTS_REACH = 5.6;
const DEG = Math.PI / 180;
/** Letters round the rim need this much. */
export const RIM_MM = 7;

/**
 * The whole sky over the site, stereographic about the point overhead: north at the top and east at the left,
 * as it is seen looking up. Targets carry their numbers; the ground covers what the skyline hides.
 */
export function skyMapFigure(content: PacketContent, middle: Point, radiusMm: number): Ink[] {
  const { sky, site, targets } = content;
  const at = skyProjector(middle, radiusMm);
  const isUp = ({ altitudeDeg }: SkyPlace): boolean => altitudeDeg > 0;
  const isClear = (place: SkyPlace): boolean =>
    isUp(place) && place.altitudeDeg > skylineAltitude(site.horizon, place.azimuthDeg);
  const ink: Ink[] = [];
  for (const [from, to] of sky.lines) {
    if (isUp(from) && isUp(to)) {
      ink.push({ shape: 'line', points: [at(from), at(to)], widthPt: 0.4, gray: 0.4 });
    }
  }
  ink.push(...groundRing(content, at, middle, radiusMm));
  const stars = sky.stars.filter((star) => isClear(star) && star.magnitude <= FAINTEST_ON_MAP);
  for (const star of stars) {
    const [x, y] = at(star);
    ink.push(dot(x, y, dotDiameterMm(star.magnitude, DOTS_REACH) / 2));
  }
  const bodies = sky.bodies.filter(isClear);
  for (const body of bodies) {
    const [x, y] = at(body);
    ink.push(dot(x, y, body.name === 'Moon' ? 2 : 1.2));
  }
  const marks = targets
    .map(({ atMiddle }, index) => ({ place: atMiddle, number: index + 1 }))
    .filter(({ place }) => isClear(place));
  const rings = numberMarks(marks.map(({ place, number }) => ({ at: at(place), number })));
  const taken = new Space(middle, radiusMm);
  for (const mark of rings) if (mark.shape === 'disc') taken.add(mark.xMm, mark.yMm, mark.radiusMm);
  for (const star of stars) {
    if (star.magnitude > 2.6) break;
    const [x, y] = at(star);
    taken.add(x, y, 0.6);
  }
  ink.push(...rings);
  for (const body of bodies) ink.push(...labelBeside(body.name, at(body), 'bold', 9, 0, 2.2, taken));
  for (const star of stars) {
    if (star.magnitude > 1.9 || star.name === null) continue;
    ink.push(...labelBeside(star.name, at(star), 'sans', 8, 0, 1.6, taken));
  }
  for (const { name, ...place } of sky.constellations) {
    if (!isClear({ ...place, altitudeDeg: place.altitudeDeg - 4 })) continue;
    ink.push(...labelOver(name.toUpperCase(), at(place), taken));
  }
  return ink;
}

/** Lays places of the sky onto the map: the horizon is the circle, overhead its middle. */
export function skyProjector([xMm, yMm]: Point, radiusMm: number): (place: SkyPlace) => Point {
  return ({ altitudeDeg, azimuthDeg }) => {
    const r = radiusMm * Math.tan(((90 - altitudeDeg) * DEG) / 2);
    return [xMm - r * Math.sin(azimuthDeg * DEG), yMm - r * Math.cos(azimuthDeg * DEG)];
  };
}

/** The ground below the skyline in pale grey, the rim, and the compass around it. */
function groundRing(
  { site }: PacketContent,
  at: (place: SkyPlace) => Point,
  [xMm, yMm]: Point,
  radiusMm: number,
): Ink[] {
  const ink: Ink[] = [];
  if (site.horizon.some(({ altitudeDeg }) => altitudeDeg > 0)) {
    // Out along the rim and back along the skyline: one shape, without seams.
    const around = Array.from({ length: 361 }, (_, azimuthDeg) => azimuthDeg);
    const rim = around.map((azimuthDeg) => at({ azimuthDeg, altitudeDeg: 0 }));
    const skyline = around.map((azimuthDeg) =>
      at({ azimuthDeg, altitudeDeg: Math.max(0, skylineAltitude(site.horizon, azimuthDeg)) }),
    );
    ink.push({ shape: 'area', points: [...rim, ...skyline.toReversed()], gray: 0.93 });
    ink.push({ shape: 'line', points: skyline, widthPt: 0.7, gray: 0 });
  }
  ink.push({ shape: 'disc', xMm, yMm, radiusMm, fillGray: null, strokePt: 1.2 });
  ['N', 'NE', 'E', 'SE', 'S', 'SW', 'W', 'NW'].forEach((letters, index) => {
    const angle = index * 45 * DEG;
    const style = { face: 'bold', sizePt: letters.length === 1 ? 14 : 10 } as const;
    const far = radiusMm + RIM_MM / 2 + 0.6;
    ink.push(
      lineAt(
        letters,
        xMm - far * Math.sin(angle),
        yMm - far * Math.cos(angle) + style.sizePt * 0.127,
        style,
        0.5,
      ),
    );
  });
  return ink;
}

function dot(xMm: number, yMm: number, radiusMm: number): Ink {
  return { shape: 'disc', xMm, yMm, radiusMm, fillGray: 0, strokePt: null };
}

/** What is taken on the map: discs and boxes that no further label may cover. */
class Space {
  private readonly boxes: (readonly [number, number, number, number])[] = [];

  constructor(
    private readonly middle: Point,
    private readonly radiusMm: number,
  ) {}

  add(xMm: number, yMm: number, radiusMm: number): void {
    this.boxes.push([xMm - radiusMm, yMm - radiusMm, xMm + radiusMm, yMm + radiusMm]);
  }

  /** Takes a box where it is free and inside the horizon. */
  take(box: readonly [number, number, number, number]): boolean {
    const [left, top, right, bottom] = box;
    const corners: Point[] = [
      [left, top],
      [right, top],
      [right, bottom],
      [left, bottom],
    ];
    const inside = corners.every(
      ([x, y]) => Math.hypot(x - this.middle[0], y - this.middle[1]) < this.radiusMm - 1,
    );
    const free = this.boxes.every(([l, t, r, b]) => right < l || left > r || bottom < t || top > b);
    if (!inside || !free) return false;
    this.boxes.push(box);
    return true;
  }
}

function labelBeside(
  text: string,
  [x, y]: Point,
  face: 'sans' | 'bold',
  sizePt: number,
  gray: number,
  gapMm: number,
  space: Space,
): Ink[] {
  const width = lineWidthMm(text, face, sizePt);
  const rise = sizePt * 0.26;
  const spots: readonly Point[] = [
    [x + gapMm, y + rise / 2],
    [x - gapMm - width, y + rise / 2],
    [x - width / 2, y - gapMm],
    [x - width / 2, y + gapMm + rise],
    [x + gapMm * 0.7, y - gapMm * 0.7],
    [x + gapMm * 0.7, y + gapMm * 0.7 + rise],
    [x - gapMm * 0.7 - width, y - gapMm * 0.7],
    [x - gapMm * 0.7 - width, y + gapMm * 0.7 + rise],
  ];
  for (const [left, baseline] of spots) {
    if (space.take([left, baseline - rise, left + width, baseline + rise * 0.3])) {
      return [lineAt(text, left, baseline, { face, sizePt, gray })];
    }
  }
  return [];
}

function labelOver(text: string, [x, y]: Point, space: Space): Ink[] {
  const sizePt = 8;
  const width = lineWidthMm(text, 'serif', sizePt);
  const rise = sizePt * 0.26;
  for (const [dx, dy] of [
    [0, 0],
    [0, 4],
    [0, -4],
    [5, 0],
    [-5, 0],
    [0, 8],
    [0, -8],
  ] as const) {
    const left = x + dx - width / 2;
    const baseline = y + dy + rise / 2;
    if (space.take([left, baseline - rise, left + width, baseline + rise * 0.3])) {
      return [lineAt(text, left, baseline, { face: 'serif', sizePt, gray: 0.3 })];
    }
  }
  return [];
}
