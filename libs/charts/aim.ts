import { type LocalSky, positionAngle } from './horizon';
import { isZenithUp } from './instrument';
import { turnFor } from './orientation';
import { type Plate, plateIn } from './plate';
import { projectionAbout, type ProjectionKind, type SkyPoint } from './projection';
import { ChartProblem, type ChartRequest, type ChartTarget } from './request';
import type { Frame } from './scene';
import type { SkylinePoint } from './skyline';
import { type Standing, standingUnder } from './standing';

const degree = Math.PI / 180;
/** Gnomonic keeps tracks straight but stretches the edge; up to here the stretch stays under 2 %. */
const widestGnomonicDeg = 15;

/** Chooses projection, centre and turn of a sheet, and lays the sky into its frame. */
export function plateFor(request: ChartRequest, fieldDeg: number, frame: Frame, sky: LocalSky | null): Plate {
  const kind: ProjectionKind =
    request.scale === 'eyepiece' && fieldDeg <= widestGnomonicDeg ? 'gnomonic' : 'stereographic';
  const lay = (centre: SkyPoint): Plate => {
    const up = isZenithUp(request) && sky !== null ? positionAngle(centre, sky.zenith) : 0;
    return plateIn(
      frame,
      projectionAbout(kind, centre.raRad, centre.decRad),
      turnFor(request.orientation, up),
      fieldDeg * degree,
    );
  };
  const { raRad, decRad } = request.target;
  const onTarget = lay({ raRad: ((raRad % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI), decRad });
  if (request.scale !== 'eye' || sky === null || !isZenithUp(request)) return onTarget;
  return lay(standingCentre(request.target, sky, onTarget));
}

/** How far the horizon stands above the sheet's lower edge, and a target at least below its upper one. */
const groundMm = 12;
const overheadMm = 32;

/**
 * The centre of an eye chart: as low as brings the ground in at the foot, so that one can walk up from the
 * horizon to the target; where the target is too high for that, on the target.
 */
function standingCentre(target: ChartTarget, sky: LocalSky, plate: Plate): SkyPoint {
  const { altitudeRad, azimuthRad } = sky.altAz(target);
  const halfHeight = plate.frame.shape === 'rectangle' ? plate.frame.heightMm / 2 : plate.frame.radiusMm;
  const angle = (mm: number): number => 2 * Math.atan(mm / plate.mmPerRadian / 2);
  const centreAltitude = angle(halfHeight - groundMm);
  const highest = centreAltitude + angle(halfHeight - overheadMm);
  return altitudeRad <= highest
    ? sky.placeAt(centreAltitude, azimuthRad)
    : sky.placeAt(altitudeRad, azimuthRad);
}

/**
 * The ground and compass of an eye chart.
 * @throws ChartProblem where the target is below the horizon.
 */
export function standingFor(
  sky: LocalSky,
  plate: Plate,
  target: ChartTarget,
  skyline: readonly SkylinePoint[],
): Standing {
  const { altitudeRad, azimuthRad } = sky.altAz(target);
  if (altitudeRad < 0) {
    const below = (-altitudeRad / degree).toFixed(1);
    throw new ChartProblem(
      'view.utcMs',
      altitudeRad,
      `${target.name} stands ${below} degrees below the horizon at that time; choose a time when it is up`,
    );
  }
  return standingUnder(sky, plate, azimuthRad, skyline);
}
