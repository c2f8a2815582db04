import { type Face, type Paper, type Scene } from '#charts';

/** What can be printed in a packet. */
export const SHEET_NAMES = ['cover', 'runSheet', 'finder', 'station', 'site', 'handout', 'poster'] as const;
export type SheetName = (typeof SHEET_NAMES)[number];

export type Point = readonly [xMm: number, yMm: number];

/** Something drawn: millimetres from the top left of the paper; greys run from 0 (black) to 1 (paper). */
export type Ink =
  | {
      readonly shape: 'text';
      readonly text: string;
      /** Left end of the baseline. */
      readonly xMm: number;
      readonly yMm: number;
      readonly face: Face;
      readonly sizePt: number;
      readonly gray: number;
    }
  | {
      readonly shape: 'line';
      readonly points: readonly Point[];
      readonly widthPt: number;
      readonly gray: number;
      readonly dashMm?: readonly number[];
    }
  | { readonly shape: 'area'; readonly points: readonly Point[]; readonly gray: number }
  | {
      readonly shape: 'disc';
      readonly xMm: number;
      readonly yMm: number;
      readonly radiusMm: number;
      readonly fillGray: number | null;
      readonly strokePt: number | null;
    };

export type Tag = 'H1' | 'H2' | 'P' | 'Figure' | 'Table' | 'TR' | 'TH' | 'TD';

/** A piece of a sheet as a reader of tagged PDF meets it; parts come after its own ink. */
export interface Part {
  readonly tag: Tag;
  /** Of a TH: what it is the head of. */
  readonly scope?: 'Row' | 'Column';
  /** Of a figure: what it shows, in words. */
  readonly alt?: string;
  readonly ink: readonly Ink[];
  readonly parts: readonly Part[];
}

/** A page of text and figures. */
export interface TextSheet {
  readonly kind: 'text';
  readonly name: SheetName;
  /** For the bookmark. */
  readonly title: string;
  /** True where it goes on from the sheet before and needs no bookmark of its own. */
  readonly continued: boolean;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly parts: readonly Part[];
  /** Rules and grounds that carry no meaning of their own. */
  readonly ornaments: readonly Ink[];
}

/** A page that is a finder chart. */
export interface ChartSheet {
  readonly kind: 'chart';
  readonly name: 'finder';
  readonly title: string;
  readonly continued: false;
  readonly scene: Scene;
}

export type PacketSheet = TextSheet | ChartSheet;

export interface PaperSize {
  readonly widthMm: number;
  readonly heightMm: number;
}

export const PAPER_SIZES: Readonly<Record<Paper, PaperSize>> = {
  a4: { widthMm: 210, heightMm: 297 },
  letter: { widthMm: 215.9, heightMm: 279.4 },
};

/** The margins that all sheets share, millimetres. */
export const SIDE_MM = 12;
export const TOP_MM = 11;
export const FOOT_BASELINE_MM = 9;
export const FOOT_LINE_MM = 3.6;
export const FOOT_PT = 8;
