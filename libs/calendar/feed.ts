/** What a calendar shows of an event's standing (RFC 5545, 3.8.1.11). */
export type CalendarStatus = 'TENTATIVE' | 'CONFIRMED' | 'CANCELLED';

/** One event of a feed. Instants are UTC epoch milliseconds. */
export interface CalendarEvent {
  /** The same for life, free of host names; see `eventUid`. */
  readonly uid: string;
  /** From 0, raised by each change the public should notice. */
  readonly sequence: number;
  readonly status: CalendarStatus;
  readonly createdMs: number;
  readonly lastModifiedMs: number;
  readonly startMs: number;
  /** After the start. */
  readonly endMs: number;
  /** IANA zone that its times are told in. */
  readonly zone: string;
  readonly summary: string;
  readonly description: string;
  readonly location: string;
  /** Degrees, north and east positive; null: not told. */
  readonly geo: { readonly latitudeDeg: number; readonly longitudeDeg: number } | null;
  readonly url: string | null;
}

/** A calendar that others subscribe to. */
export interface CalendarFeed {
  readonly name: string;
  readonly description: string;
  /** Address of the page the calendar belongs to; null: not told. */
  readonly url: string | null;
  /** Hours a reader should wait between two looks, at least 1. */
  readonly refreshHours: number;
  readonly events: readonly CalendarEvent[];
}
