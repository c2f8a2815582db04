import { type Imprint } from '#print';
import { z } from 'zod';

/** An imprint as the database keeps it, checked on the way in and out. */
const KeptImprint: z.ZodType<Imprint> = z.object({
  programVersion: z.string(),
  catalogueVersion: z.string(),
  hours: z.object({ startsAt: z.string(), endsAt: z.string() }),
  running: z.object({
    leastLookMinutes: z.number(),
    breaks: z.array(z.object({ from: z.string(), to: z.string() })),
  }),
  site: z.string(),
  programme: z.string(),
  words: z.string(),
  elementSets: z.array(
    z.object({
      target: z.string(),
      setId: z.string(),
      number: z.number(),
      epoch: z.string().nullable(),
      source: z.string(),
    }),
  ),
});

export function imprintAsText(imprint: Imprint): string {
  return JSON.stringify(KeptImprint.parse(imprint));
}

export function imprintFromText(text: string): Imprint {
  return KeptImprint.parse(JSON.parse(text));
}
