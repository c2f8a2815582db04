import { angularDiameter, illuminatedFraction, phaseAngle, subLatitude } from './appearance';
import { type AxisTilt, moonMagnitude, planetMagnitude, smallBodyMagnitude, sunMagnitude } from './magnitude';
import { KM_PER_AU, type Observer, observerVector } from './observer';
import { eclipticToEquatorial, heliocentricState, type State } from './orbit';
import { motionPlace } from './perturbedMotion';
import { refractionTrueToApparent } from './refraction';
import {
  earthState,
  heliocentricPlace,
  j2000ToDate,
  LIGHT_DAYS_PER_AU,
  poleOf,
  RADIUS_KM,
} from './solarSystem';
import { type SkyTarget } from './target';
import { MS_PER_DAY, siderealAngle, utcMsToTtJd } from './time';
import {
  add,
  fromSpherical,
  type Matrix,
  norm,
  rotate,
  rotateBack,
  scale,
  separation,
  subtract,
  toSpherical,
  type Vector,
} from './vector';

export interface Direction {
  readonly raRad: number;
  readonly decRad: number;
}

export interface Horizontal {
  /** Airless altitude. */
  readonly altitudeRad: number;
  /** From north through east, [0, 2π). */
  readonly azimuthRad: number;
  readonly refractedAltitudeRad: number;
}

/** Where a target stands and how it looks at one instant; what has no meaning for it is null. */
export interface Place {
  /** ICRS/J2000, light-time corrected, no aberration: the frame of charts. */
  readonly astrometric: Direction;
  /** True equator and equinox of date, aberration included. */
  readonly apparent: Direction;
  /** Null for a geocentric place. */
  readonly horizontal: Horizontal | null;
  readonly distanceAu: number | null;
  readonly sunDistanceAu: number | null;
  readonly elongationRad: number;
  readonly phaseAngleRad: number | null;
  readonly illuminatedFraction: number | null;
  readonly magnitude: number | null;
  readonly magnitudeRange: readonly [bright: number, faint: number] | null;
  readonly angularDiameterRad: number | null;
}

/** The Earth at one instant: its heliocentric state (J2000) and the rotation to the equator of date. */
export interface EarthFrame {
  readonly earth: State;
  readonly toDate: Matrix;
}

export function earthFrame(utcMs: number): EarthFrame {
  return { earth: earthState(utcMs), toDate: j2000ToDate(utcMs) };
}

/**
 * Heliocentric place of a body, J2000 equator, au: a planet, the Moon, the Sun, or a small body by its
 * perturbed motion where it carries one and by its two-body orbit where not. Throws a RangeError outside the
 * span of a motion: a two-body place there would leap away from the rest.
 */
export function heliocentric(target: Exclude<SkyTarget, { kind: 'fixed' }>, utcMs: number): Vector {
  if (target.kind === 'solarSystem') return heliocentricPlace(target.body, utcMs);
  const ttJd = utcMsToTtJd(utcMs);
  return target.motion === undefined
    ? eclipticToEquatorial(heliocentricState(target.elements, ttJd).position)
    : motionPlace(target.motion, ttJd);
}

/**
 * Heliocentric place of the body when the light left it that now reaches `viewer` (heliocentric, au):
 * three passes, which settle the light time to a microsecond.
 */
export function whenLightLeft(placeAt: (utcMs: number) => Vector, viewer: Vector, utcMs: number): Vector {
  let body = placeAt(utcMs);
  for (let pass = 0; pass < 3; pass++) {
    const lightMs = norm(subtract(body, viewer)) * LIGHT_DAYS_PER_AU * MS_PER_DAY;
    body = placeAt(utcMs - lightMs);
  }
  return body;
}

/** Stellar aberration to first order in v/c (the next order is a milliarcsecond); velocity in au/day. */
export function aberrate(direction: Vector, earthVelocity: Vector): Vector {
  return add(direction, scale(earthVelocity, norm(direction) * LIGHT_DAYS_PER_AU));
}

/**
 * Place and look of a target at an instant: topocentric with an observer, geocentric without.
 *
 * The astrometric place of every body, the Moon included, is where it stood one light time ago less where
 * the Earth stands now; so the Moon's holds beside catalogue stars. UT1 is taken as UTC.
 */
export function place(target: SkyTarget, utcMs: number, observer: Observer | null): Place {
  const frame = earthFrame(utcMs);
  const { earth, toDate } = frame;
  const localSidereal = observer === null ? 0 : siderealAngle(utcMs) + observer.longitudeRad;
  const standOfDate: Vector = observer === null ? [0, 0, 0] : observerVector(observer, localSidereal);
  const stand = rotateBack(toDate, standOfDate);
  const viewer = add(earth.position, stand);

  const sunSeen = aberrate(scale(viewer, -1), earth.velocity);
  const body =
    target.kind === 'fixed' ? null : whenLightLeft((ms) => heliocentric(target, ms), earth.position, utcMs);
  const astrometric =
    target.kind === 'fixed' ? fromSpherical(target.raRad, target.decRad) : subtract(body!, viewer);
  // The Earth's motion is the aberration here; the observer's own (0.3 arcsec at most) is left out.
  const apparent = aberrate(astrometric, earth.velocity);
  const apparentOfDate = rotate(toDate, apparent);
  const common = {
    astrometric: directionOf(astrometric),
    apparent: directionOf(apparentOfDate),
    horizontal:
      observer === null ? null : horizontalPlace(apparentOfDate, localSidereal, observer.latitudeRad),
    elongationRad: separation(apparent, sunSeen),
  };
  return { ...common, ...look(target, body, astrometric, viewer, utcMs) };
}

type Look = Omit<Place, 'astrometric' | 'apparent' | 'horizontal' | 'elongationRad'>;

/** Distances, phase, brightness and size; `body` is heliocentric, `seen` from the observer, J2000, au. */
function look(target: SkyTarget, body: Vector | null, seen: Vector, viewer: Vector, utcMs: number): Look {
  if (target.kind === 'fixed' || body === null) {
    return {
      distanceAu: null,
      sunDistanceAu: null,
      phaseAngleRad: null,
      illuminatedFraction: null,
      magnitude: target.kind === 'fixed' ? target.magnitude : null,
      magnitudeRange: target.kind === 'fixed' ? [target.magnitude, target.magnitude] : null,
      angularDiameterRad:
        target.kind === 'fixed' && target.majorArcmin > 0
          ? (target.majorArcmin / 60) * (Math.PI / 180)
          : null,
    };
  }
  const distanceAu = norm(seen);
  const sunDistanceAu = norm(body);
  if (target.kind === 'solarSystem' && target.body === 'Sun') {
    const magnitude = sunMagnitude(distanceAu);
    return {
      distanceAu,
      sunDistanceAu: 0,
      phaseAngleRad: null,
      illuminatedFraction: null,
      magnitude,
      magnitudeRange: [magnitude, magnitude],
      angularDiameterRad: angularDiameter(RADIUS_KM.Sun / KM_PER_AU, distanceAu),
    };
  }
  const phaseAngleRad = phaseAngle(body, seen);
  const light = brightnessOf(target, body, viewer, sunDistanceAu, distanceAu, phaseAngleRad, utcMs);
  return {
    distanceAu,
    sunDistanceAu,
    phaseAngleRad,
    illuminatedFraction: illuminatedFraction(phaseAngleRad),
    magnitude: light?.magnitude ?? null,
    magnitudeRange: light?.range ?? null,
    angularDiameterRad:
      target.kind === 'solarSystem'
        ? angularDiameter(RADIUS_KM[target.body] / KM_PER_AU, distanceAu)
        : target.comaArcmin > 0
          ? (target.comaArcmin / 60) * (Math.PI / 180)
          : null,
  };
}

/** Magnitude of a body that shines by sunlight, with the bounds to expect; null where no law is given. */
export function brightnessOf(
  target: Exclude<SkyTarget, { kind: 'fixed' }>,
  body: Vector,
  viewer: Vector,
  sunDistanceAu: number,
  distanceAu: number,
  phaseAngleRad: number,
  utcMs: number,
): { readonly magnitude: number; readonly range: readonly [number, number] } | null {
  if (target.kind === 'orbit') {
    return target.brightness === null
      ? null
      : smallBodyMagnitude(target.brightness, sunDistanceAu, distanceAu, phaseAngleRad);
  }
  const exactly = (magnitude: number) => ({ magnitude, range: [magnitude, magnitude] as const });
  if (target.body === 'Sun') return exactly(sunMagnitude(distanceAu));
  if (target.body === 'Moon') return exactly(moonMagnitude(sunDistanceAu, distanceAu, phaseAngleRad));
  return exactly(
    planetMagnitude(
      target.body,
      sunDistanceAu,
      distanceAu,
      phaseAngleRad,
      tiltOf(target.body, body, viewer, utcMs),
    ),
  );
}

function tiltOf(body: 'Saturn' | 'Uranus' | string, planet: Vector, viewer: Vector, utcMs: number): AxisTilt {
  if (body !== 'Saturn' && body !== 'Uranus') return { subEarthRad: 0, subSunRad: 0 };
  const pole = poleOf(body, utcMs);
  return {
    subEarthRad: subLatitude(pole, planet, viewer),
    subSunRad: subLatitude(pole, planet, [0, 0, 0]),
  };
}

/** Altitude and azimuth of a vector of the true equator of date, from the local sidereal angle. */
export function horizontalPlace(ofDate: Vector, localSiderealRad: number, latitudeRad: number): Horizontal {
  const cosLst = Math.cos(localSiderealRad);
  const sinLst = Math.sin(localSiderealRad);
  const sinLat = Math.sin(latitudeRad);
  const cosLat = Math.cos(latitudeRad);
  const towardsMeridian = cosLst * ofDate[0] + sinLst * ofDate[1];
  const east = -sinLst * ofDate[0] + cosLst * ofDate[1];
  const north = cosLat * ofDate[2] - sinLat * towardsMeridian;
  const up = sinLat * ofDate[2] + cosLat * towardsMeridian;
  const azimuth = Math.atan2(east, north);
  const altitudeRad = Math.atan2(up, Math.hypot(east, north));
  return {
    altitudeRad,
    azimuthRad: azimuth < 0 ? azimuth + 2 * Math.PI : azimuth,
    refractedAltitudeRad: altitudeRad + refractionTrueToApparent(altitudeRad),
  };
}

function directionOf(v: Vector): Direction {
  const { lonRad, latRad } = toSpherical(v);
  return { raRad: lonRad, decRad: latRad };
}
