import { dateWords, eveningSentence, type EventView, plannedShowings } from '#club';
import { html, type Html } from './html';

const STATUS_WORDS: Readonly<Record<EventView['status'], string>> = {
  draft: 'Draft, not in the calendar yet',
  published: 'Published',
  calledOff: 'Called off',
};

/** An event's standing in words, with the reason where it is called off. */
export function statusLine({ status, callOffWhy }: EventView): Html {
  return html`<p>
    <span class="status">${STATUS_WORDS[status]}</span>${callOffWhy !== null && `: ${callOffWhy}`}
  </p>`;
}

/** The evening with the event's own times: what was judged may since have been moved. */
export function eventSentence(event: EventView, locale: string): string {
  const { evening } = event;
  const startMs = Date.parse(event.startsAt);
  const endMs = Date.parse(event.endsAt);
  const shown = plannedShowings(event).length;
  return eveningSentence({ ...evening, shown, publicHours: { startMs, endMs } }, locale);
}

/** 'Saturday 6 February 2027 at Brackenfold, 19:10 to 21:40'. */
export function whenAndWhere(event: EventView, locale: string): string {
  const clock = (iso: string): string => iso.slice(11, 16);
  const times = `${clock(event.startsAt)} to ${clock(event.endsAt)}`;
  return `${dateWords(event.date, locale, true)} at ${event.site.name}, ${times}`;
}

const SCALES = [
  ['eye', 'unaided eye'],
  ['binocular', 'binocular'],
  ['eyepiece', 'eyepiece'],
] as const;

/** Links to the sheets of every target that is shown. */
export function chartLinks(event: EventView): Html {
  const shown = plannedShowings(event);
  if (shown.length === 0) return html``;
  return html`<h3>Finder charts</h3>
    <ul>
      ${shown.map(
        ({ target }) =>
          html`<li>
            ${target}:
            ${SCALES.map(
              ([scale, words], i) =>
                html`${i > 0 && ', '}<a
                    href="/api/events/${event.id}/charts/${encodeURIComponent(target)}?scale=${scale}"
                    >${words}<span class="hidden"> chart of ${target}</span></a
                  >`,
            )}
          </li>`,
      )}
    </ul>`;
}

/** What a coordinator can do with the event next. */
export function eventForms(event: EventView): Html {
  if (event.status === 'calledOff') return html``;
  const publish = html`<form method="post" action="/events/${event.id}/publish">
    <button>Publish<span class="hidden"> ${event.title}</span></button>
  </form>`;
  const callOff = html`<form class="row" method="post" action="/events/${event.id}/call-off">
    <label>Why it is called off, for the public <input name="why" required maxlength="400" /></label>
    <button>Call off<span class="hidden"> ${event.title}</span></button>
  </form>`;
  const packet = html`<form method="post" action="/events/${event.id}/packet">
    <button>Print the packet<span class="hidden"> of ${event.title}</span></button>
  </form>`;
  return html`${event.status === 'draft' && publish}${packet}${callOff}`;
}
