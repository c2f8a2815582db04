import { constellationFigures, loadStars, namedStars } from '#catalogue';
import { FAINTEST_ON_MAP, type SkyAbove, type SkyPlace } from '#print';
import {
  aberrate,
  earthFrame,
  fromSpherical,
  horizontalPlace,
  type Observer,
  place,
  rotate,
  siderealAngle,
  type SkyTarget,
  type SolarBody,
  toDeg,
} from '#sky';

const BODIES: readonly SolarBody[] = ['Moon', 'Mercury', 'Venus', 'Mars', 'Jupiter', 'Saturn'];

/** The sky over a place at an instant, for the map on the handout: stars, figures, Moon and bright planets. */
export function skyAbove(observer: Observer, utcMs: number, shown: readonly string[]): SkyAbove {
  const over = fixedPlaces(utcMs, observer);
  const stars = namedStars(loadStars())
    .filter(({ magnitude }) => magnitude <= FAINTEST_ON_MAP)
    .map(({ raRad, decRad, magnitude, label }) => ({
      ...over(raRad, decRad),
      magnitude,
      name: label?.name ?? null,
    }))
    .filter(({ altitudeDeg }) => altitudeDeg > 0)
    .sort((a, b) => a.magnitude - b.magnitude);
  const figures = constellationFigures();
  return {
    utcMs,
    stars,
    lines: figures.flatMap(({ lines }) =>
      lines.flatMap((line) => {
        const points = line.map(({ raRad, decRad }) => over(raRad, decRad));
        return points.slice(1).map((point, index) => [points[index]!, point] as const);
      }),
    ),
    constellations: figures.map(({ name, labelRaRad, labelDecRad }) => ({
      name,
      ...over(labelRaRad, labelDecRad),
    })),
    bodies: BODIES.filter((body) => !shown.includes(body)).map((body) => {
      const target: SkyTarget = { kind: 'solarSystem', name: body, body };
      const { magnitude } = place(target, utcMs, observer);
      return { name: body, magnitude: magnitude ?? 0, ...horizontal(target, utcMs, observer) };
    }),
  };
}

/** Where J2000 places stand to the eye at one instant; precession and sidereal time are worked out once. */
function fixedPlaces(utcMs: number, observer: Observer): (raRad: number, decRad: number) => SkyPlace {
  const { earth, toDate } = earthFrame(utcMs);
  const localSidereal = siderealAngle(utcMs) + observer.longitudeRad;
  return (raRad, decRad) => {
    const apparent = rotate(toDate, aberrate(fromSpherical(raRad, decRad), earth.velocity));
    const { refractedAltitudeRad, azimuthRad } = horizontalPlace(
      apparent,
      localSidereal,
      observer.latitudeRad,
    );
    return { altitudeDeg: toDeg(refractedAltitudeRad), azimuthDeg: toDeg(azimuthRad) };
  };
}

/** Where a target stands to the eye, refraction included, degrees. */
export function horizontal(target: SkyTarget, utcMs: number, observer: Observer): SkyPlace {
  const { refractedAltitudeRad, azimuthRad } = place(target, utcMs, observer).horizontal!;
  return { altitudeDeg: toDeg(refractedAltitudeRad), azimuthDeg: toDeg(azimuthRad) };
}
