import { z } from 'zod';
import {
  azimuthDeg,
  between,
  date,
  elevationM,
  latitudeDeg,
  line,
  longitudeDeg,
  minutesFromNoon,
  prose,
  timeOfDay,
  wholeBetween,
  zone,
} from '../input/fields';

const HORIZON_RIGHT = 'azimuths that rise from point to point';

const horizon = z
  .array(
    z.strictObject({
      azimuthDeg,
      altitudeDeg: between(-5, 85, 'degrees above the level, from -5 to 85'),
    }),
  )
  .max(1440, { error: 'at most 1440 points' })
  .superRefine((points, context) => {
    for (let i = 1; i < points.length; i++) {
      const before = points[i - 1]!.azimuthDeg;
      if (points[i]!.azimuthDeg > before) continue;
      const message = `${HORIZON_RIGHT}: more than ${String(before)}, that of the point before`;
      context.addIssue({ code: 'custom', path: [i, 'azimuthDeg'], message });
    }
  });

const sky = z
  .strictObject({
    magPerArcsec2: between(15, 22.2, 'the zenith sky in V mag/arcsec2, from 15 to 22.2').optional(),
    bortleClass: wholeBetween(1, 9, 'a Bortle class, a whole number from 1 to 9').optional(),
  })
  .refine(({ magPerArcsec2, bortleClass }) => (magPerArcsec2 === undefined) !== (bortleClass === undefined), {
    error: 'either magPerArcsec2 or bortleClass',
  });

const gate = z
  .strictObject({ opens: timeOfDay.nullable().default(null), closes: timeOfDay.nullable().default(null) })
  .superRefine(({ opens, closes }, context) => {
    if (opens === null || closes === null || minutesFromNoon(opens) < minutesFromNoon(closes)) return;
    const message = `a time after the gate opens at ${opens}, in an evening that runs from noon to noon`;
    context.addIssue({ code: 'custom', path: ['closes'], message });
  });

/** Days inside which a site is shut. */
const closure = z
  .strictObject({ from: date, to: date, why: line(200) })
  .superRefine(({ from, to }, context) => {
    if (from <= to) return;
    context.addIssue({ code: 'custom', path: ['to'], message: `a date on or after ${from}, the first day` });
  });

/** A dark site as the club describes it. */
export const SiteInput = z.strictObject({
  name: line(120),
  latitudeDeg,
  longitudeDeg,
  elevationM: elevationM.default(0),
  /** Left out: that of the place. */
  zone: zone.optional(),
  sky,
  extinctionMagPerAirmass: between(0.05, 2, 'magnitudes an airmass, from 0.05 to 2, or null')
    .nullable()
    .default(null),
  horizon: horizon.default([]),
  domes: z
    .array(
      z.strictObject({
        azimuthDeg,
        widthDeg: between(1, 180, 'degrees from 1 to 180'),
        brighteningMag: between(0, 8, 'magnitudes from 0 to 8'),
      }),
    )
    .max(36, { error: 'at most 36 light domes' })
    .default([]),
  gate: gate.default({ opens: null, closes: null }),
  closures: z.array(closure).max(500, { error: 'at most 500 closures' }).default([]),
  directions: prose(2000).default(''),
  /** For helpers: what is dangerous there. */
  hazards: prose(2000).default(''),
  /** For helpers: whom to call, where a phone has signal, how an ambulance gets there. */
  emergencyWords: prose(2000).default(''),
});

export type SiteInput = z.input<typeof SiteInput>;
