import { type EveningLight, luminanceToMag } from '#darkness';
import { toDeg } from '#sky';
import { seasonEveningLight } from './eveningSky';
import { type HoursAnswer, type PublicHours, publicHours } from './hours';
import { coarseInstants, type MeasuredTarget, measureTargets, type Workbench } from './measure';
import { type ScoreWeights } from './programme';
import { type JudgedEvening, type PartName, type ScorePart, type Showing } from './result';
import { type EveningShares, eveningShares, roundPoints, scoreOf } from './score';
import { showingCase, showingRange } from './range';
import { type Season } from './season';
import { type PreparedSite, trackAltitude } from './siteInstant';
import { partWords, showingWords } from './words';
import { eveningSpan } from './zoneClock';

/** An evening's figures before any words are made of them. */
export interface EveningFigures {
  readonly light: EveningLight;
  readonly answer: HoursAnswer;
  /** Null where there are no public hours. */
  readonly shares: EveningShares | null;
  readonly score: number;
  readonly shown: number;
}

/** Measures and scores one evening at one site; the measured targets stay on the workbench. */
export function figureEvening(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  weights: ScoreWeights,
  date: string,
  closely: boolean,
): EveningFigures {
  const { programme } = season;
  const { fromMs, toMs } = eveningSpan(site.clock, date);
  const light = seasonEveningLight(season, site, fromMs, toMs);
  const answer = publicHours(programme.hours, site.site.gate, site.clock, date, light);
  if (answer.hours === null) return { light, answer, shares: null, score: 0, shown: 0 };
  measureTargets(bench, season, site, answer.hours, closely);
  const shares = eveningShares(season, bench.targets, coarseInstants(bench, season, site, answer.hours));
  let shown = 0;
  for (let i = 0; i < programme.items.length; i++) if (bench.targets[i]!.shown) shown++;
  return { light, answer, shares, score: scoreOf(shares, weights), shown };
}

/** One evening at one site in full: hours, showings, score and the reasons in words. */
export function judgeEvening(
  bench: Workbench,
  season: Season,
  site: PreparedSite,
  weights: ScoreWeights,
  date: string,
): JudgedEvening {
  const { programme } = season;
  const figures = figureEvening(bench, season, site, weights, date, true);
  const { answer, shares, light } = figures;
  const { zone, name } = site.site;
  const common = {
    site: name,
    date,
    zone,
    of: programme.items.length,
    darkMinutes: round2(light.darkMinutes),
  };
  if (answer.hours === null || shares === null) {
    const why = answer.none ?? '';
    return {
      ...common,
      publicHours: null,
      note: why,
      score: 0,
      parts: partNames.map((part) => ({ name: part, points: 0, of: weights[part], why })),
      shown: 0,
      showings: programme.items.map(({ target }) => unseen(target.name, why)),
      moon: { illuminatedFraction: 0, upMinutes: 0 },
    };
  }
  const { hours } = answer;
  const showings = programme.items.map((item, i) => {
    const measured = bench.targets[i]!;
    return {
      ...showingOf(item.target.name, measured),
      why: showingWords(item, measured, zone),
      range: showingRange(bench, season, site, hours, i),
    };
  });
  const minutes = (answer.hours.endMs - answer.hours.startMs) / 60_000;
  const words = partWords(
    programme,
    shares,
    showings.filter(({ shown }) => !shown).map(({ target }) => target),
    minutes,
  );
  return {
    ...common,
    publicHours: answer.hours,
    note: null,
    score: figures.score,
    parts: partNames.map((part): ScorePart => ({
      name: part,
      points: roundPoints(shares[part] * weights[part]),
      of: weights[part],
      why: words[part],
    })),
    shown: figures.shown,
    showings,
    moon: {
      illuminatedFraction: Math.round(shares.moonIlluminatedFraction * 1e4) / 1e4,
      upMinutes: round2(moonUpMinutes(season, site, light, answer.hours)),
    },
  };
}

const partNames: readonly PartName[] = ['programme', 'darkness', 'height', 'moon'];

function unseen(target: string, why: string): Showing {
  return { target, shown: false, minutes: 0, intervals: [], best: null, why, range: null };
}

function showingOf(target: string, measured: MeasuredTarget): Omit<Showing, 'why' | 'range'> {
  const { best } = measured;
  return {
    target,
    ...showingCase(measured),
    best: Number.isNaN(best.utcMs)
      ? null
      : {
          utcMs: best.utcMs,
          altitudeDeg: toDeg(Math.asin(best.sinAltitude)),
          azimuthDeg: (toDeg(best.azimuthRad) + 360) % 360,
          skyBrightness: luminanceToMag(best.luminanceNl),
          margin: best.margin,
        },
  };
}

/** Minutes of the public hours with the Moon's upper limb above a sea-level horizon. */
function moonUpMinutes(
  season: Season,
  site: PreparedSite,
  light: EveningLight,
  { startMs, endMs }: PublicHours,
): number {
  const changes = [light.moonrise, light.moonset]
    .filter((ms): ms is number => ms !== null && ms > startMs && ms < endMs)
    .sort((a, b) => a - b);
  const stops = [startMs, ...changes, endMs];
  let up = 0;
  for (let i = 1; i < stops.length; i++) {
    const middle = (stops[i - 1]! + stops[i]!) / 2;
    if (toDeg(trackAltitude(season.moon, season, site, middle)) > -0.83) up += stops[i]! - stops[i - 1]!;
  }
  return up / 60_000;
}

function round2(x: number): number {
  return Math.round(x * 100) / 100;
}
