import { type TargetFacts } from '#print';
import { constellationOf, KM_PER_AU, type Observer, place, RADIUS_KM, toDeg, toRad } from '#sky';
import { type NamedTarget } from '../sky/namedTarget';

const KIND_WORDS: Readonly<Record<NamedTarget['kind'], string>> = {
  Sun: 'our star',
  Moon: 'the Earth’s companion',
  planet: 'planet',
  comet: 'comet',
  asteroid: 'minor planet',
  galaxy: 'galaxy',
  openCluster: 'open star cluster',
  globularCluster: 'globular star cluster',
  planetaryNebula: 'planetary nebula, the shell of a dying star',
  diffuseNebula: 'nebula',
  supernovaRemnant: 'remnant of a supernova',
  clusterWithNebula: 'star cluster with nebula',
  doubleStar: 'double star',
  asterism: 'pattern of stars',
  starCloud: 'star cloud of the Milky Way',
};

/** What a target is, in a word or two. */
export function kindWords({ kind }: NamedTarget): string {
  return KIND_WORDS[kind];
}

/** Distance, size and light of a target at an instant from a place. */
export function targetFacts(
  { sky, kind, deepSky }: NamedTarget,
  utcMs: number,
  observer: Observer,
): TargetFacts {
  const seen = place(sky, utcMs, observer);
  const { raRad, decRad } = seen.astrometric;
  const distanceKm = seen.distanceAu === null ? null : seen.distanceAu * KM_PER_AU;
  const distanceLy = deepSky?.distanceLy ?? null;
  const isDouble = kind === 'doubleStar';
  const widthRad = isDouble ? null : seen.angularDiameterRad;
  const widthArcmin = widthRad === null || widthRad === 0 ? null : toDeg(widthRad) * 60;
  return {
    distanceKm,
    distanceLy,
    widthArcmin,
    widthKm: sky.kind === 'solarSystem' ? 2 * RADIUS_KM[sky.body] : across(distanceKm, widthArcmin),
    widthLy: across(distanceLy, widthArcmin),
    magnitude: seen.magnitude,
    litShare: seen.illuminatedFraction,
    constellation: constellationOf(raRad, decRad).name,
  };
}

/** True width of something seen under an angle at a distance, in the distance's unit. */
function across(distance: number | null, widthArcmin: number | null): number | null {
  if (distance === null || widthArcmin === null) return null;
  return 2 * distance * Math.tan(toRad(widthArcmin / 60) / 2);
}
