import { type Paper } from '#charts';
import { type HorizonPoint, type Interval } from '#nights';
import { type Imprint } from './imprint';
import { type RunSheet } from './runSheet';

/** Where a target stands at an instant. */
export interface Standing {
  readonly utcMs: number;
  readonly altitudeDeg: number;
  readonly azimuthDeg: number;
}

/** What is known of a target on that night; null where it has no meaning or is not known. */
export interface TargetFacts {
  /** Of a body of the solar system. */
  readonly distanceKm: number | null;
  readonly distanceLy: number | null;
  readonly widthArcmin: number | null;
  /** True width, from distance and width in the sky or from the body itself. */
  readonly widthKm: number | null;
  readonly widthLy: number | null;
  readonly magnitude: number | null;
  readonly litShare: number | null;
  /** In full: "Andromeda". */
  readonly constellation: string | null;
}

export interface PacketTarget {
  readonly name: string;
  /** What people call it beside its name; null where it has but one. */
  readonly otherName: string | null;
  /** "spiral galaxy", "planet", "comet". */
  readonly kind: string;
  readonly gloss: string;
  readonly station: string;
  readonly intervals: readonly Interval[];
  /** In the middle of its look, or at its best where it has none. */
  readonly standing: Standing;
  /** In the middle of the event, for the map of the sky. */
  readonly atMiddle: Standing;
  readonly facts: TargetFacts;
  /** What a brightness other than expected would change, after its times: 'from 21:40 if it runs faint'. */
  readonly uncertain: string | null;
  readonly cautions: readonly string[];
}

export interface PacketStation {
  readonly name: string;
  /** "telescope, 200 mm aperture; 40, 80 and 133 times". */
  readonly words: string;
  readonly kind: 'nakedEye' | 'binocular' | 'telescope';
}

/** The light of the evening; null where it does not come. */
export interface EveningTimes {
  readonly sunsetMs: number | null;
  readonly civilDuskMs: number | null;
  readonly astronomicalDuskMs: number | null;
  readonly moonriseMs: number | null;
  readonly moonsetMs: number | null;
  readonly moonLitShare: number;
  /** Of the public hours. */
  readonly moonUpMinutes: number;
}

/** A point of the sky over the site. */
export interface SkyPlace {
  readonly altitudeDeg: number;
  readonly azimuthDeg: number;
}

/** The sky over a site at an instant, for a map: what stands below the horizon may be left out. */
export interface SkyAbove {
  readonly utcMs: number;
  /** Brightest first. */
  readonly stars: readonly (SkyPlace & { readonly magnitude: number; readonly name: string | null })[];
  /** Pieces of the constellations' figures. */
  readonly lines: readonly (readonly [SkyPlace, SkyPlace])[];
  readonly constellations: readonly (SkyPlace & { readonly name: string })[];
  /** The Moon and the bright planets. */
  readonly bodies: readonly (SkyPlace & { readonly name: string; readonly magnitude: number })[];
}

/** A public evening on the schedule. */
export interface ScheduledEvent {
  readonly title: string;
  readonly siteName: string;
  readonly date: string;
  readonly zone: string;
  readonly startMs: number;
  readonly endMs: number;
  /** Targets to be shown, for a poster. */
  readonly targets: readonly string[];
}

/** Everything that a packet's sheets say, in plain values; times as UTC milliseconds. */
export interface PacketContent {
  readonly paper: Paper;
  readonly club: {
    readonly name: string;
    readonly locale: string;
    readonly bringWords: string;
    readonly callOffWords: string;
    /** Where the public finds the schedule; null: nowhere on the web. */
    readonly scheduleAddress: string | null;
  };
  readonly event: {
    readonly title: string;
    readonly words: string;
    readonly status: 'draft' | 'published' | 'calledOff';
    readonly date: string;
    readonly zone: string;
    readonly startMs: number;
    readonly endMs: number;
  };
  readonly site: {
    readonly name: string;
    readonly latitudeDeg: number;
    readonly longitudeDeg: number;
    readonly elevationM: number;
    readonly directions: string;
    /** What the club knows of dangers there, and whom to call; empty where it has entered nothing. */
    readonly hazards: string;
    readonly emergencyWords: string;
    readonly gate: { readonly opens: string | null; readonly closes: string | null };
    readonly horizon: readonly HorizonPoint[];
    readonly skyMagPerArcsec2: number;
  };
  readonly light: EveningTimes;
  readonly stations: readonly PacketStation[];
  /** What is shown, in the order of the run sheet, then what has no look of its own. */
  readonly targets: readonly PacketTarget[];
  readonly runSheet: RunSheet;
  readonly notShown: readonly { readonly target: string; readonly why: string }[];
  readonly sky: SkyAbove;
  /** Public evenings from this one on, in order. */
  readonly schedule: readonly ScheduledEvent[];
  readonly cautions: readonly string[];
  readonly imprint: Imprint;
  readonly revision: string;
  readonly computedMs: number;
}
