import { createHash } from 'node:crypto';

/** One set of orbital elements that a packet was computed from. */
export interface ImprintedElements {
  readonly target: string;
  readonly setId: string;
  /** From 1 in the order in which the club received them. */
  readonly number: number;
  /** ISO, TT; null where the set does not say. */
  readonly epoch: string | null;
  readonly source: string;
}

/** The inputs a packet was computed from. When one changes, sheets printed before are stale. */
export interface Imprint {
  readonly programVersion: string;
  readonly catalogueVersion: string;
  /** Public hours of the event, ISO with offset. */
  readonly hours: { readonly startsAt: string; readonly endsAt: string };
  /** How the run sheet was asked for: local times 'HH:MM'. */
  readonly running: {
    readonly leastLookMinutes: number;
    readonly breaks: readonly { readonly from: string; readonly to: string }[];
  };
  /** Fingerprints of all that is kept of them. */
  readonly site: string;
  readonly programme: string;
  /** Of what the sheets say beside figures: titles, directions, rules and glosses. */
  readonly words: string;
  readonly elementSets: readonly ImprintedElements[];
}

/** Without the letters and digits that are mistaken for one another by hand or by ear (I, L, O, U). */
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const REVISION_SIGNS = 6;

/** A short code of an imprint, six signs of SHA-256: the same inputs have the same, on paper and on screen. */
export function revisionOf(imprint: Imprint): string {
  const hash = createHash('sha256').update(canonical(imprint)).digest();
  let bits = 0;
  let held = 0;
  let code = '';
  for (const byte of hash) {
    held = (held << 8) | byte;
    bits += 8;
    while (bits >= 5 && code.length < REVISION_SIGNS) {
      bits -= 5;
      code += ALPHABET[(held >> bits) & 31]!;
    }
    held &= (1 << bits) - 1;
    if (code.length === REVISION_SIGNS) break;
  }
  return code;
}

/** A fingerprint of any plain value: 16 hexadecimal digits of SHA-256 over its canonical JSON. */
export function fingerprintOf(value: unknown): string {
  return createHash('sha256').update(canonical(value)).digest('hex').slice(0, 16);
}

/** In words, what differs between the inputs of a printed packet and those of now; empty where nothing does. */
export function changedInputs(printed: Imprint, now: Imprint): string[] {
  const changes: string[] = [];
  for (const set of now.elementSets) {
    const before = printed.elementSets.find(({ target }) => target === set.target);
    if (before?.setId === set.setId) continue;
    changes.push(
      before === undefined
        ? `${set.target} is new on the programme`
        : `${set.target} has new elements (set ${String(set.number)}, printed from set ${String(before.number)})`,
    );
  }
  const { hours } = printed;
  if (hours.startsAt !== now.hours.startsAt || hours.endsAt !== now.hours.endsAt) {
    changes.push('the public hours have changed');
  }
  if (fingerprintOf(printed.running) !== fingerprintOf(now.running)) {
    changes.push('the breaks or the shortest look have changed');
  }
  if (printed.programme !== now.programme) changes.push('the programme has changed');
  if (printed.site !== now.site) changes.push('the site has changed');
  if (printed.words !== now.words) changes.push('words on the sheets have changed');
  if (printed.catalogueVersion !== now.catalogueVersion) changes.push('the star catalogue has changed');
  if (printed.programVersion !== now.programVersion) changes.push('the program has changed');
  return changes;
}

/** JSON with the keys of every object in order, so that equal values read the same. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, held: unknown) =>
    typeof held === 'object' && held !== null && !Array.isArray(held)
      ? Object.fromEntries(Object.entries(held).sort(([a], [b]) => (a < b ? -1 : 1)))
      : held,
  );
}
