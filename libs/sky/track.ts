import { toRad } from './angles';
import { phaseAngle } from './appearance';
import { type Chebyshev, evaluateChebyshev, fitChebyshev, type Sampler } from './chebyshev';
import { aberrate, brightnessOf, heliocentric, whenLightLeft } from './place';
import { apparentMoon, earthState, j2000ToDate } from './solarSystem';
import { type SkyTarget } from './target';
import { MS_PER_DAY, siderealAngle } from './time';
import { fromSpherical, type Matrix, norm, rotate, subtract, type Vector } from './vector';

/**
 * A target's geocentric apparent place over a season, fitted once, so that each site and instant costs a
 * few multiplications: true equator and equinox of date, au (a unit vector for what is fixed).
 */
export interface Track {
  readonly name: string;
  readonly fromMs: number;
  readonly toMs: number;
  readonly place: Chebyshev;
  /** Whether the observer's own place shifts it: false for stars and deep-sky objects. */
  readonly nearby: boolean;
  /** Magnitude and phase angle (radians), once a day from `fromMs`; NaN where it has none. */
  readonly dailyMagnitude: Float64Array;
  readonly dailyPhaseAngle: Float64Array;
}

/** What all tracks of a season share: the Earth's motion, the turning frame and the sidereal angle. */
export interface SeasonFrame {
  readonly fromMs: number;
  readonly toMs: number;
  /** Earth's heliocentric place and velocity (6), rotation J2000 to date (9). */
  readonly motion: Chebyshev;
  /** Greenwich apparent sidereal angle at each whole day from `fromMs`, unwrapped. */
  readonly dailySidereal: Float64Array;
}

/** Light time and the search's edges reach a little past the season. */
const MARGIN_MS = 2 * MS_PER_DAY;
/** Piece length in days and degree of each body's fit; a test holds all to 0.1 arcsec of `place`. */
const FIT = {
  frame: [8, 9],
  Moon: [2, 8],
  Sun: [16, 8],
  Mercury: [8, 8],
  planet: [16, 8],
  fixed: [16, 7],
} as const;
/** Small bodies are halved from 16-day pieces until the fit is this good, radians. */
const SMALL_BODY_TOLERANCE = toRad(0.05 / 3600);
const SHORTEST_PIECE_DAYS = 1 / 16;
const SMALL_BODY_DEGREE = 11;

export function seasonFrame(fromMs: number, toMs: number): SeasonFrame {
  const start = fromMs - MARGIN_MS;
  const end = toMs + MARGIN_MS;
  const [days, degree] = FIT.frame;
  const sample: Sampler = (utcMs, out) => {
    const earth = earthState(utcMs);
    out.set(earth.position, 0);
    out.set(earth.velocity, 3);
    j2000ToDate(utcMs).forEach((row, i) => {
      out.set(row, 6 + 3 * i);
    });
  };
  const dailySidereal = new Float64Array(Math.ceil((end - start) / MS_PER_DAY) + 2);
  const perDay = 2 * Math.PI * 1.00273790935;
  for (let day = 0; day < dailySidereal.length; day++) {
    const angle = siderealAngle(start + day * MS_PER_DAY);
    const before = day === 0 ? angle - perDay : dailySidereal[day - 1]!;
    // Unwrapped, so that between two days a straight line serves.
    dailySidereal[day] = angle + 2 * Math.PI * Math.round((before + perDay - angle) / (2 * Math.PI));
  }
  return {
    fromMs: start,
    toMs: end,
    motion: fitChebyshev(sample, 15, start, end, days * MS_PER_DAY, degree),
    dailySidereal,
  };
}

/** Greenwich apparent sidereal angle in radians, not wrapped, inside the season. */
export function seasonSidereal(frame: SeasonFrame, utcMs: number): number {
  const position = (utcMs - frame.fromMs) / MS_PER_DAY;
  const day = Math.min(frame.dailySidereal.length - 2, Math.max(0, Math.floor(position)));
  const at = frame.dailySidereal[day]!;
  return at + (position - day) * (frame.dailySidereal[day + 1]! - at);
}

/** Builds a target's track over the frame's whole season. */
export function buildTrack(target: SkyTarget, frame: SeasonFrame): Track {
  const daily = dailyLook(target, frame);
  return {
    name: target.name,
    fromMs: frame.fromMs,
    toMs: frame.toMs,
    place: fitPlace(target, frame),
    nearby: target.kind !== 'fixed',
    ...daily,
  };
}

/** Geocentric apparent vector at an instant into `out` (3 values); allocates nothing. */
export function trackPlace(track: Track, utcMs: number, out: Float64Array): void {
  evaluateChebyshev(track.place, utcMs, out);
}

/** Magnitude at an instant, a straight line between days; NaN where the target has no law. */
export function trackMagnitude(track: Track, utcMs: number): number {
  return fromDaily(track.dailyMagnitude, track.fromMs, utcMs);
}

/** Phase angle in radians at an instant; NaN for what does not shine by sunlight. */
export function trackPhaseAngle(track: Track, utcMs: number): number {
  return fromDaily(track.dailyPhaseAngle, track.fromMs, utcMs);
}

function fromDaily(table: Float64Array, fromMs: number, utcMs: number): number {
  const position = (utcMs - fromMs) / MS_PER_DAY;
  const day = Math.min(table.length - 2, Math.max(0, Math.floor(position)));
  return table[day]! + (position - day) * (table[day + 1]! - table[day]!);
}

function fitPlace(target: SkyTarget, frame: SeasonFrame): Chebyshev {
  const fit = ([days, degree]: readonly [number, number], sample: Sampler) =>
    fitChebyshev(sample, 3, frame.fromMs, frame.toMs, days * MS_PER_DAY, degree);
  if (target.kind === 'solarSystem' && target.body === 'Moon') {
    return fit(FIT.Moon, (utcMs, out) => {
      out.set(apparentMoon(utcMs));
    });
  }
  const at = earthAt(frame);
  const sample: Sampler = (utcMs, out) => {
    const { position, velocity, toDate } = at(utcMs);
    const seen =
      target.kind === 'fixed'
        ? fromSpherical(target.raRad, target.decRad)
        : subtract(
            whenLightLeft((ms) => heliocentric(target, ms), position, utcMs),
            position,
          );
    out.set(rotate(toDate, aberrate(seen, velocity)));
  };
  if (target.kind === 'fixed') return fit(FIT.fixed, sample);
  if (target.kind === 'solarSystem') {
    return fit(
      target.body === 'Sun' ? FIT.Sun : target.body === 'Mercury' ? FIT.Mercury : FIT.planet,
      sample,
    );
  }
  return fitSmallBody(sample, frame);
}

/** Pieces of one length, halved until all are good; the season is fitted again only once its hardest part is. */
function fitSmallBody(sample: Sampler, { fromMs, toMs }: SeasonFrame): Chebyshev {
  let hardestMs: number | null = null;
  for (let days = 16; ; days /= 2) {
    const pieceMs = days * MS_PER_DAY;
    const isShortest = days <= SHORTEST_PIECE_DAYS;
    if (hardestMs !== null && !isShortest) {
      const start = fromMs + Math.floor((hardestMs - fromMs) / pieceMs) * pieceMs;
      const piece = fitChebyshev(sample, 3, start, start + pieceMs, pieceMs, SMALL_BODY_DEGREE);
      if (worstMiss(piece, sample).missRad > SMALL_BODY_TOLERANCE) continue;
    }
    const tried = fitChebyshev(sample, 3, fromMs, toMs, pieceMs, SMALL_BODY_DEGREE);
    if (isShortest) return tried;
    const worst = worstMiss(tried, sample);
    if (worst.missRad <= SMALL_BODY_TOLERANCE) return tried;
    hardestMs = worst.utcMs;
  }
}

/** Largest angle between fit and truth at the ends and two inner points of every piece, and when. */
function worstMiss(fit: Chebyshev, sample: Sampler): { readonly missRad: number; readonly utcMs: number } {
  const truth = new Float64Array(3);
  const fitted = new Float64Array(3);
  let worst = 0;
  let worstMs = fit.fromMs;
  for (let segment = 0; segment < fit.segments; segment++) {
    for (const part of [0.001, 0.31, 0.69, 0.999]) {
      const utcMs = fit.fromMs + (segment + part) * fit.segmentMs;
      sample(utcMs, truth);
      evaluateChebyshev(fit, utcMs, fitted);
      const miss = Math.hypot(truth[0]! - fitted[0]!, truth[1]! - fitted[1]!, truth[2]! - fitted[2]!);
      const missRad = miss / Math.hypot(truth[0]!, truth[1]!, truth[2]!);
      if (missRad > worst) {
        worst = missRad;
        worstMs = utcMs;
      }
    }
  }
  return { missRad: worst, utcMs: worstMs };
}

function earthAt(frame: SeasonFrame): (utcMs: number) => {
  readonly position: Vector;
  readonly velocity: Vector;
  readonly toDate: Matrix;
} {
  const m = new Float64Array(15);
  return (utcMs) => {
    evaluateChebyshev(frame.motion, utcMs, m);
    const row = (i: number): Vector => [m[i]!, m[i + 1]!, m[i + 2]!];
    return { position: row(0), velocity: row(3), toDate: [row(6), row(9), row(12)] };
  };
}

function dailyLook(target: SkyTarget, frame: SeasonFrame): Pick<Track, 'dailyMagnitude' | 'dailyPhaseAngle'> {
  const days = frame.dailySidereal.length;
  const dailyMagnitude = new Float64Array(days);
  const dailyPhaseAngle = new Float64Array(days).fill(NaN);
  if (target.kind === 'fixed') {
    return { dailyMagnitude: dailyMagnitude.fill(target.magnitude), dailyPhaseAngle };
  }
  const at = earthAt(frame);
  for (let day = 0; day < days; day++) {
    const utcMs = frame.fromMs + day * MS_PER_DAY;
    const earth = at(utcMs).position;
    const body = heliocentric(target, utcMs);
    const seen = subtract(body, earth);
    const phase = norm(body) > 0 ? phaseAngle(body, seen) : NaN;
    dailyPhaseAngle[day] = phase;
    dailyMagnitude[day] =
      brightnessOf(target, body, earth, norm(body), norm(seen), phase, utcMs)?.magnitude ?? NaN;
  }
  return { dailyMagnitude, dailyPhaseAngle };
}
