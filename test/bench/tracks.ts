import { buildTrack, place, seasonFrame, SOLAR_BODIES, type SkyTarget } from '#sky';
import { galaxy } from '../../libs/nights/fixtures';
import { benchPerturbedTrack } from './perturbed';
import { measurement, type Measurement, median, timed } from './measurement';

const DAY_MS = 86_400_000;

/** A year's tracks of Sun, Moon, planets and 20 fixed targets, beside the same year worked out step by step. */
export function benchFixedTracks(): Promise<Measurement[]> {
  const from = Date.parse('2027-01-01T00:00:00Z');
  const targets: SkyTarget[] = [
    ...SOLAR_BODIES.map((body): SkyTarget => ({ kind: 'solarSystem', name: body, body })),
    ...Array.from({ length: 20 }, (_, i) => galaxy(18 * i, 5 * i - 30)),
  ];
  const build = () =>
    timed(() => {
      const frame = seasonFrame(from, from + 365 * DAY_MS);
      for (const target of targets) buildTrack(target, frame);
    });
  build();
  const places = 500;
  const perPlace =
    timed(() => {
      for (let i = 0; i < places; i++) place(targets[i % targets.length]!, from + i * 600_000, null);
    }) / places;
  const steps = targets.length * 365 * 288;
  return Promise.resolve([
    measurement(
      'track-fixed-bodies',
      median([build(), build(), build()]),
      'ms',
      'a place every 5 minutes of the year, worked out one by one',
      perPlace * steps,
      `${targets.length} bodies over 365 days`,
    ),
  ]);
}

/** A season's track of a body moving under the planets, beside its two-body track. */
export function benchPerturbedTracks(): Promise<Measurement[]> {
  const { milliseconds, slowestMilliseconds, tableMilliseconds, twoBodyMilliseconds } = benchPerturbedTrack();
  return Promise.resolve([
    measurement(
      'track-perturbed',
      milliseconds,
      'ms',
      'the same body on its two-body orbit',
      twoBodyMilliseconds,
      `median body; slowest ${slowestMilliseconds.toFixed(1)} ms; the planets' table that a season shares ${tableMilliseconds.toFixed(1)} ms`,
    ),
  ]);
}
