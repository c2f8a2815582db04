/** One measured point of a site's skyline. */
export interface SkylinePoint {
  readonly azimuthDeg: number;
  readonly altitudeDeg: number;
}

const degree = Math.PI / 180;

/**
 * The height of a site's skyline over the level horizon, radians, at any azimuth (radians, north through east):
 * straight between the measured points, closed round the compass; nothing measured means the level horizon.
 */
export function skylineOf(points: readonly SkylinePoint[]): (azimuthRad: number) => number {
  const around = points
    .map(({ azimuthDeg, altitudeDeg }) => ({ azimuthDeg: wrapped(azimuthDeg), altitudeDeg }))
    .sort((one, other) => one.azimuthDeg - other.azimuthDeg);
  const first = around[0];
  const last = around.at(-1);
  if (first === undefined || last === undefined) return () => 0;
  const closed = [
    { ...last, azimuthDeg: last.azimuthDeg - 360 },
    ...around,
    { ...first, azimuthDeg: first.azimuthDeg + 360 },
  ];
  return (azimuthRad) => {
    const azimuth = wrapped(azimuthRad / degree);
    let index = 1;
    while (closed[index]!.azimuthDeg < azimuth) index += 1;
    const from = closed[index - 1]!;
    const to = closed[index]!;
    const width = to.azimuthDeg - from.azimuthDeg;
    const share = width > 0 ? (azimuth - from.azimuthDeg) / width : 0;
    return (from.altitudeDeg + share * (to.altitudeDeg - from.altitudeDeg)) * degree;
  };
}

/** The azimuths (radians) at which a skyline bends, so that a drawing can keep its corners. */
export function skylineCorners(points: readonly SkylinePoint[]): number[] {
  return points.map(({ azimuthDeg }) => wrapped(azimuthDeg) * degree);
}

function wrapped(deg: number): number {
  return ((deg % 360) + 360) % 360;
}
