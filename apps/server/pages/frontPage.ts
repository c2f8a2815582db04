import {
  type BodyChange,
  type ClubView,
  dateWords,
  type EventView,
  type ProgrammeView,
  type Ranking,
} from '#club';
import { type JudgedEvening } from '#nights';
import { changeNotes } from './bodyNotes';
import { offerWords, partsList, showingsTable } from './eveningParts';
import { chartLinks, eventForms, eventSentence, statusLine } from './eventParts';
import { html, type Html } from './html';
import { pageFrame } from './pageFrame';
import { type PageSearch } from './seasonPages';

/** All that the front page tells. */
export interface FrontPage {
  readonly club: ClubView;
  readonly events: readonly EventView[];
  /** What newer elements change in events to come, by the events' ids. */
  readonly changes: ReadonlyMap<string, readonly BodyChange[]>;
  readonly programmes: readonly ProgrammeView[];
  readonly search: PageSearch | null;
  /** Null while the search still runs. */
  readonly ranking: Ranking | null;
  /** Address that calendars subscribe to. */
  readonly calendarAddress: string;
  readonly nowMs: number;
}

/** The coordinator's page: the next event, the best evenings, the events, the calendar's address. */
export function frontPage(page: FrontPage): string {
  const { club, events, search } = page;
  return pageFrame({
    title: `${club.name}: public evenings`,
    language: club.locale,
    content: html`<header>
        <p class="club">${club.name}</p>
        <h1>Public evenings under the night sky</h1>
        ${nextEvent(page)}
        <p class="note">${zonesNote(page)}</p>
      </header>
      <main>
        <section aria-labelledby="best">
          <h2 id="best">
            ${search === null ? 'Best evenings' : `Best evenings, ${spanWords(search, club.locale)}`}
          </h2>
          ${search === null ? html`<p>Enter a site and a programme first; then the evenings are ranked here.</p>` : bestEvenings(page, search)}
        </section>
        <section aria-labelledby="events">
          <h2 id="events">Events</h2>
          ${events.length === 0 ? html`<p>None yet. Make one of an evening above; it starts as a draft.</p>` : eventList(page)}
        </section>
        <section aria-labelledby="calendar">
          <h2 id="calendar">Calendar</h2>
          <p>
            Members subscribe to this address in any calendar program: <code>${page.calendarAddress}</code>
          </p>
          <p class="note">
            It holds the published events, and those called off, marked so.
            <a href="/calendar.ics">Download it once</a>, or read
            <a href="/api/docs">how programs get at all of this</a>.
          </p>
        </section>
      </main>`,
  });
}

function nextEvent({ events, nowMs, club }: FrontPage): Html {
  const next = events.find(({ status, endsAt }) => status === 'published' && Date.parse(endsAt) > nowMs);
  if (next === undefined) return html`<p class="lead">No event is published yet.</p>`;
  return html`<p class="lead">Next: ${eventSentence(next, club.locale)}</p>
    <p><a href="/events/${next.id}">${next.title}: what to expect and what to bring</a></p>`;
}

function zonesNote({ ranking, events }: FrontPage): string {
  const zones = new Set([...(ranking?.evenings ?? []), ...events].map(({ zone }) => zone));
  if (zones.size === 0) return '';
  const [zone] = zones;
  return zones.size === 1
    ? `All times are local, in the zone ${zone!}.`
    : 'All times are local to the site; its zone stands with each evening.';
}

function spanWords({ from, to }: PageSearch, locale: string): string {
  const short = (date: string): string => dateWords(date, locale, true).replace(/^\p{L}+,? /u, '');
  return `${short(from)} to ${short(to)}`;
}

function bestEvenings({ ranking, programmes, club, events }: FrontPage, search: PageSearch): Html {
  const form = searchForm(search, programmes);
  if (ranking === null) {
    return html`${form}
      <p role="status">
        The evenings are still being worked out.
        <a href="/?from=${search.from}&to=${search.to}&programme=${encodeURIComponent(search.programmeName)}"
          >Look again</a
        >
      </p>`;
  }
  const { searched, evenings, habit } = ranking;
  if (evenings.length === 0) {
    return html`${form}
      <p>
        No evening of this season is open: look at the programme's weekdays, the closed dates and the club's
        other dates.
      </p>`;
  }
  const severalZones = new Set(evenings.map(({ zone }) => zone)).size > 1;
  return html`${form}
    <p class="note">
      ${searched.evenings} open evenings at ${searched.sites} ${searched.sites === 1 ? 'site' : 'sites'},
      ${searched.targets} targets; the best ${evenings.length} of
      them.${
        habit !== null &&
        html` Keeping to the ${habit.words} would bring ${habit.averageScore.toFixed(0)} points on average
        instead of ${habit.freeAverageScore.toFixed(0)}.`
      }
    </p>
    <ol class="evenings">
      ${evenings.map((evening) => eveningEntry(evening, search, club.locale, severalZones, events))}
    </ol>`;
}

function eveningEntry(
  evening: JudgedEvening,
  search: PageSearch,
  locale: string,
  withZone: boolean,
  events: readonly EventView[],
): Html {
  const { site, date, score } = evening;
  const held = events.find(
    (event) => event.site.name === site && event.date === date && event.status !== 'calledOff',
  );
  const day = dateWords(date, locale, true);
  return html`<li>
    <p class="line">
      <strong>${day}</strong> at ${site}: ${offerWords(evening)}
      <span class="points">${score.toFixed(0)} points</span>
    </p>
    ${withZone && html`<p class="note">Zone ${evening.zone}</p>`}
    <details>
      <summary>Why, and when each target is shown<span class="hidden"> on ${day} at ${site}</span></summary>
      ${partsList(evening)} ${showingsTable(evening, `Showings on ${day} at ${site}`)}
    </details>
    ${
      held === undefined
        ? html`<form method="post" action="/events">
            <input type="hidden" name="siteName" value="${site}" /><input
              type="hidden"
              name="programmeName"
              value="${search.programmeName}"
            /><input type="hidden" name="date" value="${date}" />
            <button>Make an event of this<span class="hidden">: ${day} at ${site}</span></button>
          </form>`
        : html`<p>An event is made of it: <a href="/events/${held.id}">${held.title}, ${day}</a></p>`
    }
  </li>`;
}

function searchForm({ from, to, programmeName }: PageSearch, programmes: readonly ProgrammeView[]): Html {
  return html`<form class="row screen" method="get" action="/">
    <label>From <input type="date" name="from" value="${from}" required /></label>
    <label>To <input type="date" name="to" value="${to}" required /></label>
    <label
      >Programme
      <select name="programme">
        ${programmes.map(
          ({ name }) => html`<option${name === programmeName && html` selected`}>${name}</option>`,
        )}
      </select></label
    >
    <button>Rank the evenings</button>
  </form>`;
}

function eventList({ events, changes, club }: FrontPage): Html {
  return html`<ul class="events">
    ${events.map(
      (event) =>
        html`<li>
          <h3><a href="/events/${event.id}">${event.title}</a></h3>
          <p class="line">${eventSentence(event, club.locale)}</p>
          ${statusLine(event)} ${changeNotes(changes.get(event.id) ?? [])}
          <details>
            <summary>
              Sheets and steps<span class="hidden">
                of ${event.title}, ${dateWords(event.date, club.locale, true)}</span
              >
            </summary>
            ${chartLinks(event)} ${eventForms(event)}
          </details>
        </li>`,
    )}
  </ul>`;
}
