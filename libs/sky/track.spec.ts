import { ARCSEC, toRad } from './angles';
import { place } from './place';
import { SOLAR_BODIES } from './solarSystem';
import { type SkyTarget } from './target';
import { siderealAngle, utcMsToTtJd } from './time';
import { buildTrack, seasonFrame, seasonSidereal, trackMagnitude, trackPlace } from './track';
import { fromSpherical, separation, type Vector } from './vector';

const from = Date.parse('2027-01-10T00:00:00Z');
const to = Date.parse('2028-01-10T00:00:00Z');
const frame = seasonFrame(from, to);

const elements = {
  inclinationRad: toRad(41),
  nodeRad: toRad(77),
  argumentOfPerihelionRad: toRad(150),
  perihelionTtJd: utcMsToTtJd(Date.parse('2027-06-03T00:00:00Z')),
  epochTtJd: null,
};
const targets: SkyTarget[] = [
  ...SOLAR_BODIES.map((body): SkyTarget => ({ kind: 'solarSystem', name: body, body })),
  {
    kind: 'orbit',
    name: 'invented sungrazer',
    elements: { ...elements, perihelionDistanceAu: 0.04, eccentricity: 1 },
    brightness: { kind: 'comet', absoluteMagnitude: 7, activity: 4 },
    comaArcmin: 5,
  },
  {
    kind: 'orbit',
    name: 'invented asteroid',
    elements: { ...elements, perihelionDistanceAu: 2.1, eccentricity: 0.2 },
    brightness: { kind: 'asteroid', absoluteMagnitude: 5, slope: 0.15 },
    comaArcmin: 0,
  },
  {
    kind: 'fixed',
    name: 'a galaxy',
    raRad: toRad(10.7),
    decRad: toRad(41.3),
    magnitude: 3.4,
    majorArcmin: 180,
    minorArcmin: 60,
  },
];

/** Instants spread over the season without a common period with the pieces of the fits. */
const instants = Array.from({ length: 173 }, (_, i) => from + ((i * 0.6180339887) % 1) * (to - from));

describe('buildTrack', () => {
  test.each(targets.map((target) => [target.name, target] as const))(
    'holds %s to 0.1 arcsec of its place',
    (_, target) => {
      const track = buildTrack(target, frame);
      const out = new Float64Array(3);
      let worst = 0;
      for (const utcMs of instants) {
        trackPlace(track, utcMs, out);
        const { apparent } = place(target, utcMs, null);
        const miss = separation(
          [out[0]!, out[1]!, out[2]!] as Vector,
          fromSpherical(apparent.raRad, apparent.decRad),
        );
        worst = Math.max(worst, miss);
      }
      expect(worst / ARCSEC).toBeLessThan(0.1);
    },
  );

  it('carries the magnitude between days', () => {
    for (const target of targets.filter(({ name }) => name === 'Mars' || name === 'invented asteroid')) {
      const track = buildTrack(target, frame);
      for (const utcMs of instants.slice(0, 20)) {
        expect(Math.abs(trackMagnitude(track, utcMs) - place(target, utcMs, null).magnitude!)).toBeLessThan(
          0.02,
        );
      }
    }
  });
});

describe('seasonSidereal', () => {
  it('follows the apparent sidereal angle to 0.02 arcsec', () => {
    for (const utcMs of instants) {
      const miss = Math.sin((seasonSidereal(frame, utcMs) - siderealAngle(utcMs)) / 2);
      expect(Math.abs(2 * miss) / ARCSEC).toBeLessThan(0.02);
    }
  });
});
