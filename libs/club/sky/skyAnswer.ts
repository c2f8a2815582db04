import {
  airmass,
  createSkyLight,
  limitingMagnitude,
  luminanceToMag,
  NAKED_EYE,
  setSkyLight,
  type SiteSky,
  skyLuminance,
} from '#darkness';
import {
  ARCSEC,
  constellationOf,
  fromSpherical,
  type Horizontal,
  isNearRisenSun,
  type Observer,
  type Place,
  place,
  separation,
  type SkyTarget,
  toDeg,
} from '#sky';
import { perturbing, type Perturbing } from './perturbing';

/** One target at one instant, in the units of the outside: degrees, au, magnitudes. */
export interface SkyAnswer {
  readonly target: string;
  readonly at: string;
  readonly astrometric: { readonly raDeg: number; readonly decDeg: number };
  readonly apparent: { readonly raDeg: number; readonly decDeg: number };
  readonly horizontal: {
    readonly altitudeDeg: number;
    readonly azimuthDeg: number;
    readonly refractedAltitudeDeg: number;
  } | null;
  readonly distanceAu: number | null;
  readonly sunDistanceAu: number | null;
  readonly elongationDeg: number;
  readonly phaseAngleDeg: number | null;
  readonly illuminatedFraction: number | null;
  readonly magnitude: number | null;
  readonly magnitudeRange: readonly [bright: number, faint: number] | null;
  readonly constellation: string;
  readonly angularDiameterArcsec: number | null;
  readonly sun: { readonly altitudeDeg: number } | null;
  readonly moon: {
    readonly altitudeDeg: number;
    readonly illuminatedFraction: number;
    readonly separationDeg: number;
  } | null;
  /** V mag/arcsec2 behind the target; null below the horizon and without an observer. */
  readonly skyBrightness: number | null;
  /** Faintest star the naked eye sees there, extinction included. */
  readonly limitingMagnitude: number | null;
  /** What a person should know before acting on it; empty where nothing is. */
  readonly cautions: readonly string[];
}

const SUN: SkyTarget = { kind: 'solarSystem', name: 'Sun', body: 'Sun' };
const MOON: SkyTarget = { kind: 'solarSystem', name: 'Moon', body: 'Moon' };

/**
 * A target seen from a place with its sky at a UTC instant; without a place the geocentric position alone. A
 * comet or asteroid moves under the planets; a piece of work over many instants shares one `perturbed`.
 */
export function skyAnswer(
  target: SkyTarget,
  utcMs: number,
  from: { readonly observer: Observer; readonly sky: SiteSky } | null,
  perturbed: Perturbing = perturbing(),
): SkyAnswer {
  const seen = place(perturbed(target, utcMs), utcMs, from?.observer ?? null);
  const { astrometric, apparent, horizontal } = seen;
  const common = {
    target: target.name,
    at: new Date(utcMs).toISOString(),
    astrometric: { raDeg: toDeg(astrometric.raRad), decDeg: toDeg(astrometric.decRad) },
    apparent: { raDeg: toDeg(apparent.raRad), decDeg: toDeg(apparent.decRad) },
    distanceAu: seen.distanceAu,
    sunDistanceAu: seen.sunDistanceAu,
    elongationDeg: toDeg(seen.elongationRad),
    phaseAngleDeg: seen.phaseAngleRad === null ? null : toDeg(seen.phaseAngleRad),
    illuminatedFraction: seen.illuminatedFraction,
    magnitude: seen.magnitude,
    magnitudeRange: seen.magnitudeRange,
    constellation: constellationOf(astrometric.raRad, astrometric.decRad).abbreviation,
    angularDiameterArcsec: seen.angularDiameterRad === null ? null : seen.angularDiameterRad / ARCSEC,
  };
  if (from === null || horizontal === null) {
    return {
      ...common,
      horizontal: null,
      sun: null,
      moon: null,
      skyBrightness: null,
      limitingMagnitude: null,
      cautions: [],
    };
  }
  const sun = place(SUN, utcMs, from.observer);
  const moon = place(MOON, utcMs, from.observer);
  return {
    ...common,
    horizontal: {
      altitudeDeg: toDeg(horizontal.altitudeRad),
      azimuthDeg: toDeg(horizontal.azimuthRad),
      refractedAltitudeDeg: toDeg(horizontal.refractedAltitudeRad),
    },
    sun: { altitudeDeg: toDeg(sun.horizontal!.altitudeRad) },
    moon: {
      altitudeDeg: toDeg(moon.horizontal!.altitudeRad),
      illuminatedFraction: moon.illuminatedFraction!,
      separationDeg: toDeg(apart(seen, moon)),
    },
    ...skyBehind(horizontal, apart(seen, moon), sun.horizontal!, moon, from.sky, isMoon(target)),
    cautions: cautionsFor(target, seen.elongationRad, sun.horizontal!.altitudeRad),
  };
}

function skyBehind(
  at: Horizontal,
  moonSeparationRad: number,
  sun: Horizontal,
  moon: Place,
  sky: SiteSky,
  moonItself: boolean,
): Pick<SkyAnswer, 'skyBrightness' | 'limitingMagnitude'> {
  if (at.altitudeRad < 0) return { skyBrightness: null, limitingMagnitude: null };
  const light = createSkyLight();
  setSkyLight(
    light,
    sky,
    sun.altitudeRad,
    sun.azimuthRad,
    moon.horizontal!.altitudeRad,
    moon.phaseAngleRad!,
    moon.distanceAu!,
  );
  // The Moon is judged against the sky a quarter turn off its own glare.
  const cosMoon = moonItself ? 0 : Math.cos(moonSeparationRad);
  const brightness = luminanceToMag(skyLuminance(light, Math.sin(at.altitudeRad), at.azimuthRad, cosMoon));
  return {
    skyBrightness: brightness,
    limitingMagnitude:
      limitingMagnitude(NAKED_EYE, brightness, 0, 0) -
      sky.extinctionMagPerAirmass * airmass(at.refractedAltitudeRad),
  };
}

/** Cautions that go with pointing anything at a target. */
function cautionsFor(target: SkyTarget, elongationRad: number, sunAltitudeRad: number): string[] {
  if (target.kind === 'solarSystem' && target.body === 'Sun') {
    return [
      'Never look at the Sun with an instrument or the bare eye. Solar viewing needs certified filters and trained hands.',
    ];
  }
  if (isNearRisenSun(elongationRad, sunAltitudeRad)) {
    return [
      `The Sun is up and ${toDeg(elongationRad).toFixed(1)} degrees away: never point a telescope or binoculars there.`,
    ];
  }
  return [];
}

function apart(a: Place, b: Place): number {
  return separation(
    fromSpherical(a.apparent.raRad, a.apparent.decRad),
    fromSpherical(b.apparent.raRad, b.apparent.decRad),
  );
}

function isMoon(target: SkyTarget): boolean {
  return target.kind === 'solarSystem' && target.body === 'Moon';
}
