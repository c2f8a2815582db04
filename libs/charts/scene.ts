import type { ProjectionKind } from './projection';
import type { ChartScale, Orientation } from './request';
import type { Turn } from './orientation';
import type { Face } from './typeface';

/** Greys run from 0 (black) to 1 (paper). */
export interface Stroke {
  readonly widthPt: number;
  readonly gray: number;
  /** Lengths of ink and gap in turn; absent for a whole line. */
  readonly dashMm?: readonly number[];
}

export type SheetPoint = readonly [xMm: number, yMm: number];

/** What a mark stands for, so that tests and screen readers need not guess from its shape. */
export type MarkRole =
  | 'ground'
  | 'horizon'
  | 'levelHorizon'
  | 'altitude'
  | 'facing'
  | 'figure'
  | 'deepSky'
  | 'path'
  | 'nextFrame'
  | 'way'
  | 'place'
  | 'tail'
  | 'leader'
  | 'inset'
  | 'target'
  | 'frame'
  | 'key'
  | 'rule';

interface Drawn {
  readonly role: MarkRole;
  /** The object drawn: 'M 31', a constellation's abbreviation, or the target's name; null for furniture. */
  readonly of: string | null;
  readonly stroke: Stroke | null;
  readonly fillGray: number | null;
  /** Under the stars' dots or over them. */
  readonly layer: 'under' | 'over';
  /** True where the chart's frame cuts it off. */
  readonly clipped: boolean;
}

export type Mark =
  | (Drawn & {
      readonly shape: 'circle';
      readonly xMm: number;
      readonly yMm: number;
      readonly radiusMm: number;
    })
  | (Drawn & {
      readonly shape: 'ellipse';
      readonly xMm: number;
      readonly yMm: number;
      readonly semiMajorMm: number;
      readonly semiMinorMm: number;
      /** Of the major axis, from right through down. */
      readonly angleDeg: number;
    })
  | (Drawn & {
      readonly shape: 'arc';
      readonly xMm: number;
      readonly yMm: number;
      readonly radiusMm: number;
      /** From right through down, fromDeg < toDeg. */
      readonly fromDeg: number;
      readonly toDeg: number;
    })
  | (Drawn & { readonly shape: 'polyline' | 'polygon'; readonly points: readonly SheetPoint[] });

/** The chart's edge. The clear sky lies inside it. */
export type Frame =
  | {
      readonly shape: 'rectangle';
      readonly xMm: number;
      readonly yMm: number;
      readonly widthMm: number;
      readonly heightMm: number;
    }
  | { readonly shape: 'circle'; readonly xMm: number; readonly yMm: number; readonly radiusMm: number };

export interface SceneStar {
  readonly xMm: number;
  readonly yMm: number;
  readonly raDeg: number;
  readonly decDeg: number;
  readonly magnitude: number;
  readonly radiusMm: number;
  /** The label that stands beside it on the sheet, or null. */
  readonly label: string | null;
  /** True where it touches a brighter dot and needs a white edge to stay a dot of its own. */
  readonly halo: boolean;
}

/** A line of text; (xMm, yMm) is the left end of its baseline. */
export interface SceneText {
  readonly text: string;
  readonly xMm: number;
  readonly yMm: number;
  readonly widthMm: number;
  readonly face: Face;
  readonly sizePt: number;
  readonly gray: number;
  /** Extra space between letters, points. */
  readonly spacingPt: number;
}

export interface SceneLabel extends SceneText {
  /** [left, top, right, bottom] in millimetres. */
  readonly box: readonly [number, number, number, number];
  /** What it names. */
  readonly of: string;
  /** The thin line from it to what it names, where it stands off that. */
  readonly leader?: readonly [SheetPoint, SheetPoint];
}

export type TextRole = 'title' | 'subtitle' | 'instrument' | 'key' | 'step' | 'note' | 'caution' | 'foot';

export interface SheetText extends SceneText {
  readonly role: TextRole;
  /** Lines of one paragraph share a number, so that a tagged PDF reads them as one. */
  readonly paragraph: number;
}

/** One sheet, as pure data: millimetres from the top left of the paper, right and down. */
export interface Scene {
  readonly title: string;
  readonly language: 'en';
  /** The chart in a sentence, for those who cannot see it. */
  readonly description: string;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly scale: ChartScale;
  readonly orientation: Orientation;
  readonly fieldDeg: number;
  readonly projection: ProjectionKind;
  readonly centre: { readonly raDeg: number; readonly decDeg: number };
  /** Where the centre lies, millimetres in a radian there, and how the sky is turned onto the sheet. */
  readonly plate: {
    readonly xMm: number;
    readonly yMm: number;
    readonly mmPerRadian: number;
    readonly turn: Turn;
  };
  readonly frame: Frame;
  readonly faintestMagnitude: number;
  /** Brightest first. */
  readonly stars: readonly SceneStar[];
  readonly labels: readonly SceneLabel[];
  readonly target: { readonly name: string; readonly xMm: number; readonly yMm: number };
  readonly path: readonly { readonly at: string; readonly xMm: number; readonly yMm: number }[];
  readonly marks: readonly Mark[];
  readonly texts: readonly SheetText[];
}
