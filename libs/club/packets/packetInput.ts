import { SHEET_NAMES } from '#print';
import { z } from 'zod';
import { between, line, minutesFromNoon, timeOfDay } from '../input/fields';

const scales = ['eye', 'binocular', 'eyepiece'] as const;

const rest = z.strictObject({ from: timeOfDay, to: timeOfDay }).superRefine(({ from, to }, context) => {
  if (minutesFromNoon(from) < minutesFromNoon(to)) return;
  const message = `a time after the break begins at ${from}, in an evening that runs from noon to noon`;
  context.addIssue({ code: 'custom', path: ['to'], message });
});

/** What is to be printed for an event. */
export const PacketInput = z.strictObject({
  eventId: line(120),
  /** Any of them in any order, each once. */
  sheets: z
    .array(z.enum(SHEET_NAMES, { error: `sheets of a packet: ${SHEET_NAMES.join(', ')}` }))
    .min(1, { error: 'at least one sheet' })
    .refine((names) => new Set(names).size === names.length, { error: 'each sheet once' })
    .default([...SHEET_NAMES]),
  paper: z.enum(['a4', 'letter'], { error: 'a4 or letter' }).default('a4'),
  /** Finder charts of each target, wide to narrow. */
  scales: z
    .array(z.enum(scales, { error: `scales of a chart: ${scales.join(', ')}` }))
    .min(1, { error: 'at least one scale' })
    .refine((names) => new Set(names).size === names.length, { error: 'each scale once' })
    .default(['binocular']),
  leastLookMinutes: between(5, 60, 'minutes from 5 to 60').default(10),
  /** Times in which nobody shows anything. */
  breaks: z.array(rest).max(10, { error: 'at most 10 breaks' }).default([]),
});

export type PacketInput = z.input<typeof PacketInput>;
export type PacketWishes = z.output<typeof PacketInput>;
