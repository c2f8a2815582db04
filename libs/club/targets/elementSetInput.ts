import { z } from 'zod';
import { between, line, prose } from '../input/fields';

const ECCENTRICITY_RIGHT = 'a number from 0 (circle) by way of 1 (parabola) to 100';
const DISTANCE_RIGHT = 'the perihelion distance in au, more than 0, at most 1000';
const TIME_RIGHT = 'a TT time as ISO, such as 2027-03-14T05:20:00 or 2027-03-14';
const ANGLE_RIGHT = 'degrees from -360 to 360';

const ttTime = z
  .string({ error: TIME_RIGHT })
  .regex(/^\d{4}-\d{2}-\d{2}(?:[T ]\d{2}:\d{2}(?::\d{2}(?:\.\d+)?)?)?$/, { error: TIME_RIGHT, abort: true })
  .refine((text) => ttIsoToJd(text) !== null, { error: TIME_RIGHT })
  .meta({ description: TIME_RIGHT });

const angle = between(-360, 360, ANGLE_RIGHT);

/**
 * Orbital elements as an observer or a circular gives them: any sufficient part, the rest is worked out. Field
 * names as `elements check` prints them; J2000 ecliptic, degrees, au, TT.
 */
export const ElementSetInput = z.strictObject({
  /** Where they are from, in words. */
  source: prose(300).default(''),
  designation: z.string({ error: 'text' }).trim().max(60, { error: 'at most 60 characters' }).default(''),
  kind: z.enum(['comet', 'asteroid']),
  epoch: ttTime.nullish(),
  perihelionTime: ttTime.nullish(),
  perihelionDistanceAu: z
    .number({ error: DISTANCE_RIGHT })
    .gt(0, { error: DISTANCE_RIGHT })
    .max(1000, { error: DISTANCE_RIGHT })
    .nullish(),
  eccentricity: between(0, 100, ECCENTRICITY_RIGHT).nullish(),
  inclinationDeg: between(0, 180, 'degrees from 0 to 180'),
  nodeDeg: angle,
  argumentOfPerihelionDeg: angle,
  semiMajorAxisAu: between(-1e6, 1e6, 'au; negative for a hyperbola').nullish(),
  meanAnomalyDeg: between(-1e6, 1e6, 'degrees').nullish(),
  meanMotionDegPerDay: between(0, 1e3, 'degrees a day, 0 or more').nullish(),
  periodYears: between(0, 1e9, 'Julian years, 0 or more').nullish(),
  absoluteMagnitude: between(-20, 40, 'H of the magnitude law, from -20 to 40, or null').nullish(),
  /** n of a comet's law, G of an asteroid's. */
  slope: between(-1, 40, "n of a comet's law or G of an asteroid's, from -1 to 40, or null").nullish(),
});

export type ElementSetInput = z.input<typeof ElementSetInput>;

/** Name of a body, one line. */
export const bodyName = line(120);

/** Julian date of a TT time written as ISO without a zone; null where there is no such time. */
export function ttIsoToJd(text: string): number | null {
  const [day = '', time = '00:00'] = text.split(/[T ]/);
  const midnight = Date.parse(`${day}T00:00:00Z`);
  if (Number.isNaN(midnight) || !new Date(midnight).toISOString().startsWith(day)) return null;
  const [hour = 0, minute = 0, second = 0] = time.split(':').map(Number);
  if (hour > 23 || minute > 59 || second >= 60) return null;
  return midnight / 86_400_000 + 2_440_587.5 + (hour + (minute + second / 60) / 60) / 24;
}

/** A TT Julian date as ISO without a zone, to the hundredth of a second. */
export function jdToTtIso(ttJd: number): string {
  const centiseconds = Math.round((ttJd - 2_440_587.5) * 8_640_000);
  return new Date(centiseconds * 10).toISOString().slice(0, -2);
}
