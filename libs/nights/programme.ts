import { type Instrument } from '#darkness';
import { type SkyTarget } from '#sky';
import { type HoursRule } from './hours';

/** What the programme wishes of the Moon. */
export type MoonWish = 'dark' | 'welcome' | 'indifferent';

/** A target promised to the public, and what it takes to keep the promise. */
export interface ProgrammeItem {
  readonly target: SkyTarget;
  /** Its share of the programme beside the others' weights; above 0. */
  readonly weight: number;
  readonly leastMinutes: number;
  readonly leastAltitudeRad: number;
  readonly instrument: Instrument;
}

export interface Programme {
  readonly name: string;
  readonly items: readonly ProgrammeItem[];
  readonly moon: MoonWish;
  readonly hours: HoursRule;
  /** ISO weekdays (1 Monday to 7 Sunday) on which the club holds evenings; empty: any. */
  readonly weekdays: readonly number[];
  /** The club's own custom, scored beside the free choice; null: none. */
  readonly habit: Habit | null;
}

/** "First Saturday of the month": nth 1 to 4, or -1 for the last; ISO weekday. */
export interface Habit {
  readonly nth: 1 | 2 | 3 | 4 | -1;
  readonly weekday: number;
}

/** A date on which the club already does something else, 'YYYY-MM-DD'. */
export interface ClubDate {
  readonly date: string;
  readonly name: string;
}

/** Points that each part of the score can bring. */
export interface ScoreWeights {
  readonly programme: number;
  readonly darkness: number;
  readonly height: number;
  readonly moon: number;
}

export const DEFAULT_WEIGHTS: ScoreWeights = { programme: 50, darkness: 20, height: 15, moon: 15 };
