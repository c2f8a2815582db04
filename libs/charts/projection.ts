/** How the sky is laid flat: stereographic keeps shapes, gnomonic keeps great circles straight. */
export type ProjectionKind = 'stereographic' | 'gnomonic';

/** A point of the flat sky in units of the sphere's radius: x grows east, y north. */
export interface PlanePoint {
  readonly x: number;
  readonly y: number;
}

export interface SkyPoint {
  readonly raRad: number;
  readonly decRad: number;
}

export interface Projection {
  readonly kind: ProjectionKind;
  readonly centre: SkyPoint;
  /** Null where the point cannot be shown: the far half of the sky (gnomonic) or near the antipode. */
  readonly forward: (raRad: number, decRad: number) => PlanePoint | null;
  /** The place whose image is (x, y); right ascension in [0, 2π). */
  readonly inverse: (x: number, y: number) => SkyPoint;
}

/** Beyond this the stereographic image runs away: 165 degrees from the centre. */
const leastStereographicCosine = Math.cos((165 * Math.PI) / 180);
/** Beyond this the gnomonic image runs away: 85 degrees from the centre. */
const leastGnomonicCosine = Math.cos((85 * Math.PI) / 180);

/**
 * The projection about a centre, both ways (Snyder 1987, USGS Professional Paper 1395, equations 5-3, 20-14,
 * 20-15, 21-2, 21-4, 22-4, 22-5; the STG and TAN of Calabretta & Greisen 2002). Angles in radians.
 */
export function projectionAbout(kind: ProjectionKind, raRad: number, decRad: number): Projection {
  const sin0 = Math.sin(decRad);
  const cos0 = Math.cos(decRad);
  const leastCosine = kind === 'stereographic' ? leastStereographicCosine : leastGnomonicCosine;
  return {
    kind,
    centre: { raRad, decRad },
    forward: (ra, dec) => {
      const sinDec = Math.sin(dec);
      const cosDec = Math.cos(dec);
      const cosTurn = Math.cos(ra - raRad);
      const cosine = sin0 * sinDec + cos0 * cosDec * cosTurn;
      if (cosine < leastCosine) return null;
      const k = kind === 'stereographic' ? 2 / (1 + cosine) : 1 / cosine;
      return {
        x: k * cosDec * Math.sin(ra - raRad),
        y: k * (cos0 * sinDec - sin0 * cosDec * cosTurn),
      };
    },
    inverse: (x, y) => {
      const rho = Math.hypot(x, y);
      if (rho === 0) return { raRad: turn(raRad), decRad };
      const c = kind === 'stereographic' ? 2 * Math.atan(rho / 2) : Math.atan(rho);
      const sinC = Math.sin(c);
      const cosC = Math.cos(c);
      // The place as a vector: an arc sine would lose half its digits near the poles.
      const north = cosC * sin0 + (y * sinC * cos0) / rho;
      const ahead = cosC * cos0 - (y * sinC * sin0) / rho;
      const aside = (x * sinC) / rho;
      return {
        raRad: turn(raRad + Math.atan2(aside, ahead)),
        decRad: Math.atan2(north, Math.hypot(ahead, aside)),
      };
    },
  };
}

/** Half the width of the flat sky that a field `fieldRad` wide takes, in units of the sphere's radius. */
export function halfWidthOf(kind: ProjectionKind, fieldRad: number): number {
  return kind === 'stereographic' ? 2 * Math.tan(fieldRad / 4) : Math.tan(fieldRad / 2);
}

function turn(angleRad: number): number {
  const turned = angleRad % (2 * Math.PI);
  return turned < 0 ? turned + 2 * Math.PI : turned;
}
