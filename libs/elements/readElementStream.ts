import { isAscii } from 'node:buffer';
import { type ElementBatch, elementReader } from './elementReader';
import { type ElementSet } from './elementSet';
import { type ElementReading } from './readElements';
import { type ElementProblem } from './problem';
import { wantedBodies } from './wanted';

export interface ElementProgress {
  readonly lines: number;
  /** Bytes (of text given as strings: characters) taken in. */
  readonly bytes: number;
  readonly sets: number;
  readonly problems: number;
}

export interface ElementStreamOptions {
  /** Only these bodies, by designation, packed designation, number or name; all where absent. */
  readonly wanted?: Iterable<string> | null;
  /** Called after each 32 KiB of the file, and at the end. */
  readonly onProgress?: (progress: ElementProgress) => void;
  /** Stops the reading; the stream then ends by throwing the signal's reason. */
  readonly signal?: AbortSignal;
}

/**
 * Characters worked on at a time: with more, strings and sets outlive the collector's young generation, which costs
 * half the speed.
 */
const PIECE = 32_768;

/**
 * Element sets from a stream of text or UTF-8 bytes, in batches as the pieces of the file come in, without holding
 * the file: a batch is what some 32 KiB of it gave. The formats and problems are those of `readElements`.
 */
export async function* readElementStream(
  chunks: AsyncIterable<string | Uint8Array> | Iterable<string | Uint8Array>,
  options: ElementStreamOptions = {},
): AsyncGenerator<ElementBatch, void, undefined> {
  const { wanted, onProgress, signal } = options;
  const reader = elementReader(wanted === null || wanted === undefined ? null : wantedBodies(wanted));
  const decode = utf8Decoder();
  const tally = { lines: 0, bytes: 0, sets: 0, problems: 0 };
  const counted = (batch: ElementBatch): ElementBatch => {
    tally.lines = batch.lines;
    tally.sets += batch.sets.length;
    tally.problems += batch.problems.length;
    onProgress?.({ ...tally });
    return batch;
  };
  for await (const chunk of chunks) {
    for (let from = 0; from < chunk.length; from += PIECE) {
      signal?.throwIfAborted();
      const to = Math.min(from + PIECE, chunk.length);
      reader.push(typeof chunk === 'string' ? chunk.slice(from, to) : decode(chunk.subarray(from, to)));
      tally.bytes += to - from;
      const batch = counted(reader.take());
      if (batch.sets.length > 0 || batch.problems.length > 0) yield batch;
    }
  }
  reader.push(decode(null));
  reader.finish();
  yield counted(reader.take());
}

/**
 * Bytes to text, piece by piece; null ends the stream. Published files are plain ASCII, for which the general decoder
 * is several times too slow; it takes over with the first other byte.
 */
function utf8Decoder(): (bytes: Uint8Array | null) => string {
  const general = new TextDecoder('utf-8');
  let plain = true;
  return (bytes) => {
    if (bytes === null) return general.decode();
    plain &&= isAscii(bytes);
    if (!plain) return general.decode(bytes, { stream: true });
    return Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength).toString('latin1');
  };
}

/** All that `readElementStream` gives, gathered; `lines` counts those gone through. */
export async function collectElements(
  chunks: AsyncIterable<string | Uint8Array> | Iterable<string | Uint8Array>,
  options: ElementStreamOptions = {},
): Promise<ElementReading & { readonly lines: number }> {
  const sets: ElementSet[] = [];
  const problems: ElementProblem[] = [];
  let lines = 0;
  for await (const batch of readElementStream(chunks, options)) {
    for (const set of batch.sets) sets.push(set);
    for (const problem of batch.problems) problems.push(problem);
    lines = batch.lines;
  }
  return { sets, problems, lines };
}
