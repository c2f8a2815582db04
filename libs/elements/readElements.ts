import { elementReader } from './elementReader';
import { type ElementSet } from './elementSet';
import { type ElementProblem } from './problem';
import { wantedBodies } from './wanted';

/** The sets of a text in the order of its lines, and its problems. */
export interface ElementReading {
  readonly sets: readonly ElementSet[];
  readonly problems: readonly ElementProblem[];
}

/**
 * Element sets from a text in any of the known formats (the Minor Planet Center's one-line formats for comets and
 * minor planets, CSV with headings, JSON), found out by itself. Bad lines become problems; the good ones still load.
 */
export function readElements(text: string, wanted: Iterable<string> | null = null): ElementReading {
  const reader = elementReader(wanted === null ? null : wantedBodies(wanted));
  reader.push(text);
  reader.finish();
  const { sets, problems } = reader.take();
  return { sets, problems };
}
