/** One of a planet's moons in an inset: offsets from the planet's middle on the J2000 sky. */
export interface InsetMoon {
  /** The letter it is marked with. */
  readonly letter: string;
  readonly name: string;
  readonly eastArcsec: number;
  readonly northArcsec: number;
  readonly state: 'clear' | 'behind' | 'inFront' | 'inShadow';
}

/** Rings about a disc, seen under a tilt. */
export interface InsetRings {
  readonly majorArcsec: number;
  readonly minorArcsec: number;
  /** The inner edge as a share of the outer. */
  readonly innerShare: number;
  /** True where the northern face shows, so that the southern half of the ring passes before the disc. */
  readonly showsNorth: boolean;
}

/** The look of a planet or the Moon. Angles are position angles, degrees from north through east, J2000. */
export interface DiscInset {
  readonly kind: 'disc';
  readonly diameterArcsec: number;
  /** Lit share of the disc, 0 to 1, and where the middle of its bright limb lies. */
  readonly litFraction: number;
  readonly brightLimbDeg: number;
  /** The northern end of the axis; null where it is not shown. */
  readonly axisDeg: number | null;
  readonly rings?: InsetRings;
  readonly moons?: readonly InsetMoon[];
  /** The Moon's libration, degrees: north and (lunar) east positive. */
  readonly libration?: { readonly latitudeDeg: number; readonly longitudeDeg: number };
}

/** A double star: the fainter star from the brighter. */
export interface PairInset {
  readonly kind: 'pair';
  readonly separationArcsec: number;
  readonly positionAngleDeg: number;
  readonly magnitudes: readonly [number, number];
}

/** A target's look, drawn in a box of its own beside the notes, turned as the chart is. */
export type Inset = DiscInset | PairInset;
