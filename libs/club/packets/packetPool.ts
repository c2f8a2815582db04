import { join } from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import Piscina from 'piscina';
import { projectRoot } from '../projectRoot';
import { type PacketTask, type PreviewSheet } from './packetDrawing';
import { type WorkerTask } from './packetWorker';

let pool: Piscina | null = null;

export interface PacketWatch {
  /** Called as sheets are drawn, of all there will be. */
  readonly onProgress?: (done: number, count: number) => void;
  /** Aborting it rejects with an AbortError and frees the worker. */
  readonly signal?: AbortSignal;
}

/** Draws a packet as PDF in a worker thread, off the thread that answers requests. */
export async function drawInWorker(
  task: PacketTask,
  watch: PacketWatch = {},
): Promise<{ readonly body: Buffer; readonly sheets: number }> {
  const { body, sheets } = await inWorker<{ body: Uint8Array; sheets: number }>('draw', task, watch);
  return { body: Buffer.from(body.buffer, body.byteOffset, body.byteLength), sheets };
}

/** Draws a packet for the screen in a worker thread. */
export function previewInWorker(task: PacketTask, watch: PacketWatch = {}): Promise<PreviewSheet[]> {
  return inWorker('preview', task, watch);
}

/**
 * One packet at a time, since each keeps a core busy. Workers run compiled code, so a build must stand in dist/.
 */
async function inWorker<Result>(
  name: 'draw' | 'preview',
  task: PacketTask,
  { onProgress, signal }: PacketWatch,
): Promise<Result> {
  pool ??= new Piscina({
    filename: join(projectRoot, 'dist', 'libs', 'club', 'packets', 'packetWorker.js'),
    maxThreads: 1,
    minThreads: 0,
    // Keeps the star file in memory while sheet after sheet is tried out, but not all day.
    idleTimeout: 60_000,
    // Several times what the largest packet holds; bounded, V8 clears up before it takes more.
    resourceLimits: { maxOldGenerationSizeMb: 256, maxYoungGenerationSizeMb: 32 },
  });
  const { port1, port2 } = new MessageChannel();
  if (onProgress !== undefined) {
    port1.on('message', ([done, count]: [number, number]) => {
      onProgress(done, count);
    });
  }
  try {
    const worker: WorkerTask = { ...task, progress: port2 };
    return (await pool.run(worker, {
      name,
      transferList: [port2],
      ...(signal && { signal }),
    })) as Result;
  } finally {
    port1.close();
  }
}

/** Stops the worker, if one runs; the next packet starts it anew. */
export async function closePacketPool(): Promise<void> {
  const running = pool;
  pool = null;
  await running?.destroy();
}
