import { z } from 'zod';
import { date, instant, line, prose } from '../input/fields';

const title = line(160);
const words = prose(4000);

/** An event to be made of an evening. */
export const EventInput = z.strictObject({
  /** Site and programme by id or name. */
  siteName: line(120),
  programmeName: line(120),
  date,
  /** Left out: made of the programme's and the site's names. */
  title: title.optional(),
  words: words.default(''),
});

export type EventInput = z.input<typeof EventInput>;

/** What may be changed of an event before it is over. */
export const EventChange = z.strictObject({
  title: title.optional(),
  words: words.optional(),
  /** Both inside the evening, which runs from local noon to the next. */
  startsAt: instant.optional(),
  endsAt: instant.optional(),
  /** Why, for the history. */
  why: prose(400).default(''),
});

export type EventChange = z.input<typeof EventChange>;

/** Why an event is called off, for the public. */
export const CallOff = z.strictObject({ why: line(400) });

export type CallOff = z.input<typeof CallOff>;
