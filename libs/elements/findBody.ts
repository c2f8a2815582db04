import { type ElementSet } from './elementSet';
import { parseDesignation } from './parseDesignation';

/** A name reduced to what people agree on: small letters and figures, accents taken off. */
export function nameKey(text: string): string {
  return text
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]/gu, '');
}

/** How well a set answers to a name: 0 not at all, higher is better. */
function fit(set: ElementSet, wanted: WantedName): number {
  if (wanted.canonical !== null && wanted.canonical === set.designation) return 6;
  if (wanted.key === '') return 0;
  if (nameKey(set.designation) === wanted.key || nameKey(set.label) === wanted.key) return 6;
  if (set.packed !== null && set.packed === wanted.text) return 6;
  if (set.name !== '' && nameKey(set.name) === wanted.key) return 5;
  if (wanted.name !== '' && nameKey(set.name) === wanted.name) return 4;
  if (/^\d+$/.test(wanted.text) && /^\d+[A-Z]/.test(set.designation)) {
    return Number.parseInt(set.designation, 10) === Number(wanted.text) ? 3 : 0;
  }
  const designation = parseDesignation(set.label);
  if (wanted.provisional !== null && provisionalKey(designation) === wanted.provisional) return 3;
  if (wanted.key.length < 3 || /^\d+$/.test(wanted.key)) return 0;
  if (nameKey(set.name).startsWith(wanted.key)) return 2;
  return nameKey(set.label).includes(wanted.key) ? 1 : 0;
}

interface WantedName {
  readonly text: string;
  readonly key: string;
  readonly canonical: string | null;
  readonly name: string;
  readonly provisional: string | null;
}

function wantedName(name: string): WantedName {
  const parsed = parseDesignation(name);
  return {
    text: name.trim(),
    key: nameKey(name),
    canonical: parsed.canonical,
    name: parsed.name === null ? '' : nameKey(parsed.name),
    provisional: provisionalKey(parsed),
  };
}

/** Year, half-month and order without the prefix, which people leave out or remember wrongly. */
function provisionalKey(parsed: ReturnType<typeof parseDesignation>): string | null {
  if (parsed.halfMonth === null || parsed.kind === null) return null;
  return [parsed.year, parsed.halfMonth, parsed.order, parsed.fragment].join(' ');
}

/** A test whether a set is of the body that a designation, number or whole name means; parts of names do not count. */
export function bodyTest(name: string): (set: ElementSet) => boolean {
  const wanted = wantedName(name);
  return (set) => fit(set, wanted) >= 3;
}

/**
 * The set of a body by designation, packed designation, number, name or the beginning of its name; case, spaces,
 * brackets and accents do not matter. A bare number means the minor planet before the comet. Of several sets of
 * the best-fitting bodies the one with the latest epoch is given, for it is the newest; null where none fits.
 */
export function findBody(sets: readonly ElementSet[], name: string): ElementSet | null {
  const wanted = wantedName(name);
  let best: ElementSet | null = null;
  let bestFit = 0;
  for (const set of sets) {
    const fits = fit(set, wanted);
    const newer = best === null || (set.epochTtJd ?? -Infinity) > (best.epochTtJd ?? -Infinity);
    const sameBody = best !== null && best.designation === set.designation;
    if (fits > bestFit || (fits === bestFit && fits > 0 && newer && sameBody)) {
      best = set;
      bestFit = fits;
    }
  }
  return best;
}
