import { type HorizonPoint } from '#nights';
import { type Box, lineAt, rule } from './composer';
import { type PacketContent } from './content';
import { type Ink, type Point } from './sheet';

/** Room for the compass letters below the ground line, and for the words above the picture. */
const LETTERS_MM = 7;
const RIM_MM = 3;
const COMPASS = ['N', 'NE', 'E', 'SE', 'S', 'SW', 'W', 'NW', 'N'] as const;
const SMALL = { face: 'sans', sizePt: 8 } as const;

/** Height of a skyline at an azimuth, degrees: straight between its points, closed around the compass. */
export function skylineAltitude(horizon: readonly HorizonPoint[], azimuthDeg: number): number {
  if (horizon.length === 0) return 0;
  const azimuth = ((azimuthDeg % 360) + 360) % 360;
  const after = horizon.findIndex((point) => point.azimuthDeg > azimuth);
  const right = after < 0 ? horizon[0]! : horizon[after]!;
  const left = after <= 0 ? horizon.at(-1)! : horizon[after - 1]!;
  const span = (right.azimuthDeg - left.azimuthDeg + 360) % 360;
  if (span === 0) return left.altitudeDeg;
  const along = (azimuth - left.azimuthDeg + 360) % 360;
  return left.altitudeDeg + ((right.altitudeDeg - left.altitudeDeg) * along) / span;
}

/**
 * The skyline unrolled once around the compass, the pole's side at both ends: silhouette, heights at the left,
 * and the numbers of the run sheet where each target stands in its look.
 */
export function skylineFigure({ site, targets, runSheet }: PacketContent, box: Box): Ink[] {
  const left = box.leftMm + 9;
  const right = box.leftMm + box.widthMm - 2;
  const ground = box.topMm + box.heightMm - LETTERS_MM;
  const top = box.topMm + RIM_MM;
  // In the south the Sun's side, which is the middle of the picture, is north.
  const first = site.latitudeDeg >= 0 ? 0 : 180;
  const shown = targets.filter(({ name }) => runSheet.slots.some(({ target }) => target === name));
  const highest = Math.max(
    30,
    ...site.horizon.map(({ altitudeDeg }) => altitudeDeg + 5),
    ...shown.map(({ standing }) => Math.min(90, standing.altitudeDeg + 5)),
  );
  const x = (azimuthDeg: number): number =>
    left + ((right - left) * ((((azimuthDeg - first) % 360) + 360) % 360)) / 360;
  const y = (altitudeDeg: number): number => ground - ((ground - top) * Math.max(0, altitudeDeg)) / highest;

  const outline: Point[] = [];
  for (let step = 0; step <= 720; step++) {
    const along = left + ((right - left) * step) / 720;
    outline.push([along, y(skylineAltitude(site.horizon, first + step / 2))]);
  }
  const ink: Ink[] = [];
  for (let height = 10; height <= highest; height += 10) {
    const at = y(height);
    if (at < top - 0.01) break;
    ink.push(rule(left, right, at, 0.3, 0.7));
    ink.push(lineAt(`${String(height)}°`, left - 1.2, at + 1, SMALL, 1));
  }
  ink.push({ shape: 'area', points: [...outline, [right, ground], [left, ground]], gray: 0.93 });
  ink.push({ shape: 'line', points: outline, widthPt: 1.1, gray: 0 });
  ink.push(rule(left, right, ground, 0.5));
  COMPASS.forEach((_, index) => {
    const at = left + ((right - left) * index) / 8;
    const letters = COMPASS[(index + first / 45) % 8]!;
    ink.push({
      shape: 'line',
      points: [
        [at, ground],
        [at, ground + 1.4],
      ],
      widthPt: 0.7,
      gray: 0,
    });
    ink.push(lineAt(letters, at, ground + 5.4, { face: 'bold', sizePt: letters.length === 1 ? 11 : 9 }, 0.5));
  });
  ink.push(
    ...numberMarks(
      shown.map(({ standing, name }) => ({
        at: [x(standing.azimuthDeg), y(standing.altitudeDeg)],
        number: targets.findIndex((target) => target.name === name) + 1,
      })),
    ),
  );
  return ink;
}

/** Numbered rings, each moved aside where it would cover one before it. */
export function numberMarks(
  marks: readonly { readonly at: Point; readonly number: number }[],
  radiusMm = 2.4,
): Ink[] {
  const placed: Point[] = [];
  return marks.flatMap(({ at, number }): Ink[] => {
    const free = (point: Point): boolean =>
      placed.every(([px, py]) => Math.hypot(px - point[0], py - point[1]) > 2 * radiusMm + 0.3);
    let spot = at;
    for (let ring = 0; !free(spot) && ring < 40; ring++) {
      const angle = ring * 0.8;
      const far = radiusMm * (1.2 + ring * 0.25);
      spot = [at[0] + far * Math.cos(angle), at[1] + far * Math.sin(angle)];
    }
    placed.push(spot);
    const moved = Math.hypot(spot[0] - at[0], spot[1] - at[1]);
    return [
      ...(moved > 0 ? [{ shape: 'line', points: [at, spot], widthPt: 0.4, gray: 0 } as const] : []),
      { shape: 'disc', xMm: spot[0], yMm: spot[1], radiusMm, fillGray: 1, strokePt: 0.8 },
      lineAt(String(number), spot[0], spot[1] + 1, { face: 'bold', sizePt: 8 }, 0.5),
    ];
  });
}

/** A skyline in words, in eight directions. */
export function skylineWords(horizon: readonly HorizonPoint[]): string {
  if (horizon.length === 0) return 'Level all round.';
  const points = COMPASS.slice(0, 8).map(
    (letters, index) => `${letters} ${String(Math.round(skylineAltitude(horizon, index * 45)))}°`,
  );
  return `The skyline reaches ${points.join(', ')}.`;
}
