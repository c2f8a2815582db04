import { type JudgedEvening } from '#nights';
import { z } from 'zod';

const interval = z.object({ startMs: z.number(), endMs: z.number() });
const showingCase = z.object({ shown: z.boolean(), minutes: z.number(), intervals: z.array(interval) });

/** A judged evening as the database keeps it, checked on the way in and out. */
const KeptEvening: z.ZodType<JudgedEvening> = z.object({
  site: z.string(),
  date: z.string(),
  zone: z.string(),
  publicHours: interval.nullable(),
  note: z.string().nullable(),
  score: z.number(),
  parts: z.array(
    z.object({
      name: z.enum(['programme', 'darkness', 'height', 'moon']),
      points: z.number(),
      of: z.number(),
      why: z.string(),
    }),
  ),
  shown: z.number(),
  of: z.number(),
  showings: z.array(
    z.object({
      target: z.string(),
      shown: z.boolean(),
      minutes: z.number(),
      intervals: z.array(interval),
      best: z
        .object({
          utcMs: z.number(),
          altitudeDeg: z.number(),
          azimuthDeg: z.number(),
          skyBrightness: z.number(),
          margin: z.number(),
        })
        .nullable(),
      why: z.string(),
      /** Evenings kept before ranges were judged have none. */
      range: z
        .object({
          magnitudes: z.number(),
          ifBrighter: showingCase,
          ifFainter: showingCase,
          matters: z.boolean().default(true),
          words: z.string(),
        })
        .nullable()
        .default(null),
    }),
  ),
  moon: z.object({ illuminatedFraction: z.number(), upMinutes: z.number() }),
  darkMinutes: z.number(),
});

export function eveningAsText(evening: JudgedEvening): string {
  return JSON.stringify(KeptEvening.parse(evening));
}

export function eveningFromText(text: string): JudgedEvening {
  return KeptEvening.parse(JSON.parse(text));
}
