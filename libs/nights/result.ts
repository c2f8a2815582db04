/** The four named parts that sum to an evening's score. */
export type PartName = 'programme' | 'darkness' | 'height' | 'moon';

export interface ScorePart {
  readonly name: PartName;
  readonly points: number;
  readonly of: number;
  /** In plain words. */
  readonly why: string;
}

export interface Interval {
  readonly startMs: number;
  readonly endMs: number;
}

/** The instant at which a target is shown best. */
export interface BestView {
  readonly utcMs: number;
  readonly altitudeDeg: number;
  readonly azimuthDeg: number;
  /** V mag/arcsec2 of the sky behind it. */
  readonly skyBrightness: number;
  /** How much fainter it could be and still be seen, magnitudes. */
  readonly margin: number;
}

/** When a target is shown should it be brighter or fainter than its law says. */
export interface ShowingCase {
  readonly shown: boolean;
  readonly minutes: number;
  readonly intervals: readonly Interval[];
}

/** What the brightness of a comet or asteroid, which nobody knows well, does to its showing. */
export interface ShowingRange {
  /** How much brighter and fainter than its law the two cases are, magnitudes. */
  readonly magnitudes: number;
  readonly ifBrighter: ShowingCase;
  readonly ifFainter: ShowingCase;
  /** Whether either case changes anything worth telling. */
  readonly matters: boolean;
  /** What changes, to stand after the showing's own times: 'from 21:40 if it runs a magnitude faint'. */
  readonly words: string;
}

/** What an evening offers of one target. */
export interface Showing {
  readonly target: string;
  readonly shown: boolean;
  readonly minutes: number;
  readonly intervals: readonly Interval[];
  /** Null when the target cannot be seen at any moment of the public hours. */
  readonly best: BestView | null;
  readonly why: string;
  /** Null but for comets and asteroids with a magnitude law. */
  readonly range: ShowingRange | null;
}

/** One evening at one site, judged against a programme. */
export interface JudgedEvening {
  readonly site: string;
  readonly date: string;
  readonly zone: string;
  /** Null where the evening has none; `note` then says why. */
  readonly publicHours: Interval | null;
  readonly note: string | null;
  readonly score: number;
  readonly parts: readonly ScorePart[];
  readonly shown: number;
  readonly of: number;
  readonly showings: readonly Showing[];
  readonly moon: { readonly illuminatedFraction: number; readonly upMinutes: number };
  readonly darkMinutes: number;
}
