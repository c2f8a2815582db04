import { compassPoint } from '#sky';
import type { LocalSky } from './horizon';
import type { ChartRequest, ChartScale, Orientation } from './request';

const scaleWords: Readonly<Record<ChartScale, string>> = {
  eye: 'Unaided eye',
  binocular: 'Binoculars or finder',
  eyepiece: 'Telescope eyepiece',
};

/** The words top right: instrument, width and turn of the view, and where to point. */
export function instrumentLines(request: ChartRequest, fieldDeg: number, sky: LocalSky | null): string[] {
  const zenithUp = isZenithUp(request);
  const lines = [scaleWords[request.scale], `${fieldWords(fieldDeg)} across`];
  lines.push(...turnWords(request.orientation, zenithUp));
  if (request.scale === 'eye' && sky !== null) {
    const { altitudeRad, azimuthRad } = sky.altAz(request.target);
    const height = Math.round((altitudeRad * 180) / Math.PI);
    lines.push(`Face ${compassPoint(azimuthRad, 8).word}, look ${String(height)}° up`);
  } else {
    lines.push(`${coordinateWords(request.target.raRad, request.target.decRad)} (J2000)`);
  }
  return lines;
}

/** True where an upright sheet has the zenith at its top rather than north. */
export function isZenithUp(request: ChartRequest): boolean {
  if (request.view === null) return false;
  return (request.up ?? (request.scale === 'eye' ? 'zenith' : 'north')) === 'zenith';
}

/** A field's width as people say it: "8°", "1.5°", "30′". */
export function fieldWords(fieldDeg: number): string {
  if (fieldDeg < 1) return `${String(Math.round(fieldDeg * 600) / 10)}′`;
  return `${String(Math.round(fieldDeg * 10) / 10)}°`;
}

/** "RA 5h 34.5m, Dec +22° 01′", rounded, never 60 of anything. */
export function coordinateWords(raRad: number, decRad: number): string {
  const turns = (((raRad / (2 * Math.PI)) % 1) + 1) % 1;
  const tenths = Math.round(turns * 24 * 600) % (24 * 600);
  const ra = `${String(Math.floor(tenths / 600))}h ${((tenths % 600) / 10).toFixed(1).padStart(4, '0')}m`;
  return `RA ${ra}, ${declinationWords(decRad)}`;
}

/** "Dec +22° 01′", rounded, never 60 of anything. */
export function declinationWords(decRad: number): string {
  const minutes = Math.round(Math.abs((decRad * 180) / Math.PI) * 60);
  const sign = decRad < 0 && minutes > 0 ? '−' : '+';
  return `Dec ${sign}${String(Math.floor(minutes / 60))}° ${String(minutes % 60).padStart(2, '0')}′`;
}

function turnWords(orientation: Orientation, zenithUp: boolean): string[] {
  if (orientation === 'rotated') return [`View turned half round, ${zenithUp ? 'overhead' : 'north'} down`];
  if (orientation === 'mirrored') {
    return [`View mirrored left to right, ${zenithUp ? 'overhead' : 'north'} up`];
  }
  return [zenithUp ? 'As you stand: overhead is up' : 'View upright, north up'];
}
