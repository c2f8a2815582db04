import { J2000_TT_JD } from '#sky';
import { isoTt } from './calendar';
import { meanMotion, wrap180, wrap360 } from './conic';
import { figure, rounding } from './figures';
import { type GivenElements } from './given';
import { type OrbitShape } from './orbitShape';
import { type FieldProblem } from './problem';

export interface OrbitTiming {
  readonly perihelionTtJd: number;
  readonly meanAnomalyDeg: number | null;
}

/** Times further than this from J2000 (a quarter of a million years) are a slip of the pen. */
const REACH_DAYS = 9e7;
/** Differences in the time of perihelion that rounding explains in any list, days. */
const SLACK_DAYS = 0.01;

/**
 * The time of perihelion and the mean anomaly at the epoch, one from the other. Of the passages of an ellipse the
 * one nearest the epoch is taken. Given both, the time is used and a contradiction reported in days.
 */
export function orbitTiming(
  given: GivenElements,
  shape: OrbitShape,
): { readonly timing: OrbitTiming | null; readonly problems: readonly FieldProblem[] } {
  const { eccentricity: e, perihelionDistanceAu: q } = shape;
  // By the motion that q and e imply, so that the mean anomaly at the epoch is kept to the last digit.
  const n = e === 1 ? null : meanMotion(q / (1 - e));
  const epoch = given.epochTtJd ?? null;
  const anomaly = given.meanAnomalyDeg ?? null;
  const time = given.perihelionTtJd ?? null;
  const refused = (field: string, message: string): ReturnType<typeof orbitTiming> => ({
    timing: null,
    problems: [{ field, severity: 'error', message }],
  });
  for (const [field, jd] of [
    ['epoch', epoch],
    ['perihelionTime', time],
  ] as const) {
    if (jd !== null && !(Math.abs(jd - J2000_TT_JD) < REACH_DAYS)) {
      return refused(field, `${figure(jd)} as a Julian date lies beyond every reach of these methods.`);
    }
  }
  if (anomaly !== null && (e === 1 || n === null)) {
    return refused(
      'meanAnomalyDeg',
      'A parabola (e = 1) has no mean anomaly; give the time of perihelion T.',
    );
  }
  const ellipse = e < 1;
  if (time === null) {
    if (anomaly === null || epoch === null || n === null) return refused(...untimed(epoch, anomaly, e));
    const perihelion = epoch - (ellipse ? wrap180(anomaly) : anomaly) / n;
    if (!(Math.abs(perihelion - J2000_TT_JD) < REACH_DAYS)) {
      return refused(
        'meanAnomalyDeg',
        'Epoch, mean anomaly and mean motion put perihelion out of all reach.',
      );
    }
    const asGiven = ellipse && (anomaly < 0 || anomaly > 360) ? wrap360(anomaly) : anomaly;
    return { timing: { perihelionTtJd: perihelion, meanAnomalyDeg: asGiven }, problems: [] };
  }
  if (epoch === null || n === null) {
    const idle =
      'A mean anomaly holds for an epoch, and none is given; T is used and the mean anomaly left out.';
    return {
      timing: { perihelionTtJd: time, meanAnomalyDeg: null },
      problems: anomaly === null ? [] : [{ field: 'meanAnomalyDeg', severity: 'warning', message: idle }],
    };
  }
  const computed = ellipse ? wrap360(n * (epoch - time)) : n * (epoch - time);
  const problems: FieldProblem[] = [];
  let kept = computed;
  if (anomaly !== null) {
    const offDeg = ellipse ? wrap180(anomaly - computed) : anomaly - computed;
    const slack = SLACK_DAYS + Math.min(rounding(anomaly), 0.01) / n;
    if (Math.abs(offDeg / n) > slack) {
      const message =
        `The mean anomaly is given as ${figure(anomaly)} deg, but T (${isoTt(time)}) makes it ` +
        `${figure(computed)} deg at the epoch: ${figure(Math.abs(offDeg / n), 3)} days apart. T is used.`;
      problems.push({ field: 'meanAnomalyDeg', severity: 'warning', message });
    } else if (!ellipse || (anomaly >= 0 && anomaly <= 360)) {
      kept = anomaly;
    }
  }
  return { timing: { perihelionTtJd: time, meanAnomalyDeg: kept }, problems };
}

function untimed(epoch: number | null, anomaly: number | null, e: number): [field: string, message: string] {
  if (anomaly !== null) {
    return ['epoch', 'The mean anomaly holds for an epoch, and none is given; give the epoch, or T.'];
  }
  if (e >= 1) return ['perihelionTime', 'The time of perihelion T is missing.'];
  const have = epoch === null ? 'neither T nor an epoch is given' : 'the epoch stands without a mean anomaly';
  return [
    'perihelionTime',
    `Where the body is in its orbit cannot be known: ${have}. Give the time of perihelion T, or the epoch with the mean anomaly M.`,
  ];
}
