import { directionWords, moonSentence, timesWords } from '#club';
import { clockWords, type JudgedEvening, type PartName, type Showing, type ShowingRange } from '#nights';
import { html, type Html } from './html';

const PART_WORDS: Readonly<Record<PartName, string>> = {
  programme: 'Programme',
  darkness: 'Darkness',
  height: 'Height',
  moon: 'Moon',
};

/** 'Programme 46 of 50: …', one entry a part. */
export function partsList(evening: JudgedEvening): Html {
  return html`<dl>
    ${evening.parts.map(
      ({ name, points, of, why }) =>
        html`<dt>${PART_WORDS[name]}: ${points.toFixed(1)} of ${of} points</dt>
          <dd>${why}</dd>`,
    )}
  </dl>`;
}

/** Each target's times, and where to look at its best; `glosses` are told under the targets' names. */
export function showingsTable(
  evening: JudgedEvening,
  caption: string,
  glosses: ReadonlyMap<string, string> = new Map(),
): Html {
  return html`<div class="wide" tabindex="0" role="region" aria-label="${caption}">
    <table>
      <thead>
        <tr>
          <th scope="col">Target</th>
          <th scope="col">Shown</th>
          <th scope="col">Best</th>
        </tr>
      </thead>
      <tbody>
        ${evening.showings.map((showing) => showingRow(showing, evening.zone, glosses.get(showing.target) ?? ''))}
      </tbody>
    </table>
  </div>`;
}

function showingRow(showing: Showing, zone: string, gloss: string): Html {
  const { target, shown, intervals, best, why, range } = showing;
  if (!shown) {
    const hope = range?.matters === true ? ` ${forecastWords(range)}` : '';
    return html`<tr>
      <th scope="row">${target}</th>
      <td colspan="2">${why}${hope}</td>
    </tr>`;
  }
  const told = [asSentence(gloss), range?.matters === true ? forecastWords(range) : '']
    .filter((part) => part !== '')
    .join(' ');
  const words =
    told !== '' &&
    html`<tr class="gloss">
      <td colspan="3">${told}</td>
    </tr>`;
  return html`<tr${words !== false && html` class="glossed"`}>
      <th scope="row">${target}</th>
      <td>${timesWords(intervals, zone)}</td>
      <td>${best !== null && `${clockWords(best.utcMs, zone)}, ${directionWords(showing)}`}</td>
    </tr>
    ${words}`;
}

function asSentence(words: string): string {
  return words === '' || /[.!?]$/.test(words) ? words : `${words}.`;
}

/** What another brightness than foretold would change. */
function forecastWords({ words }: ShowingRange): string {
  return `Its brightness is a forecast: ${words}.`;
}

/** What follows date and site in the evening's line. */
export function offerWords(evening: JudgedEvening): string {
  const { publicHours, note, shown, of, zone } = evening;
  if (publicHours === null) return note ?? 'no public hours.';
  return `${String(shown)} of ${String(of)} targets, ${timesWords([publicHours], zone)}; ${moonSentence(evening)}`;
}
