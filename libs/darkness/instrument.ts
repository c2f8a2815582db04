/** What the public looks with. */
export interface Instrument {
  readonly name: string;
  readonly kind: 'nakedEye' | 'binocular' | 'telescope';
  /** Clear aperture in millimetres; without meaning for the naked eye. */
  readonly apertureMm: number;
  /** The powers at hand; the best one for the target is taken. */
  readonly magnifications: readonly number[];
  readonly eyes: 1 | 2;
  /** Share of the light that comes through, 0 to 1. */
  readonly transmission: number;
}

/** Who is looking. */
export interface Observing {
  /** Width of the dark-adapted pupil, millimetres. */
  readonly pupilMm: number;
  /** Crumey's field factor: 2 for typical observers, 1.4 for keen ones. */
  readonly fieldFactor: number;
}

/** A mixed public: pupils of 6 mm (common practice for adults of all ages), a typical field factor. */
export const DEFAULT_OBSERVING: Observing = { pupilMm: 6, fieldFactor: 2 };

export const NAKED_EYE: Instrument = {
  name: 'Naked eye',
  kind: 'nakedEye',
  apertureMm: 7,
  magnifications: [1],
  eyes: 2,
  transmission: 1,
};

export const BINOCULAR_10X50: Instrument = {
  name: '10×50 binocular',
  kind: 'binocular',
  apertureMm: 50,
  magnifications: [10],
  eyes: 2,
  transmission: 0.8,
};

export const TELESCOPE_200: Instrument = {
  name: '200 mm telescope',
  kind: 'telescope',
  apertureMm: 200,
  magnifications: [40, 80, 133, 200],
  eyes: 1,
  transmission: 0.75,
};

/** An instrument that no one can look through: which field, what it was, what would be right. */
export class InstrumentError extends RangeError {
  constructor(
    readonly field: keyof Instrument,
    readonly value: unknown,
    readonly right: string,
  ) {
    super(`${field} was ${JSON.stringify(value)}; give ${right}.`);
    this.name = 'InstrumentError';
  }
}

/** Throws an InstrumentError where a number makes no sense. */
export function checkInstrument(instrument: Instrument): void {
  const { apertureMm, magnifications, transmission } = instrument;
  if (instrument.kind === 'nakedEye') return;
  if (!(apertureMm > 0)) {
    throw new InstrumentError('apertureMm', apertureMm, 'the clear aperture in millimetres, more than 0');
  }
  if (magnifications.length === 0 || !magnifications.every((power) => power > 0)) {
    throw new InstrumentError('magnifications', magnifications, 'at least one power, each more than 0');
  }
  if (!(transmission > 0 && transmission <= 1)) {
    throw new InstrumentError('transmission', transmission, 'a share of light, more than 0 and at most 1');
  }
}
