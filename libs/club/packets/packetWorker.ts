import { type MessagePort } from 'node:worker_threads';
import { drawPacketPdf, drawPacketSvg, type PacketTask, type PreviewSheet } from './packetDrawing';

export interface WorkerTask extends PacketTask {
  /** Hears [done, count] after each sheet. */
  readonly progress: MessagePort;
}

/** Runs in a worker thread: draws a packet and tells of its progress. */
export async function draw({
  progress,
  ...task
}: WorkerTask): Promise<{ readonly body: Uint8Array; readonly sheets: number }> {
  try {
    return await drawPacketPdf(task, (done, count) => {
      progress.postMessage([done, count]);
    });
  } finally {
    progress.close();
  }
}

/** Runs in a worker thread: draws a packet for the screen and tells of its progress. */
export function preview({ progress, ...task }: WorkerTask): PreviewSheet[] {
  try {
    return drawPacketSvg(task, (done, count) => {
      progress.postMessage([done, count]);
    });
  } finally {
    progress.close();
  }
}
