import { type Inset } from '#charts';
import {
  ARCSEC,
  axisAngle,
  fromSpherical,
  jupiterMoons,
  moonLibration,
  type Observer,
  type Place,
  place,
  poleOf,
  positionAngle,
  saturnRings,
  type SkyTarget,
  toDeg,
} from '#sky';
import { type NamedTarget } from '../sky/namedTarget';

const SUN: SkyTarget = { kind: 'solarSystem', name: 'Sun', body: 'Sun' };

/** How a planet, the Moon or a double star looks in a telescope, as a chart draws it; null for all else. */
export function chartInset(
  { sky, deepSky }: NamedTarget,
  seen: Place,
  utcMs: number,
  observer: Observer,
): Inset | null {
  const double = deepSky?.double;
  if (double !== undefined) {
    const { separationArcsec, positionAngleDeg, magnitudes } = double;
    return { kind: 'pair', separationArcsec, positionAngleDeg, magnitudes };
  }
  if (sky.kind !== 'solarSystem' || sky.body === 'Sun') return null;
  const { astrometric, distanceAu, angularDiameterRad, illuminatedFraction } = seen;
  const sun = place(SUN, utcMs, observer).astrometric;
  const ahead = fromSpherical(astrometric.raRad, astrometric.decRad, distanceAu!);
  const disc = {
    kind: 'disc',
    diameterArcsec: angularDiameterRad! / ARCSEC,
    litFraction: illuminatedFraction!,
    brightLimbDeg: toDeg(positionAngle(astrometric.raRad, astrometric.decRad, sun.raRad, sun.decRad)),
    axisDeg: toDeg(axisAngle(poleOf(sky.body, utcMs), ahead)),
  } as const;
  if (sky.body === 'Moon') {
    const { latitudeRad, longitudeRad, axisAngleRad } = moonLibration(utcMs, ahead);
    return {
      ...disc,
      axisDeg: toDeg(axisAngleRad),
      libration: { latitudeDeg: toDeg(latitudeRad), longitudeDeg: toDeg(longitudeRad) },
    };
  }
  if (sky.body === 'Saturn') {
    const rings = saturnRings(utcMs, ahead);
    return {
      ...disc,
      rings: {
        majorArcsec: rings.majorRad / ARCSEC,
        minorArcsec: rings.minorRad / ARCSEC,
        innerShare: rings.innerShare,
        showsNorth: rings.tiltRad > 0,
      },
    };
  }
  if (sky.body !== 'Jupiter') return disc;
  return {
    ...disc,
    moons: jupiterMoons(utcMs, ahead).map(({ name, eastRad, northRad, state }) => ({
      letter: name[0]!,
      name,
      eastArcsec: eastRad / ARCSEC,
      northArcsec: northRad / ARCSEC,
      state,
    })),
  };
}
