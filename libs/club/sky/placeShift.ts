import { type ChartScale, usualFieldDeg } from '#charts';
import {
  ARCSEC,
  compassPoint,
  fromSpherical,
  type Observer,
  place,
  positionAngle,
  separation,
  type SkyTarget,
  toDeg,
  toRad,
} from '#sky';

/** What a shift in place comes to on the sheets of one scale. */
export interface ScaleShift {
  readonly scale: ChartScale;
  /** Width of the scale's usual field. */
  readonly fieldDeg: number;
  /** The shift as a share of that width. */
  readonly fieldFraction: number;
  /** The shift on the sheet. */
  readonly shiftMm: number;
  /** Less than a reader could see on the sheet. */
  readonly harmless: boolean;
  readonly words: string;
}

/** How far one account of a body's motion puts it from where another does, at one instant. */
export interface PlaceShift {
  readonly shiftArcsec: number;
  readonly shiftArcmin: number;
  /** Direction of the shift on the sky, from north through east. */
  readonly positionAngleDeg: number;
  /** The same in compass words, such as 'north-east'; east is where the sky rises from. */
  readonly direction: string;
  /** New less old; null where either has no magnitude law. */
  readonly magnitudeChange: number | null;
  readonly scales: readonly ScaleShift[];
}

const SCALES: readonly ChartScale[] = ['eye', 'binocular', 'eyepiece'];
const SCALE_WORDS: Readonly<Record<ChartScale, string>> = {
  eye: 'unaided-eye',
  binocular: 'binocular',
  eyepiece: 'eyepiece',
};

/** Below this a reader sees no difference on a printed sheet, mm. */
const SEEN_MM = 0.5;
/** The widest frame that a chart can have, mm: across a Letter sheet between its margins. On others shifts are smaller. */
const WIDEST_FRAME_MM = 191.9;

/**
 * The shift between two accounts of a body's motion (elements old and new, each with the planets' pull worked
 * in or not) as seen by an observer, or from the Earth's centre with null, at a UTC instant. Places are
 * astrometric, as on charts; the millimetres are those at the middle of the largest sheet.
 */
export function placeShift(
  before: SkyTarget,
  after: SkyTarget,
  utcMs: number,
  observer: Observer | null,
): PlaceShift {
  const from = place(before, utcMs, observer);
  const to = place(after, utcMs, observer);
  const a = from.astrometric;
  const b = to.astrometric;
  const shiftRad = separation(fromSpherical(a.raRad, a.decRad), fromSpherical(b.raRad, b.decRad));
  const positionAngleDeg = toDeg(positionAngle(a.raRad, a.decRad, b.raRad, b.decRad));
  return {
    shiftArcsec: shiftRad / ARCSEC,
    shiftArcmin: shiftRad / ARCSEC / 60,
    positionAngleDeg,
    direction: compassPoint(toRad(positionAngleDeg), 16).word,
    magnitudeChange: from.magnitude === null || to.magnitude === null ? null : to.magnitude - from.magnitude,
    scales: SCALES.map((scale) => scaleShift(scale, shiftRad)),
  };
}

function scaleShift(scale: ChartScale, shiftRad: number): ScaleShift {
  const fieldDeg = usualFieldDeg[scale];
  const fieldFraction = toDeg(shiftRad) / fieldDeg;
  const shiftMm = onSheetMm(shiftRad, toRad(fieldDeg));
  const harmless = shiftMm < SEEN_MM;
  const name = `${SCALE_WORDS[scale]} chart`;
  const words = harmless
    ? `harmless on the ${name}: ${lengthWords(shiftMm)} mm, less than a reader can see`
    : `seen on the ${name}: ${lengthWords(shiftMm)} mm, ${shareWords(fieldFraction)}`;
  return { scale, fieldDeg, fieldFraction, shiftMm, harmless, words };
}

/** Stereographic, as the charts are: a field's width is 4 tan(field / 4) (Snyder 1987), a shift's 2 tan(shift / 2). */
function onSheetMm(shiftRad: number, fieldRad: number): number {
  // A shift past a quarter turn is off every sheet, however large.
  const shift = 2 * Math.tan(Math.min(shiftRad, Math.PI / 2) / 2);
  return (WIDEST_FRAME_MM * shift) / (4 * Math.tan(fieldRad / 4));
}

function lengthWords(mm: number): string {
  return mm < 0.05 ? 'under 0.1' : mm < 10 ? mm.toFixed(1) : mm.toFixed(0);
}

function shareWords(share: number): string {
  if (share >= 1) return `${share.toFixed(1)} fields`;
  const percent = share * 100;
  return `${percent < 1 ? percent.toFixed(1) : percent.toFixed(0)}% of its field`;
}

/** A shift as people say it: '14 arcmin', '3.2 degrees', '40 arcsec'. */
export function shiftWords({ shiftArcsec }: Pick<PlaceShift, 'shiftArcsec'>): string {
  const arcmin = shiftArcsec / 60;
  if (arcmin >= 120) return `${(arcmin / 60).toFixed(1)} degrees`;
  if (arcmin >= 9.95) return `${arcmin.toFixed(0)} arcmin`;
  if (arcmin >= 1) return `${arcmin.toFixed(1)} arcmin`;
  return shiftArcsec >= 9.95 ? `${shiftArcsec.toFixed(0)} arcsec` : `${shiftArcsec.toFixed(1)} arcsec`;
}
