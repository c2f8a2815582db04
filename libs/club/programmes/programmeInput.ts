import { z } from 'zod';
import { between, line, minutesFromNoon, timeOfDay, wholeBetween } from '../input/fields';

const WEEKDAY_RIGHT = 'an ISO weekday, 1 (Monday) to 7 (Sunday)';
const NTH_RIGHT = '1, 2, 3 or 4, or -1 for the last of the month';
const WEIGHT_RIGHT = 'a weight above 0, at most 100';

const fixedHours = z
  .strictObject({ kind: z.literal('fixed'), start: timeOfDay, end: timeOfDay })
  .superRefine(({ start, end }, context) => {
    if (minutesFromNoon(start) < minutesFromNoon(end)) return;
    const message = `a time after the start at ${start}, in an evening that runs from noon to noon`;
    context.addIssue({ code: 'custom', path: ['end'], message });
  });

const duskHours = z.strictObject({
  kind: z.literal('dusk'),
  from: z.enum(['sunset', 'civilDusk', 'nauticalDusk', 'astronomicalDusk']),
  offsetMinutes: between(-180, 360, 'minutes after that twilight, from -180 to 360').default(0),
  durationMinutes: between(10, 720, 'minutes from 10 to 720'),
  latest: timeOfDay.nullable().default(null),
});

/** The rule for the public hours. */
export const HoursInput = z.discriminatedUnion('kind', [fixedHours, duskHours], {
  error: 'a rule of kind fixed or dusk',
});

export const WeekdaysInput = z
  .array(wholeBetween(1, 7, WEEKDAY_RIGHT))
  .max(7, { error: 'each weekday once' })
  .refine((days) => new Set(days).size === days.length, { error: 'each weekday once' });

const points = between(0, 1000, 'points from 0 to 1000');

/** Points that the parts of the score can bring. */
export const WeightsInput = z
  .strictObject({ programme: points, darkness: points, height: points, moon: points })
  .refine((weights) => Object.values(weights).some((value) => value > 0), {
    error: 'points above 0 for at least one part',
  });

const item = z.strictObject({
  /** Id or name. */
  target: line(120),
  /** Id or name. */
  instrument: line(120),
  weight: z
    .number({ error: WEIGHT_RIGHT })
    .gt(0, { error: WEIGHT_RIGHT })
    .max(100, { error: WEIGHT_RIGHT })
    .default(1),
  leastMinutes: between(1, 600, 'minutes from 1 to 600').default(20),
  leastAltitudeDeg: between(0, 80, 'degrees above the level, from 0 to 80').default(15),
});

/** The targets promised, with what the club wishes of an evening. */
export const ProgrammeInput = z.strictObject({
  name: line(120),
  items: z
    .array(item)
    .min(1, { error: 'at least one target; an empty programme promises nothing' })
    .max(200, { error: 'at most 200 targets' }),
  moon: z.enum(['dark', 'welcome', 'indifferent']).default('indifferent'),
  hours: HoursInput,
  weekdays: WeekdaysInput.default([]),
  habit: z
    .strictObject({
      nth: z.union([z.literal(1), z.literal(2), z.literal(3), z.literal(4), z.literal(-1)], {
        error: NTH_RIGHT,
      }),
      weekday: wholeBetween(1, 7, WEEKDAY_RIGHT),
    })
    .nullable()
    .default(null),
  weights: WeightsInput.default({ programme: 50, darkness: 20, height: 15, moon: 15 }),
});

export type ProgrammeInput = z.input<typeof ProgrammeInput>;
