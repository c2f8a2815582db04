import { type BodyTrust, type FieldShare } from './bodyTrust';
import { arcCounted } from './placeError';

type Facts = Omit<BodyTrust, 'line' | 'words'>;

/** A body's trust in a line for a page, and in full with the rule that it rests on. */
export function trustWords(
  facts: Facts,
  kind: 'comet' | 'asteroid',
  numbered: boolean,
): Pick<BodyTrust, 'line' | 'words'> {
  const { body, ageDays, expectedError, eyepiece, finder, movedByPlanetsArcsec } = facts;
  if (ageDays === null || expectedError === null || eyepiece === null || finder === null) {
    const line = `${body}: its elements name no epoch, so nobody can tell how old they are; get newer ones before printing.`;
    return {
      line,
      words: `${line} Without an epoch the planets' pull on it is left out as well, which alone can come to arcminutes within a year.`,
    };
  }
  const off = offWords(expectedError.likelyArcsec, expectedError.badArcsec);
  const line = `${body}: elements ${ageWords(ageDays)}; its place may be off by ${off}: ${inFieldWords(facts)}.${facts.refresh ? ' Get newer elements before printing.' : ''}`;
  const words = [
    line,
    `The planets have moved it ${arcWords(movedByPlanetsArcsec ?? 0)} since the epoch; that is reckoned in.`,
    arcSentence(facts, numbered),
    ...(kind === 'comet'
      ? [
          'A comet is also pushed by its own outgassing, which is not modelled here and counts in the bad case.',
        ]
      : []),
    `The bad case comes to ${shareWords(eyepiece, 'eyepiece')} and ${shareWords(finder, 'finder')}.`,
    `This is a rule of thumb (common practice), not an error bar.${
      kind === 'comet'
        ? " Comets' elements are to be refreshed within the month before the evening, those of one just found within the week (common practice)."
        : ''
    }`,
  ].join(' ');
  return { line, words };
}

function inFieldWords({ eyepiece, finder }: Facts): string {
  // Centred on the place given, the field reaches half its width to either side.
  if (eyepiece!.bad <= 0.5) return 'in the eyepiece field even in the bad case';
  if (finder!.bad <= 0.5) {
    return eyepiece!.likely <= 0.5
      ? 'in the finder field, and most likely in the eyepiece field'
      : 'in the finder field but not in the eyepiece field';
  }
  return finder!.likely <= 0.5
    ? 'most likely in the finder field, with luck in the eyepiece field'
    : 'outside the finder field: no chart can be made of these elements';
}

function arcSentence({ observedArcDays, arcFrom }: Facts, numbered: boolean): string {
  const counted = `${String(Math.round(arcCounted({ arcDays: observedArcDays, numbered })))} days of observations`;
  switch (arcFrom) {
    case 'set':
      return `The set rests on ${counted}, as it says itself.`;
    case 'source':
      return `The set rests on ${counted}, by the words of its source.`;
    case 'designation':
      return `By its designation it was found ${counted.replace(' of observations', '')} before the epoch, so the set rests on no more than that.`;
    case null:
      return numbered
        ? 'It is numbered, so it was followed through several returns.'
        : `Nothing says how long it was observed; ${counted} are assumed.`;
  }
}

function ageWords(ageDays: number): string {
  const days = Math.round(Math.abs(ageDays));
  const count = `${String(days)} day${days === 1 ? '' : 's'}`;
  return ageDays < 0 && days > 0 ? `of an epoch ${count} later` : `${count} old`;
}

function offWords(likely: number, bad: number): string {
  return arcWords(likely) === arcWords(bad)
    ? arcWords(bad)
    : `${arcWords(likely)}, in a bad case by ${arcWords(bad)}`;
}

/** An angle as people say it, to two figures. */
function arcWords(arcsec: number): string {
  if (arcsec < 1) return 'less than 1 arcsec';
  if (arcsec < 60) return `${figures(arcsec)} arcsec`;
  if (arcsec < 7200) return `${figures(arcsec / 60)} arcmin`;
  return `${figures(arcsec / 3600)} degrees`;
}

function figures(value: number): string {
  return value < 10 ? String(Number(value.toPrecision(2))) : value.toFixed(0);
}

/** '1.2% of an eyepiece field of 0.75 degrees', '8.8 eyepiece fields of 0.75 degrees'. */
function shareWords({ bad, fieldDeg }: FieldShare, field: 'eyepiece' | 'finder'): string {
  const of = `${String(fieldDeg)} degrees`;
  if (bad >= 1) return `${figures(bad)} ${field} fields of ${of}`;
  const value = bad * 100;
  const percent = value < 0.1 ? 'under 0.1' : value < 10 ? value.toFixed(1) : value.toFixed(0);
  return `${percent}% of ${field === 'eyepiece' ? 'an eyepiece' : 'a finder'} field of ${of}`;
}
