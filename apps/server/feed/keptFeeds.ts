import { clubCalendar, type Database } from '#club';
import { etagOf } from '#calendar';

/** A calendar ready to be sent. */
export interface KeptFeed {
  readonly body: Buffer;
  readonly etag: string;
}

/** Sites can be named in many spellings; each is kept by itself, up to so many. */
const MOST_KEPT = 200;

/** The calendars, written anew only when the database has changed: thousands of readers ask every few hours. */
export class KeptFeeds {
  private version: number | null = null;
  private readonly feeds = new Map<string | undefined, Promise<KeptFeed>>();

  constructor(private readonly database: Database) {}

  /** The calendar of a site (id or name), or of all. */
  find(site?: string): Promise<KeptFeed> {
    const version = this.database.changes.version();
    if (version !== this.version || this.feeds.size > MOST_KEPT) this.feeds.clear();
    this.version = version;
    let feed = this.feeds.get(site);
    if (feed === undefined) {
      feed = this.write(site);
      this.feeds.set(site, feed);
      // What was asked for in vain, such as an unknown site, is not remembered.
      feed.catch(() => this.feeds.delete(site));
    }
    return feed;
  }

  private async write(site: string | undefined): Promise<KeptFeed> {
    const text = await clubCalendar(this.database, site === undefined ? {} : { site });
    return { body: Buffer.from(text, 'utf8'), etag: etagOf(text) };
  }
}
