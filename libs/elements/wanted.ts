import { type ElementSet } from './elementSet';
import { bodyTest, nameKey } from './findBody';
import { parseDesignation } from './parseDesignation';

/** The bodies that a reader is to pick out. */
export interface Wanted {
  /** Whether a minor-planet line is surely about none of them, told without reading it. */
  passesOver(line: string): boolean;
  has(set: ElementSet): boolean;
}

/**
 * Bodies wanted from a long file, by designation, number, packed designation or name. Lines are told apart by their
 * packed designation; only where a proper name is wanted is the readable column looked at too.
 */
export function wantedBodies(names: Iterable<string>): Wanted {
  const packed = new Set<string>();
  const proper: string[] = [];
  const tests: ((set: ElementSet) => boolean)[] = [];
  for (const name of names) {
    tests.push(bodyTest(name));
    const parsed = parseDesignation(name);
    if (parsed.valid && parsed.packed !== null) packed.add(parsed.packed);
    if (!parsed.valid || parsed.name !== null) {
      const key = nameKey(parsed.valid ? (parsed.name ?? name) : name);
      if (key !== '') proper.push(key);
    }
    packed.add(name.trim());
  }
  return {
    passesOver(line) {
      let end = 7;
      while (end > 0 && line.charCodeAt(end - 1) === 32) end--;
      if (packed.has(line.slice(0, end))) return false;
      if (proper.length === 0) return end > 0;
      if (end === 0) return false;
      // Bodies without a name have nothing but digits, capitals and brackets there.
      const readable = line.slice(166, 194);
      if (!/[^ -`]/.test(readable)) return true;
      const key = nameKey(readable);
      return !proper.some((name) => key.includes(name));
    },
    has: (set) => tests.some((isWanted) => isWanted(set)),
  };
}
