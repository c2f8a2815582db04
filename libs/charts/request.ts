import type { Inset } from './inset';
import type { SkylinePoint } from './skyline';

/** Which way of looking the sheet is for: the unaided eye, binoculars or a finder, a telescope's eyepiece. */
export type ChartScale = 'eye' | 'binocular' | 'eyepiece';

/** How the instrument turns its picture: as the eye sees it, turned half round, or left and right exchanged. */
export type Orientation = 'upright' | 'rotated' | 'mirrored';

export type Paper = 'a4' | 'letter';

/** What is to be found. Places are astrometric J2000, topocentric, radians; sizes in arcminutes. */
export interface ChartTarget {
  readonly name: string;
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number | null;
  /** 'comet', 'asteroid', 'planet', 'Moon', 'Sun', 'galaxy', 'openCluster', … */
  readonly kind: string;
  readonly majorArcmin: number;
  readonly minorArcmin: number;
  /** Of the major axis, degrees from north through east; null where unknown or meaningless. */
  readonly positionAngleDeg: number | null;
  /** Which way a comet's tail points, degrees from north through east; left out or null for all else. */
  readonly tailDeg?: number | null;
}

/**
 * One place of a moving target; `at` is the local time or date to print beside its tick, empty for a place
 * between ticks that only bends the line.
 */
export interface PathPoint {
  readonly at: string;
  readonly utcMs: number;
  readonly raRad: number;
  readonly decRad: number;
}

/** Where and when one looks: turns the eye chart zenith up and gives it its horizon. */
export interface ChartView {
  readonly utcMs: number;
  readonly latitudeRad: number;
  readonly longitudeRad: number;
  /** The local time of `utcMs` in words, "23:30", for readings that hold at that minute only. */
  readonly clock?: string;
}

/** The words round the chart, already in the reader's language and local time. */
export interface ChartWords {
  readonly title: string;
  readonly subtitle: string;
  readonly notes: readonly string[];
  readonly cautions: readonly string[];
  readonly foot: string;
}

export interface ChartRequest {
  readonly scale: ChartScale;
  /** Width of the field in degrees, more than 0 and at most 120; null takes the scale's usual one. */
  readonly fieldDeg: number | null;
  readonly orientation: Orientation;
  readonly paper: Paper;
  readonly target: ChartTarget;
  readonly path: readonly PathPoint[];
  readonly view: ChartView | null;
  readonly words: ChartWords;
  /**
   * Width in degrees of the finder that the way from star to star is worked out for; left out: 6 degrees; null:
   * no way is wanted.
   */
  readonly finderFieldDeg?: number | null;
  /** Where a moving target stands as the public hours begin and end; `at` is the local time of each. */
  readonly publicHours?: { readonly opens: PathPoint; readonly closes: PathPoint };
  /** How the target looks in a telescope, drawn in a box of its own on all but the eye's sheet. */
  readonly inset?: Inset;
  /** The site's skyline, drawn at the foot of an eye chart; left out or empty: the level horizon. */
  readonly skyline?: readonly SkylinePoint[];
  /** What points to the top of an upright sheet; left out: the zenith at the eye scale, else north. */
  readonly up?: 'zenith' | 'north';
  /** The narrower sheet that follows this one, whose outline this one shows; left out where none follows. */
  readonly next?: { readonly scale: 'binocular' | 'eyepiece'; readonly fieldDeg: number };
}

/** A request no sheet can be drawn for: which field, what it was, what would be right. */
export class ChartProblem extends Error {
  constructor(
    readonly field: string,
    readonly value: unknown,
    message: string,
  ) {
    super(message);
    this.name = 'ChartProblem';
  }
}

/** The field each scale shows unless told otherwise, degrees. */
export const usualFieldDeg: Readonly<Record<ChartScale, number>> = { eye: 60, binocular: 8, eyepiece: 1.5 };

/** The field of a common finder, degrees (common practice: 5 to 7). */
export const usualFinderFieldDeg = 6;

const smallestFieldDeg = 0.1;
const widestFieldDeg = 120;
const orientations: readonly string[] = ['upright', 'rotated', 'mirrored'];
const papers: readonly string[] = ['a4', 'letter'];

/**
 * Gives the field's width in degrees after checking the whole request.
 * @throws ChartProblem naming the first field that is wrong.
 */
export function checkRequest(request: ChartRequest): number {
  const { scale, orientation, paper, target, view } = request;
  if (!Object.hasOwn(usualFieldDeg, scale)) {
    throw new ChartProblem('scale', scale, `scale is "${scale}"; it must be eye, binocular or eyepiece`);
  }
  if (!orientations.includes(orientation)) {
    throw new ChartProblem(
      'orientation',
      orientation,
      `orientation is "${orientation}"; it must be upright, rotated or mirrored`,
    );
  }
  if (!papers.includes(paper)) {
    throw new ChartProblem('paper', paper, `paper is "${paper}"; it must be a4 or letter`);
  }
  const fieldDeg = request.fieldDeg ?? usualFieldDeg[scale];
  if (!(fieldDeg >= smallestFieldDeg && fieldDeg <= widestFieldDeg)) {
    throw new ChartProblem(
      'fieldDeg',
      request.fieldDeg,
      `the field is ${String(fieldDeg)} degrees; it must be from ${String(smallestFieldDeg)} to ${String(widestFieldDeg)}`,
    );
  }
  checkPlace('target', target);
  if (request.next !== undefined && !(request.next.fieldDeg > 0 && request.next.fieldDeg < fieldDeg)) {
    throw new ChartProblem(
      'next.fieldDeg',
      request.next.fieldDeg,
      `the next sheet's field is ${String(request.next.fieldDeg)} degrees; it must be narrower than this sheet's ${String(fieldDeg)}`,
    );
  }
  request.path.forEach((point, index) => {
    checkPlace(`path[${String(index)}]`, point);
  });
  checkSkyline(request.skyline ?? []);
  const finder = request.finderFieldDeg ?? usualFinderFieldDeg;
  if (!(finder >= 1 && finder <= 20)) {
    throw new ChartProblem(
      'finderFieldDeg',
      finder,
      `the finder's field is ${String(finder)} degrees; it must be from 1 to 20`,
    );
  }
  if (view !== null) {
    checkFinite('view.utcMs', view.utcMs);
    checkFinite('view.longitudeRad', view.longitudeRad);
    checkWithin('view.latitudeRad', view.latitudeRad, Math.PI / 2);
  }
  return fieldDeg;
}

function checkSkyline(points: readonly SkylinePoint[]): void {
  points.forEach(({ azimuthDeg, altitudeDeg }, index) => {
    checkFinite(`skyline[${String(index)}].azimuthDeg`, azimuthDeg);
    if (!(altitudeDeg >= -10 && altitudeDeg < 90)) {
      throw new ChartProblem(
        `skyline[${String(index)}].altitudeDeg`,
        altitudeDeg,
        `skyline[${String(index)}].altitudeDeg is ${String(altitudeDeg)}; it must be from -10 to less than 90 degrees`,
      );
    }
  });
}

function checkPlace(field: string, place: { readonly raRad: number; readonly decRad: number }): void {
  checkFinite(`${field}.raRad`, place.raRad);
  checkWithin(`${field}.decRad`, place.decRad, Math.PI / 2);
}

function checkFinite(field: string, value: number): void {
  if (!Number.isFinite(value)) {
    throw new ChartProblem(field, value, `${field} is ${String(value)}; it must be a finite number`);
  }
}

function checkWithin(field: string, value: number, limit: number): void {
  if (!(Math.abs(value) <= limit + 1e-12)) {
    throw new ChartProblem(
      field,
      value,
      `${field} is ${String(value)}; it must be from ${(-limit).toFixed(4)} to ${limit.toFixed(4)} radians`,
    );
  }
}
