import { listWords } from '#nights';
import { timesWords } from '../events/eveningWords';
import { shiftWords } from '../sky/placeShift';
import { type EveningChange } from './eveningChange';

const CHART_WORDS = { eye: 'unaided-eye', binocular: 'binocular', eyepiece: 'eyepiece' } as const;

/**
 * What new elements change in an evening, in sentences: where the body stands beside the charts printed before
 * they came, which to print again, and what becomes of its showing. `since` names the day they came.
 */
export function changeSentence(body: string, change: EveningChange, since: string, zone: string): string {
  return [
    placeSentence(body, change, since),
    ...showingSentence(change, zone),
    ...magnitudeSentence(change),
  ].join(' ');
}

function placeSentence(body: string, { shift, printAgain }: EveningChange, since: string): string {
  const stands = `New elements: ${body} stands ${shiftWords(shift)} ${shift.direction} of where charts printed before ${since} show it`;
  if (printAgain.length === 0) return `${stands}; no reader can see that on a chart.`;
  const charts = `the ${listWords(printAgain.map((scale) => CHART_WORDS[scale]))} chart${printAgain.length === 1 ? '' : 's'}`;
  return `${stands}: print ${charts} again.`;
}

function showingSentence({ showing, before, after }: EveningChange, zone: string): string[] {
  switch (showing) {
    case 'same':
      return [];
    case 'gained':
      return [`It can now be shown, ${timesWords(after.intervals, zone)}.`];
    case 'lost':
      return [`It can no longer be shown: ${after.why}`];
    case 'moved':
      return [
        `It is shown ${timesWords(after.intervals, zone)} instead of ${timesWords(before.intervals, zone)}.`,
      ];
  }
}

/** Less than this nobody tells apart at the eyepiece. */
const TOLD_MAGNITUDES = 0.1;

function magnitudeSentence({ shift: { magnitudeChange } }: EveningChange): string[] {
  if (magnitudeChange === null || Math.abs(magnitudeChange) < TOLD_MAGNITUDES) return [];
  const amount = Math.abs(magnitudeChange).toFixed(1);
  return [`It should be ${amount} magnitudes ${magnitudeChange > 0 ? 'fainter' : 'brighter'}.`];
}
