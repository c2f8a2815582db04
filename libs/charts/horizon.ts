import { MakeTime, Observer, Rotation_EQJ_HOR } from 'astronomy-engine';
import type { SkyPoint } from './projection';
import type { ChartView } from './request';

/** The sky as it stands over a place at an instant. Airless: at chart scale refraction is under a millimetre. */
export interface LocalSky {
  /** Altitude, and azimuth from north through east, both radians, of a J2000 place. */
  readonly altAz: (point: SkyPoint) => { readonly altitudeRad: number; readonly azimuthRad: number };
  /** The J2000 place that stands at an altitude and azimuth (radians). */
  readonly placeAt: (altitudeRad: number, azimuthRad: number) => SkyPoint;
  readonly zenith: SkyPoint;
}

/** The local sky of a view; precession and nutation by astronomy-engine's rotation from J2000 to the horizon. */
export function localSky(view: ChartView): LocalSky {
  const degrees = 180 / Math.PI;
  const observer = new Observer(view.latitudeRad * degrees, view.longitudeRad * degrees, 0);
  // Its matrix takes J2000 (column by column) to x north, y west, z zenith.
  const m = Rotation_EQJ_HOR(MakeTime(new Date(view.utcMs)), observer).rot as number[][];
  const cell = (column: number, row: number): number => m[column]![row]!;
  const placeAt = (altitudeRad: number, azimuthRad: number): SkyPoint => {
    const north = Math.cos(altitudeRad) * Math.cos(azimuthRad);
    const west = -Math.cos(altitudeRad) * Math.sin(azimuthRad);
    const up = Math.sin(altitudeRad);
    const v = [0, 1, 2].map((i) => cell(i, 0) * north + cell(i, 1) * west + cell(i, 2) * up);
    const ra = Math.atan2(v[1]!, v[0]!);
    return {
      raRad: ra < 0 ? ra + 2 * Math.PI : ra,
      decRad: Math.asin(Math.max(-1, Math.min(1, v[2]!))),
    };
  };
  return {
    placeAt,
    zenith: placeAt(Math.PI / 2, 0),
    altAz: ({ raRad, decRad }) => {
      const v = [
        Math.cos(decRad) * Math.cos(raRad),
        Math.cos(decRad) * Math.sin(raRad),
        Math.sin(decRad),
      ] as const;
      const along = (row: number): number => cell(0, row) * v[0] + cell(1, row) * v[1] + cell(2, row) * v[2];
      const azimuth = Math.atan2(-along(1), along(0));
      return {
        altitudeRad: Math.asin(Math.max(-1, Math.min(1, along(2)))),
        azimuthRad: azimuth < 0 ? azimuth + 2 * Math.PI : azimuth,
      };
    },
  };
}

/** Position angle (radians, north through east) of the great circle from one place to another. */
export function positionAngle(from: SkyPoint, to: SkyPoint): number {
  const turn = to.raRad - from.raRad;
  return Math.atan2(
    Math.cos(to.decRad) * Math.sin(turn),
    Math.cos(from.decRad) * Math.sin(to.decRad) -
      Math.sin(from.decRad) * Math.cos(to.decRad) * Math.cos(turn),
  );
}
