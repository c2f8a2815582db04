import { highestBetween } from './horizon';
import {
  createEveningItem,
  createLook,
  type EveningItem,
  type Hindrance,
  type Look,
  lookAt,
  setEveningItem,
} from './look';
import { type PublicHours } from './hours';
import { staysLow } from './staysLow';
import { type Season } from './season';
import { createSiteInstant, type PreparedSite, setSiteInstant, type SiteInstant } from './siteInstant';

/** Coarse steps, how each is divided where something changes in it, and how finely an edge is found. */
export const STEP_MS = 300_000;
const PARTS = 10;
const EDGE_HALVINGS = 3;

/** The best moment of a target in an evening. */
export interface MeasuredBest {
  utcMs: number;
  sinAltitude: number;
  azimuthRad: number;
  luminanceNl: number;
  margin: number;
}

/** What was measured of one target in one evening's public hours; filled again and again. */
export interface MeasuredTarget {
  totalMs: number;
  shown: boolean;
  /** Start and end in turn, UTC ms. */
  readonly edges: number[];
  /** Sine of its greatest altitude at the steps at which it is shown; 0 where it never is. */
  highestSine: number;
  /** Worked out only where the evening was measured closely. */
  readonly best: MeasuredBest;
  /** How many of the coarse steps each hindrance spoiled; counted only where measured closely. */
  readonly hindrances: Record<Hindrance, number>;
}

/** Work space of the search, one a thread: reused for every evening. */
export interface Workbench {
  /** One an instant of the coarse and fine grid; filled when first asked for in an evening. */
  readonly instants: SiteInstant[];
  readonly targets: MeasuredTarget[];
  readonly looks: Look[];
  readonly item: EveningItem;
  readonly edgeInstant: SiteInstant;
  readonly edgeLook: Look;
  /** Whether sky and margin are wanted at every step, not only what is shown. */
  closely: boolean;
  steps: number;
}

export function createWorkbench(): Workbench {
  return {
    instants: [],
    targets: [],
    looks: [],
    item: createEveningItem(),
    edgeInstant: createSiteInstant(),
    edgeLook: createLook(),
    closely: true,
    steps: 0,
  };
}

/** The coarse instants of public hours: every five minutes, and the end. */
export function coarseCount({ startMs, endMs }: PublicHours): number {
  return Math.ceil((endMs - startMs) / STEP_MS) + 1;
}

/**
 * Measures every target of the programme through an evening's public hours; `closely` also finds each one's
 * best moment, and is the same else.
 *
 * A showing's edges are found to under 5 s: five-minute steps first; each step in which something changes, or
 * in which the skyline might cut in, is divided in ten; the edge is then halved down inside its half minute.
 * The earlier side of every edge is one at which the target was seen to be shown, so no showing reaches under
 * the skyline. What comes and goes inside one step with both its ends spoiled is not looked for.
 */
export function measureTargets(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  closely: boolean,
): void {
  bench.closely = closely;
  const count = coarseCount(hours);
  for (const instant of bench.instants) instant.utcMs = NaN;
  while (bench.instants.length < count * PARTS) bench.instants.push(createSiteInstant());
  for (let index = 0; index < season.tracks.length; index++) {
    const measured = (bench.targets[index] ??= createMeasured());
    setEveningItem(bench.item, season, site, index, hours);
    measureTarget(bench, season, site, hours, count, bench.item, measured);
  }
}

/**
 * Measures one target as if it were fainter by some magnitudes (negative: brighter), in the public hours that
 * `measureTargets` measured last, whose instants it takes over.
 */
export function measureFainter(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  index: number,
  fainterBy: number,
): MeasuredTarget {
  const measured = createMeasured();
  bench.closely = false;
  setEveningItem(bench.item, season, site, index, hours, fainterBy);
  measureTarget(bench, season, site, hours, coarseCount(hours), bench.item, measured);
  return measured;
}

function measureTarget(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  count: number,
  item: EveningItem,
  measured: MeasuredTarget,
): void {
  resetMeasured(measured);
  if (!bench.closely && staysLow(season, site, item, hours)) {
    bench.steps += count;
    return;
  }
  const { looks } = bench;
  for (let k = 0; k < count; k++) {
    looks[k] ??= createLook();
    const instant = instantAt(bench, season, site, hours, k * PARTS);
    lookAt(looks[k]!, season, site, instant, item, bench.closely);
    bench.steps++;
    if (bench.closely) measured.hindrances[looks[k]!.hindrance]++;
    if (looks[k]!.hindrance !== 'none') continue;
    measured.highestSine = Math.max(measured.highestSine, looks[k]!.sinAltitude);
    if (bench.closely) considerBest(measured.best, looks[k]!, instant.utcMs);
  }
  const intervals = new IntervalBuilder(measured.edges);
  for (let k = 0; k < count - 1; k++) {
    const before = looks[k]!;
    const after = looks[k + 1]!;
    const startMs = timeAt(hours, k * PARTS);
    const endMs = timeAt(hours, (k + 1) * PARTS);
    if (before.hindrance !== 'none' && after.hindrance !== 'none') continue;
    if (before.hindrance === 'none' && after.hindrance === 'none' && clearOfSkyline(site, before, after)) {
      intervals.add(startMs, endMs);
      continue;
    }
    measureParts(bench, season, site, hours, k, item, intervals);
  }
  measured.totalMs = intervals.totalMs;
  const { leastMinutes } = season.programme.items[item.index]!;
  measured.shown = intervals.totalMs > 0 && intervals.totalMs >= leastMinutes * 60_000;
}

/** Divides one coarse step and adds the intervals in it. */
function measureParts(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  k: number,
  item: EveningItem,
  intervals: IntervalBuilder,
): void {
  const look = bench.edgeLook;
  let beforeOk = bench.looks[k]!.hindrance === 'none';
  let beforeMs = timeAt(hours, k * PARTS);
  for (let part = 1; part <= PARTS; part++) {
    const grid = k * PARTS + part;
    const afterMs = timeAt(hours, grid);
    let afterOk: boolean;
    if (part === PARTS) {
      afterOk = bench.looks[k + 1]!.hindrance === 'none';
    } else {
      lookAt(look, season, site, instantAt(bench, season, site, hours, grid), item, false);
      bench.steps++;
      afterOk = look.hindrance === 'none';
    }
    if (beforeOk && afterOk) intervals.add(beforeMs, afterMs);
    else if (beforeOk) intervals.add(beforeMs, edgeBetween(bench, season, site, item, beforeMs, afterMs));
    else if (afterOk) intervals.add(edgeBetween(bench, season, site, item, afterMs, beforeMs), afterMs);
    beforeOk = afterOk;
    beforeMs = afterMs;
  }
}

/** The last instant found to be shown between one that is and one that is not. */
function edgeBetween(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  item: EveningItem,
  shownMs: number,
  spoiledMs: number,
): number {
  let shown = shownMs;
  let spoiled = spoiledMs;
  for (let i = 0; i < EDGE_HALVINGS; i++) {
    const middle = (shown + spoiled) / 2;
    setSiteInstant(bench.edgeInstant, season, site, middle);
    lookAt(bench.edgeLook, season, site, bench.edgeInstant, item, false);
    bench.steps++;
    if (bench.edgeLook.hindrance === 'none') shown = middle;
    else spoiled = middle;
  }
  return shown;
}

/** Whether the skyline cannot reach the target anywhere between two looks at which it is shown. */
function clearOfSkyline(site: PreparedSite, before: Look, after: Look): boolean {
  const lowest = Math.asin(Math.min(before.sinAltitude, after.sinAltitude));
  if (lowest >= site.horizon.highestRad) return true;
  if (Number.isNaN(before.azimuthRad) || Number.isNaN(after.azimuthRad)) return false;
  return lowest >= highestBetween(site.horizon, before.azimuthRad, after.azimuthRad);
}

/** The instant of a place of the fine grid; the last coarse step may be shorter than the others. */
function timeAt({ startMs, endMs }: PublicHours, grid: number): number {
  const k = Math.floor(grid / PARTS);
  const from = startMs + k * STEP_MS;
  const length = Math.min(STEP_MS, endMs - from);
  return grid % PARTS === 0 ? Math.min(from, endMs) : from + (length * (grid % PARTS)) / PARTS;
}

function instantAt(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  grid: number,
): SiteInstant {
  const instant = bench.instants[grid]!;
  if (Number.isNaN(instant.utcMs)) setSiteInstant(instant, season, site, timeAt(hours, grid));
  return instant;
}

/** The instants of the coarse steps, in order; they have been filled by `measureTargets`. */
export function coarseInstants(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
): readonly SiteInstant[] {
  return Array.from({ length: coarseCount(hours) }, (_, k) =>
    instantAt(bench, season, site, hours, k * PARTS),
  );
}

/** Height and a comfortable margin both count; beyond 3 magnitudes to spare only height does. */
function considerBest(best: MeasuredBest, look: Look, utcMs: number): void {
  if (!Number.isNaN(best.utcMs) && quality(look) <= quality(best)) return;
  best.utcMs = utcMs;
  best.sinAltitude = look.sinAltitude;
  best.azimuthRad = look.azimuthRad;
  best.luminanceNl = look.luminanceNl;
  best.margin = look.margin;
}

function quality({ sinAltitude, margin }: Pick<Look, 'sinAltitude' | 'margin'>): number {
  return sinAltitude + Math.min(margin, 3) / 3;
}

/** Joins stretches that meet. */
class IntervalBuilder {
  totalMs = 0;

  constructor(private readonly edges: number[]) {}

  add(startMs: number, endMs: number): void {
    if (endMs <= startMs) return;
    const last = this.edges.length - 1;
    if (last >= 0 && this.edges[last] === startMs) this.edges[last] = endMs;
    else this.edges.push(startMs, endMs);
    this.totalMs += endMs - startMs;
  }
}

function createMeasured(): MeasuredTarget {
  return {
    totalMs: 0,
    shown: false,
    edges: [],
    highestSine: 0,
    best: { utcMs: NaN, sinAltitude: 0, azimuthRad: 0, luminanceNl: 0, margin: 0 },
    hindrances: { none: 0, low: 0, skyline: 0, sun: 0, faint: 0 },
  };
}

function resetMeasured(measured: MeasuredTarget): void {
  measured.totalMs = 0;
  measured.shown = false;
  measured.edges.length = 0;
  measured.highestSine = 0;
  measured.best.utcMs = NaN;
  const { hindrances } = measured;
  hindrances.none = hindrances.low = hindrances.skyline = hindrances.sun = hindrances.faint = 0;
}
