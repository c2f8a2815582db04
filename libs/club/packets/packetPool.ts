import { join } from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import Piscina from 'piscina';
import { projectRoot } from '../projectRoot';
import { type PacketTask } from './packetDrawing';
import { type WorkerTask } from './packetWorker';

let pool: Piscina | null = null;

export interface PacketWatch {
  /** Called as sheets are drawn, of all there will be. */
  readonly onProgress?: (done: number, count: number) => void;
  /** Aborting it rejects with an AbortError and frees the worker. */
  readonly signal?: AbortSignal;
}

/**
 * Draws a packet in a worker thread, off the thread that answers requests: one packet at a time, since each
 * keeps a core busy. Workers run compiled code, so a build must stand in dist/.
 */
export async function drawInWorker(
  task: PacketTask,
  { onProgress, signal }: PacketWatch = {},
): Promise<{ readonly body: Buffer; readonly sheets: number }> {
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
    const { body, sheets } = (await pool.run(worker, {
      name: 'draw',
      transferList: [port2],
      ...(signal && { signal }),
    })) as { body: Uint8Array; sheets: number };
    return { body: Buffer.from(body.buffer, body.byteOffset, body.byteLength), sheets };
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
