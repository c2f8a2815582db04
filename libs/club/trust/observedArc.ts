import { type ObservationRecord, parseDesignation } from '#elements';
import { ttJdToUtcMs } from '#sky';

const DAY_MS = 86_400_000;
const DAYS_A_YEAR = 365.25;

/** Days of observations behind a set of elements, and who says so. */
export interface ObservedArc {
  readonly days: number;
  /** For the words: 'the set says so', or how it was inferred. */
  readonly from: 'set' | 'source' | 'designation';
}

/** What may say something of a set's observations. */
export interface ArcSources {
  readonly designation: string;
  /** Where the elements are from, in words. */
  readonly source: string;
  readonly observed: ObservationRecord | null;
  readonly epochTtJd: number | null;
}

/**
 * The observed arc of a set, from the first that tells it: its own record (the minor-planet format has one); its
 * source's words ('from 38 days of observations', 'from observations of 2009 to 2030'); the designation of a
 * body that has no number yet, which tells when it was found: it was followed from then to the epoch at most.
 * Null where none does.
 */
export function observedArc({ designation, source, observed, epochTtJd }: ArcSources): ObservedArc | null {
  const recorded = arcOfRecord(observed?.arc ?? '');
  if (recorded !== null) return { days: recorded, from: 'set' };
  const told = arcOfWords(source);
  if (told !== null) return { days: told, from: 'source' };
  const { number, discoveryFrom } = parseDesignation(designation);
  if (number !== null || discoveryFrom === null || epochTtJd === null) return null;
  const days = (ttJdToUtcMs(epochTtJd) - Date.parse(discoveryFrom)) / DAY_MS;
  return days > 0 ? { days: Math.round(days), from: 'designation' } : null;
}

/** '38 days' or '2009-2030', as the minor-planet format writes it. */
function arcOfRecord(arc: string): number | null {
  const days = /^(\d+) days$/.exec(arc);
  if (days !== null) return Number(days[1]);
  const years = /^(\d{4})-(\d{4})$/.exec(arc);
  return years === null ? null : yearsApart(years[1]!, years[2]!);
}

function arcOfWords(source: string): number | null {
  const days = /(\d+)[ -]days?(?: of observations|['’]? arc)/i.exec(source);
  if (days !== null) return Number(days[1]);
  const years = /observations of (\d{4}) to (\d{4})/i.exec(source);
  return years === null ? null : yearsApart(years[1]!, years[2]!);
}

function yearsApart(first: string, last: string): number {
  return Math.max(1, Number(last) - Number(first)) * DAYS_A_YEAR;
}
