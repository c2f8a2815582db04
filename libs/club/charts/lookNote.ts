import { ARCSEC, fromSpherical, moonLibration, type Place, saturnRings, toDeg } from '#sky';
import { type ChartOrder } from './chartFor';

/** Size, phase, rings, libration, or the two stars of a pair, in words; nothing for all else. */
export function lookNote({ target, utcMs }: ChartOrder, seen: Place): string[] {
  const { sky, deepSky } = target;
  if (deepSky?.double !== undefined) {
    const { magnitudes, separationArcsec, positionAngleDeg, colours } = deepSky.double;
    const apart = separationArcsec < 10 ? separationArcsec.toFixed(1) : separationArcsec.toFixed(0);
    return [
      `Two stars of magnitude ${magnitudes.map((value) => value.toFixed(1)).join(' and ')}, ${apart}″ apart at position angle ${positionAngleDeg.toFixed(0)}°: ${colours}.`,
    ];
  }
  if (sky.kind !== 'solarSystem' || seen.angularDiameterRad === null || sky.body === 'Sun') return [];
  const { astrometric, distanceAu } = seen;
  const ahead = fromSpherical(astrometric.raRad, astrometric.decRad, distanceAu!);
  const lit = `${Math.round(seen.illuminatedFraction! * 100)}% lit`;
  const seconds = seen.angularDiameterRad / ARCSEC;
  if (sky.body === 'Moon') {
    return [`Disc ${(seconds / 60).toFixed(1)}′ across, ${lit}.`, librationWords(utcMs, ahead)];
  }
  const size = `Disc ${seconds < 10 ? seconds.toFixed(1) : seconds.toFixed(0)}″ across, ${lit}.`;
  if (sky.body !== 'Saturn') return [size];
  const { tiltRad, sunTiltRad, majorRad, minorRad } = saturnRings(utcMs, ahead);
  const rings = `${(majorRad / ARCSEC).toFixed(0)}″ by ${(minorRad / ARCSEC).toFixed(0)}″`;
  const face = tiltRad > 0 ? 'northern' : 'southern';
  const unlit = tiltRad * sunTiltRad < 0 ? ', unlit' : '';
  return [
    size,
    `Rings ${rings}, tilted ${Math.abs(toDeg(tiltRad)).toFixed(1)}°: the ${face} face shows${unlit}.`,
  ];
}

function librationWords(utcMs: number, ahead: readonly [number, number, number]): string {
  const { latitudeRad, longitudeRad } = moonLibration(utcMs, ahead);
  const [latitude, longitude] = [toDeg(latitudeRad), toDeg(longitudeRad)];
  const total = Math.hypot(latitude, longitude);
  const eighth = ((Math.round(Math.atan2(longitude, latitude) / (Math.PI / 4)) % 8) + 8) % 8;
  const limb = [
    'northern',
    'north-eastern',
    'eastern (Mare Crisium)',
    'south-eastern',
    'southern',
    'south-western',
    'western (Oceanus Procellarum)',
    'north-western',
  ][eighth]!;
  return `Libration tips its ${limb} limb towards us by ${total.toFixed(1)}° (black dot beside the drawing).`;
}
