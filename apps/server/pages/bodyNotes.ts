import { type BodyChange } from '#club';
import { html, type Html } from './html';
import { type EventNotes } from './keptNotes';

/** What newer elements change in an event, a sentence a body. */
export function changeNotes(changes: readonly BodyChange[]): Html {
  return html`${changes.map(({ sentence }) => html`<p class="notice">${sentence}</p>`)}`;
}

/** How far the comets and asteroids of an event can be trusted, a line each; nothing where there are none. */
export function bodyNotes({ changes, trust }: EventNotes): Html {
  if (trust.length === 0) return html``;
  return html`${changeNotes(changes)}
    <h3>Comets and asteroids</h3>
    <ul>
      ${trust.map(
        ({ line, words, motion }) =>
          html`<li>
            ${line} ${motion.words}
            <details>
              <summary>
                How that is reckoned<span class="hidden">: ${line.slice(0, line.indexOf(':'))}</span>
              </summary>
              <p class="note">${words.slice(line.length).trim()}</p>
            </details>
          </li>`,
      )}
    </ul>`;
}
