import { limitTable, type LimitTable } from '#darkness';
import {
  buildTrack,
  MS_PER_DAY,
  perturbersFor,
  seasonFrame,
  type SeasonFrame,
  type SkyTarget,
  type Track,
  withPerturbations,
} from '#sky';
import { type Programme, type ProgrammeItem } from './programme';

/**
 * All that a programme's season needs, computed once and shared by every site, evening and step. Plain data:
 * it crosses to a worker as it is.
 */
export interface Season extends SeasonSky, SeasonItems {
  readonly programme: Programme;
}

/** The part of a season that does not depend on its programme. */
export interface SeasonSky {
  readonly frame: SeasonFrame;
  readonly sun: Track;
  readonly moon: Track;
}

/** The part of a season that some items of its programme need, in their order. */
export interface SeasonItems {
  readonly tracks: readonly Track[];
  readonly limits: readonly LimitTable[];
}

/** A day around the season for time zones and for evenings that run into the next day. */
const EDGE_MS = 2 * MS_PER_DAY;

/** Prepares a programme for all evenings from one date to another, 'YYYY-MM-DD', both included. */
export function prepareSeason(programme: Programme, fromDate: string, toDate: string): Season {
  const sky = prepareSky(fromDate, toDate);
  return { programme, ...sky, ...prepareItems(sky, programme.items) };
}

/** Frame, Sun and Moon of all evenings from one date to another, 'YYYY-MM-DD', both included. */
export function prepareSky(fromDate: string, toDate: string): SeasonSky {
  const frame = seasonFrame(Date.parse(fromDate) - EDGE_MS, Date.parse(toDate) + EDGE_MS);
  return {
    frame,
    sun: buildTrack({ kind: 'solarSystem', name: 'Sun', body: 'Sun' }, frame),
    moon: buildTrack({ kind: 'solarSystem', name: 'Moon', body: 'Moon' }, frame),
  };
}

/** Tracks and limits of items; the work that workers can share out. */
export function prepareItems({ frame, moon }: SeasonSky, items: readonly ProgrammeItem[]): SeasonItems {
  const targets = items.map(({ target }) => target);
  const planets = perturbersFor(targets, frame.fromMs, frame.toMs);
  const tables = new Map<string, LimitTable>();
  return {
    tracks: targets.map((target) =>
      isMoon(target) ? moon : buildTrack(withPerturbations(target, frame.fromMs, frame.toMs, planets), frame),
    ),
    limits: items.map((item) => sharedTable(tables, item)),
  };
}

function isMoon(target: SkyTarget): boolean {
  return target.kind === 'solarSystem' && target.body === 'Moon';
}

/** Targets of one size in one instrument share a table. */
function sharedTable(tables: Map<string, LimitTable>, { target, instrument }: ProgrammeItem): LimitTable {
  const [major, minor] = apparentSizeArcmin(target);
  const key = JSON.stringify([instrument, major, minor]);
  const known = tables.get(key);
  if (known !== undefined) return known;
  const made = limitTable(instrument, major, minor);
  tables.set(key, made);
  return made;
}

/** The size by which a target is judged against the sky; planets and the Moon count as points. */
function apparentSizeArcmin(target: ProgrammeItem['target']): readonly [major: number, minor: number] {
  if (target.kind === 'fixed') return [target.majorArcmin, target.minorArcmin];
  return target.kind === 'orbit' ? [target.comaArcmin, target.comaArcmin] : [0, 0];
}
