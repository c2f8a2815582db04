import { type EveningJson, eveningJson, type EventView } from '#club';

/** An event as other programs read it. */
export type EventJson = Omit<EventView, 'evening'> & { readonly evening: EveningJson };

export function eventJson(event: EventView): EventJson {
  return { ...event, evening: eveningJson(event.evening) };
}
