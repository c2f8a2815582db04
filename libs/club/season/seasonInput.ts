import { z } from 'zod';
import { date, line, wholeBetween } from '../input/fields';
import { WeightsInput } from '../programmes/programmeInput';

const LONGEST_SEASON_YEARS = 5;

/** A search for the evenings worth holding. */
export const SeasonInput = z
  .strictObject({
    from: date,
    to: date,
    /** Sites by id or name; left out: all. */
    siteNames: z.array(line(120)).min(1, { error: 'at least one site, or leave it out for all' }).optional(),
    /** Programme by id or name; left out: the one entered first. */
    programmeName: line(120).optional(),
    /** How many evenings to give; left out: all. */
    limit: wholeBetween(1, 100_000, 'a whole number from 1 to 100000').optional(),
    /** Points of the score's parts; left out: the programme's. */
    weights: WeightsInput.optional(),
  })
  .superRefine(({ from, to }, context) => {
    if (to < from) {
      context.addIssue({
        code: 'custom',
        path: ['to'],
        message: `a date on or after from, which is ${from}`,
      });
      return;
    }
    const last = fiveYearsOn(from);
    if (to <= last) return;
    const message = `a date no later than ${last}: a season is at most five years long`;
    context.addIssue({ code: 'custom', path: ['to'], message });
  });

export type SeasonInput = z.input<typeof SeasonInput>;

/** The last date of five years that begin with this one. */
function fiveYearsOn(from: string): string {
  const day = new Date(`${from}T00:00:00Z`);
  day.setUTCFullYear(day.getUTCFullYear() + LONGEST_SEASON_YEARS);
  day.setUTCDate(day.getUTCDate() - 1);
  return day.toISOString().slice(0, 10);
}

/** One evening at one site under a programme. */
export const EveningInput = z.strictObject({ siteName: line(120), programmeName: line(120), date });

export type EveningInput = z.input<typeof EveningInput>;
