import { CAUTIONS, type ClubView, type EventView, plannedShowings, type TargetView } from '#club';
import { bodyNotes } from './bodyNotes';
import { showingsTable } from './eveningParts';
import { chartLinks, eventForms, eventSentence, statusLine, whenAndWhere } from './eventParts';
import { html, type Html } from './html';
import { type EventNotes } from './keptNotes';
import { pageFrame } from './pageFrame';

/** One event for the public: what, where, when, what to bring, what to mind. */
export function eventPage(
  event: EventView,
  club: ClubView,
  targets: readonly TargetView[],
  notes: EventNotes,
): string {
  const { site, zone, title, words, status } = event;
  const shown = plannedShowings(event);
  return pageFrame({
    title: `${title}: ${club.name}`,
    language: club.locale,
    content: html`<header>
        <p class="club"><a href="/">${club.name}</a></p>
        <h1>${title}</h1>
        <p class="lead">${eventSentence(event, club.locale)}</p>
        ${status !== 'published' && statusLine(event)}
      </header>
      <main>
        ${words !== '' && paragraphs(words)}
        <section aria-labelledby="when">
          <h2 id="when">When and where</h2>
          <p>${whenAndWhere(event, club.locale)}. All times are local, in the zone ${zone}.</p>
          ${site.directions !== '' && paragraphs(site.directions)}
          <p>The site lies at ${coordinateWords(site)}.</p>
        </section>
        <section aria-labelledby="what">
          <h2 id="what">What we plan to show</h2>
          ${
            shown.length === 0
              ? html`<p>Nothing of the programme can be promised on this evening.</p>`
              : html`<p>
                    Under a clear sky. Heights are above the level ground: a fist at arm's length covers about
                    10 degrees.
                  </p>
                  ${showingsTable({ ...event.evening, showings: shown }, 'What is shown, when and where in the sky', glosses(targets))}`
          }
        </section>
        <section aria-labelledby="bring">
          <h2 id="bring">What to bring</h2>
          ${club.bringWords === '' ? html`<p>Warm clothes, firm shoes and a red torch.</p>` : paragraphs(club.bringWords)}
        </section>
        <section aria-labelledby="mind">
          <h2 id="mind">What to mind</h2>
          <ul class="cautions">
            ${CAUTIONS.map((caution) => html`<li>${caution}</li>`)}
          </ul>
        </section>
        ${
          club.callOffWords !== '' &&
          html`<section aria-labelledby="off">
            <h2 id="off">If the sky does not play along</h2>
            ${paragraphs(club.callOffWords)}
          </section>`
        }
        <section aria-labelledby="calendar">
          <h2 id="calendar">Calendar</h2>
          <p>
            The evenings at this site as a calendar:
            <a href="/sites/${site.id}/calendar.ics">${site.name}</a>; of all sites:
            <a href="/calendar.ics">all evenings</a>.
          </p>
        </section>
        <section class="screen" aria-labelledby="club">
          <h2 id="club">For the club</h2>
          ${statusLine(event)} ${bodyNotes(notes)} ${chartLinks(event)} ${eventForms(event)}
        </section>
      </main>`,
  });
}

/** What a visitor reads under a target's name. */
function glosses(targets: readonly TargetView[]): ReadonlyMap<string, string> {
  return new Map(
    targets.map((target) => {
      const name = target.kind === 'deepSky' && target.commonName !== target.name ? target.commonName : null;
      return [target.name, [name, target.gloss].filter((part) => part !== null && part !== '').join('. ')];
    }),
  );
}

function paragraphs(text: string): Html {
  return html`${text.split(/[\r\n]+/).map((paragraph) => html`<p>${paragraph}</p>`)}`;
}

function coordinateWords({ latitudeDeg, longitudeDeg }: EventView['site']): string {
  const half = (degrees: number, positive: string, negative: string): string =>
    `${Math.abs(degrees).toFixed(4)} degrees ${degrees < 0 ? negative : positive}`;
  return `${half(latitudeDeg, 'north', 'south')}, ${half(longitudeDeg, 'east', 'west')}`;
}
