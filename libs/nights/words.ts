import { DateTime } from 'luxon';
import { compassPoint, toDeg, toRad } from '#sky';
import { type MeasuredTarget } from './measure';
import { type Programme, type ProgrammeItem } from './programme';
import { type EveningShares } from './score';

/** The nearest of the eight compass points to an azimuth in degrees, as people say it: 'south-west'. */
export function sideWords(azimuthDeg: number): string {
  return compassPoint(toRad(azimuthDeg), 8).word;
}

/** A local time to the nearest minute, 'HH:MM'. */
export function clockWords(utcMs: number, zone: string): string {
  return DateTime.fromMillis(Math.round(utcMs / 60_000) * 60_000, { zone }).toFormat('HH:mm');
}

/** Why a target is shown when it is, or what keeps it from being shown. */
export function showingWords(item: ProgrammeItem, measured: MeasuredTarget, zone: string): string {
  const minutes = Math.round(measured.totalMs / 60_000);
  if (measured.shown) {
    const stretches = [];
    for (let i = 0; i < measured.edges.length; i += 2) {
      stretches.push(
        `${clockWords(measured.edges[i]!, zone)} to ${clockWords(measured.edges[i + 1]!, zone)}`,
      );
    }
    const { best } = measured;
    const height = Math.round(toDeg(Math.asin(best.sinAltitude)));
    return `From ${stretches.join(' and ')}; best at ${clockWords(best.utcMs, zone)}, ${height} degrees high in the ${compassPoint(best.azimuthRad, 16).letters}.`;
  }
  const reason = mainHindrance(item, measured);
  return measured.totalMs > 0
    ? `Only ${minutes} of the ${item.leastMinutes} minutes it needs; else ${reason}.`
    : `Not in the public hours: ${reason}.`;
}

function mainHindrance(item: ProgrammeItem, { hindrances }: MeasuredTarget): string {
  const words = {
    low: `it stands below ${round1(toDeg(item.leastAltitudeRad))} degrees`,
    skyline: "it is behind the site's skyline",
    sun: 'it is within 15 degrees of the Sun while that is up',
    faint: `the sky is too bright for it in the ${item.instrument.name}`,
  };
  const [main] = (Object.keys(words) as (keyof typeof words)[]).sort((a, b) => hindrances[b] - hindrances[a]);
  return words[main!];
}

/** Each part of the score in plain words. */
export function partWords(
  programme: Programme,
  shares: EveningShares,
  notShown: readonly string[],
  minutes: number,
): { readonly programme: string; readonly darkness: string; readonly height: string; readonly moon: string } {
  const all = programme.items.length;
  const shown = all - notShown.length;
  const of = `${Math.round(minutes)} minutes`;
  const dark = Math.round(shares.fullyDarkShare * minutes);
  return {
    programme:
      notShown.length === 0
        ? `All ${all} targets can be shown.`
        : `${shown} of ${all} targets can be shown; not ${listWords(notShown)}.`,
    darkness:
      shares.darkness >= 0.995
        ? 'Fully dark throughout the public hours.'
        : dark > 0
          ? `Fully dark for ${dark} of ${of}, twilight for the rest.`
          : shares.darkness > 0
            ? 'Twilight all through the public hours.'
            : 'Bright twilight or daylight all through the public hours.',
    height:
      shown > 0
        ? `What is shown stands ${Math.round(toDeg(shares.meanHighestAltitudeRad))} degrees high on average at its highest.`
        : 'Nothing is shown.',
    moon: moonWords(programme, shares, minutes),
  };
}

function moonWords(programme: Programme, shares: EveningShares, minutes: number): string {
  const lit = `${Math.round(shares.moonIlluminatedFraction * 100)}% lit`;
  const of = `${Math.round(minutes)} minutes`;
  if (programme.moon === 'indifferent') return 'The programme does not mind the Moon.';
  if (programme.moon === 'welcome') {
    return shares.moonHighShare > 0
      ? `The Moon, ${lit}, stands above 10 degrees for ${Math.round(shares.moonHighShare * minutes)} of ${of}.`
      : `The Moon, ${lit}, does not reach 10 degrees in the public hours, and the programme wishes to show it.`;
  }
  if (shares.moonUpShare === 0) return 'No Moon in the sky during the public hours.';
  return `The Moon, ${lit}, is up for ${Math.round(shares.moonUpShare * minutes)} of ${of}, and the programme wishes it away.`;
}

/** "a", "a and b", "a, b and c". */
export function listWords(names: readonly string[]): string {
  return names.length < 2
    ? names.join('')
    : `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
}

function round1(x: number): number {
  return Math.round(x * 10) / 10;
}
