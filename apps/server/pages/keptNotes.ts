import {
  type BodyChange,
  type BodyTrust,
  type Database,
  eventChanges,
  type EventView,
  trustOfEvent,
} from '#club';

/** What the pages say of comets and asteroids beside the plan. */
export interface EventNotes {
  /** What elements received since the evening was judged change in it. */
  readonly changes: readonly BodyChange[];
  readonly trust: readonly BodyTrust[];
}

/** Evenings pass by while nobody writes to the database; what is kept is looked at anew after this. */
const KEPT_MS = 3_600_000;

/** Notes on events, worked out anew only when the database has changed or an hour has passed. */
export class KeptNotes {
  private version: number | null = null;
  private until = 0;
  private changes: Promise<ReadonlyMap<string, readonly BodyChange[]>> | null = null;
  private readonly trusts = new Map<string, Promise<readonly BodyTrust[]>>();

  constructor(private readonly database: Database) {}

  /** Changes of all events to come, by their ids. */
  allChanges(): Promise<ReadonlyMap<string, readonly BodyChange[]>> {
    this.refresh();
    if (this.changes === null) {
      const changes = eventChanges(this.database);
      this.changes = changes;
      // What failed is tried anew, not remembered.
      changes.catch(() => (this.changes = null));
    }
    return this.changes;
  }

  /** Notes on an event; none once it is over. */
  async ofEvent(event: EventView): Promise<EventNotes> {
    if (Date.parse(event.endsAt) < this.database.now().getTime()) return { changes: [], trust: [] };
    this.refresh();
    let trust = this.trusts.get(event.id);
    if (trust === undefined) {
      trust = trustOfEvent(this.database, event);
      this.trusts.set(event.id, trust);
      trust.catch(() => this.trusts.delete(event.id));
    }
    return { changes: (await this.allChanges()).get(event.id) ?? [], trust: await trust };
  }

  private refresh(): void {
    const version = this.database.changes.version();
    const nowMs = this.database.now().getTime();
    if (version === this.version && nowMs < this.until) return;
    this.version = version;
    this.until = nowMs + KEPT_MS;
    this.changes = null;
    this.trusts.clear();
  }
}
