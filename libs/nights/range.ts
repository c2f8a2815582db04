import { type Brightness, type SkyTarget } from '#sky';
import { setSkyLight } from '#darkness';
import { type PublicHours } from './hours';
import { lookAt, setEveningItem } from './look';
import { type MeasuredTarget, measureFainter, type Workbench } from './measure';
import { type ProgrammeItem } from './programme';
import { type Interval, type ShowingCase, type ShowingRange } from './result';
import { type Season } from './season';
import { azimuth, type PreparedSite, setSiteInstant } from './siteInstant';
import { clockWords, listWords } from './words';

/** How far a body may run from its law: comets a magnitude, asteroids 0.3 (common practice; see smallBodyMagnitude). */
const RANGE: Readonly<Record<Brightness['kind'], number>> = { comet: 1, asteroid: 0.3 };
/** Edges nearer together than this are told as the same. */
const SAME_MS = 60_000;
/** The altitude of a body that gives no light to the sky. */
const FAR_BELOW_RAD = -Math.PI / 2;

/** What is brightening the sky where a target is too faint to be shown. */
type Glow = 'moonlight' | 'twilight' | 'twilight and the moonlight' | null;

/** What was measured, as a showing tells it. */
export function showingCase(measured: MeasuredTarget): ShowingCase {
  const intervals: Interval[] = [];
  for (let i = 0; i < measured.edges.length; i += 2) {
    intervals.push({ startMs: measured.edges[i]!, endMs: measured.edges[i + 1]! });
  }
  return { shown: measured.shown, minutes: measured.totalMs / 60_000, intervals };
}

/**
 * What becomes of a target's showing should it run brighter or fainter than its law says: a comet by a
 * magnitude, an asteroid by 0.3. The evening must have been measured closely on the workbench just before.
 * Null for anything but a comet or asteroid with a magnitude law.
 */
export function showingRange(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  index: number,
): ShowingRange | null {
  const item = season.programme.items[index]!;
  const law = lawOf(item.target);
  if (law === null) return null;
  const by = RANGE[law.kind];
  const expected = bench.targets[index]!;
  const brighter = measureFainter(bench, season, site, hours, index, -by);
  const fainter = measureFainter(bench, season, site, hours, index, by);
  const lost = expected.shown && fainter.totalMs === 0;
  const glow = lost ? glowAt(bench, season, site, hours, index, by, expected.best.utcMs) : null;
  const cases = { ifBrighter: showingCase(brighter), ifFainter: showingCase(fainter) };
  const amount = law.kind === 'comet' ? 'a magnitude' : `${String(by)} magnitudes`;
  const told = changesWords(item, showingCase(expected), cases, glow, site.site.zone).map(
    ({ what, runs }) => `${what} if it runs ${amount} ${runs}`,
  );
  const same = expected.shown
    ? `the same if it runs ${amount} bright or faint`
    : `the same even if it runs ${amount} bright`;
  return {
    magnitudes: by,
    ...cases,
    matters: told.length > 0,
    words: told.length > 0 ? told.join('; ') : same,
  };
}

function lawOf(target: SkyTarget): Brightness | null {
  return target.kind === 'orbit' ? target.brightness : null;
}

/** Which light in the sky hides a target, made fainter, that would be shown without that light. */
function glowAt(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  hours: PublicHours,
  index: number,
  fainterBy: number,
  utcMs: number,
): Glow {
  const { edgeInstant: instant, item, edgeLook: look } = bench;
  setEveningItem(item, season, site, index, hours, fainterBy);
  setSiteInstant(instant, season, site, utcMs);
  const { sky } = site.site;
  const sunAzimuth = azimuth(site, instant, instant.sunX, instant.sunY, instant.sunZ);
  const shownUnder = (sunAltitudeRad: number): boolean => {
    setSkyLight(instant.light, sky, sunAltitudeRad, sunAzimuth, FAR_BELOW_RAD, 0, 1);
    lookAt(look, season, site, instant, item, true);
    return look.hindrance === 'none';
  };
  const moonIsUp = instant.moonAltitudeRad > 0;
  if (moonIsUp && shownUnder(instant.sunAltitudeRad)) return 'moonlight';
  if (!shownUnder(FAR_BELOW_RAD)) return null;
  return moonIsUp ? 'twilight and the moonlight' : 'twilight';
}

/** What each of the two cases changes, in words that follow the showing's own times; nothing where neither does. */
function changesWords(
  item: ProgrammeItem,
  expected: ShowingCase,
  { ifBrighter, ifFainter }: Pick<ShowingRange, 'ifBrighter' | 'ifFainter'>,
  glow: Glow,
  zone: string,
): readonly { readonly what: string; readonly runs: 'faint' | 'bright' }[] {
  if (!expected.shown) {
    return ifBrighter.shown ? [{ what: stretchWords(ifBrighter.intervals, zone), runs: 'bright' }] : [];
  }
  const faint = faintWords(item, expected, ifFainter, glow, zone);
  const bright = movedWords(expected.intervals, ifBrighter.intervals, zone);
  return [
    ...(faint === null ? [] : [{ what: faint, runs: 'faint' as const }]),
    ...(bright === null ? [] : [{ what: bright, runs: 'bright' as const }]),
  ];
}

/** What becomes of a showing if the target is fainter; null where nothing does. */
function faintWords(
  item: ProgrammeItem,
  expected: ShowingCase,
  fainter: ShowingCase,
  glow: Glow,
  zone: string,
): string | null {
  if (fainter.intervals.length === 0) {
    return glow === null ? `too faint for the ${item.instrument.name}` : `lost in the ${glow}`;
  }
  if (!fainter.shown) {
    const minutes = Math.round(fainter.minutes);
    return `only ${String(minutes)} of the ${String(item.leastMinutes)} minutes it needs`;
  }
  return movedWords(expected.intervals, fainter.intervals, zone);
}

function sameStretches(a: readonly Interval[], b: readonly Interval[]): boolean {
  return (
    a.length === b.length &&
    a.every(
      ({ startMs, endMs }, i) =>
        Math.abs(startMs - b[i]!.startMs) < SAME_MS && Math.abs(endMs - b[i]!.endMs) < SAME_MS,
    )
  );
}

/** The new times, cut down to the end that has moved where that is enough; null where neither has. */
function movedWords(from: readonly Interval[], to: readonly Interval[], zone: string): string | null {
  if (sameStretches(from, to)) return null;
  const [before] = from;
  const [after] = to;
  if (from.length !== 1 || to.length !== 1 || before === undefined || after === undefined) {
    return stretchWords(to, zone);
  }
  if (Math.abs(before.endMs - after.endMs) < SAME_MS) return `from ${clockWords(after.startMs, zone)}`;
  if (Math.abs(before.startMs - after.startMs) < SAME_MS) return `until ${clockWords(after.endMs, zone)}`;
  return stretchWords(to, zone);
}

function stretchWords(intervals: readonly Interval[], zone: string): string {
  return listWords(
    intervals.map(({ startMs, endMs }) => `${clockWords(startMs, zone)} to ${clockWords(endMs, zone)}`),
  );
}
