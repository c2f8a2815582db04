import {
  buildTrack,
  MS_PER_DAY,
  type OrbitTarget,
  perturbersFor,
  seasonFrame,
  toRad,
  utcMsToTtJd,
  withPerturbations,
} from '#sky';
import { median, timed } from './measurement';

const FROM = Date.parse('2027-01-01T00:00:00Z');
const TO = FROM + 365 * MS_PER_DAY;
/** The season ends 700 days after the oldest epoch. */
const EPOCH_TT_JD = utcMsToTtJd(TO) - 700;

/**
 * Milliseconds for the perturbed track of one small body over a year whose end lies 700 days from the epoch
 * of its elements: the integration and the fit, the median of twelve invented bodies (nine asteroids, two
 * comets and a near-Earth asteroid). The season's frame and the planets' table are shared by all
 * bodies of a season and stand beside it, as does the slowest body.
 */
export function benchPerturbedTrack(): {
  readonly milliseconds: number;
  readonly slowestMilliseconds: number;
  readonly tableMilliseconds: number;
  readonly twoBodyMilliseconds: number;
} {
  const frame = seasonFrame(FROM, TO);
  const targets = bodies();
  const table = () => perturbersFor(targets, frame.fromMs, frame.toMs);
  const planets = table();
  const track = (target: OrbitTarget) => () =>
    void buildTrack(withPerturbations(target, frame.fromMs, frame.toMs, planets), frame);
  // Once over all of them, so that the figures are of compiled code, as in a season of many bodies.
  for (const target of targets) track(target)();
  const each = targets.map((target) => median([1, 2, 3].map(() => timed(track(target)))));
  return {
    milliseconds: median(each),
    slowestMilliseconds: Math.max(...each),
    tableMilliseconds: median([1, 2, 3].map(() => timed(() => void table()))),
    twoBodyMilliseconds: median(targets.map((target) => timed(() => void buildTrack(target, frame)))),
  };
}

function bodies(): OrbitTarget[] {
  const asteroids = Array.from({ length: 9 }, (_, i) =>
    body(`asteroid ${i}`, 1.8 + 0.12 * i, 0.05 + 0.03 * i, 40 * i, 5 + 3 * i, 80 * i),
  );
  return [
    ...asteroids,
    body('comet near the Sun', 0.35, 1, 50, 61, 400),
    body('returning comet', 1.2, 0.65, 130, 12, 520),
    body('near-Earth asteroid', 0.98, 0.3, 100, 1, 560),
  ];
}

function body(
  name: string,
  perihelionDistanceAu: number,
  eccentricity: number,
  nodeDeg: number,
  inclinationDeg: number,
  perihelionAfterEpochDays: number,
): OrbitTarget {
  return {
    kind: 'orbit',
    name,
    elements: {
      perihelionDistanceAu,
      eccentricity,
      inclinationRad: toRad(inclinationDeg),
      nodeRad: toRad(nodeDeg),
      argumentOfPerihelionRad: toRad(2 * nodeDeg),
      perihelionTtJd: EPOCH_TT_JD + perihelionAfterEpochDays,
      epochTtJd: EPOCH_TT_JD,
    },
    brightness: null,
    comaArcmin: 0,
  };
}
