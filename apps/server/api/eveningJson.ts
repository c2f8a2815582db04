import { type EventView, type NightsJson, toNightsJson } from '#club';
import { type JudgedEvening } from '#nights';

export type EveningJson = NightsJson['evenings'][number];

/** An event as other programs read it. */
export type EventJson = Omit<EventView, 'evening'> & { readonly evening: EveningJson };

/** One judged evening as other programs read it: instants as ISO UTC. */
export function eveningJson(evening: JudgedEvening): EveningJson {
  const searched = { sites: 1, evenings: 1, targets: evening.of, steps: 0, milliseconds: 0 };
  return toNightsJson({ searched, evenings: [evening], rows: [], closed: [], habit: null }).evenings[0]!;
}

export function eventJson(event: EventView): EventJson {
  return { ...event, evening: eveningJson(event.evening) };
}
