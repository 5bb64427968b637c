import { mkdtempSync, rmSync } from 'node:fs';
import { availableParallelism, tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { build } from 'esbuild';
import type { ClipPlan } from '../clips.ts';
import { PICTURE } from '../model/camera.ts';
import { emptyRoomPicture } from '../paint/room.ts';
import type { Delivery, Order, WorkerStart } from './worker.ts';

export interface Painted {
  readonly frame: number;
  readonly picture: Uint8Array;
  readonly hidden: readonly string[];
}

/** Rows of the empty room in one order: enough pieces that no worker waits long for another. */
const ROOM_ROWS = 96;
/** Finished pictures that may wait for their turn, for each worker. */
const AHEAD = 4;

/** The worker in one file without type stripping: many times faster than loading it as it stands. */
export const buildWorker = async (): Promise<{ file: string; remove: () => void }> => {
  const folder = mkdtempSync(join(tmpdir(), 'demo-clips-'));
  const file = join(folder, 'worker.mjs');
  await build({
    entryPoints: [fileURLToPath(new URL('./worker.ts', import.meta.url))],
    bundle: true,
    platform: 'node',
    format: 'esm',
    outfile: file,
    logLevel: 'error',
  });
  return { file, remove: () => rmSync(folder, { recursive: true, force: true }) };
};

const ask = (worker: Worker, order: Order): Promise<Delivery> =>
  new Promise((resolve, reject) => {
    const settle = (act: () => void): void => {
      worker.off('message', onMessage);
      worker.off('error', onError);
      act();
    };
    const onMessage = (delivery: Delivery): void => settle(() => resolve(delivery));
    const onError = (cause: Error): void => settle(() => reject(cause));
    worker.on('message', onMessage);
    worker.on('error', onError);
    worker.postMessage(order);
  });

/**
 * Paints the pictures at `timesMs` on all processors and hands them over in order. `take` may be
 * slow: painting waits for it.
 */
export const paintFrames = async (
  clip: ClipPlan,
  workerFile: string,
  timesMs: readonly number[],
  take: (painted: Painted) => Promise<void>,
): Promise<void> => {
  const start: WorkerStart = { clip, room: emptyRoomPicture() };
  const workers = Array.from(
    { length: availableParallelism() },
    () => new Worker(workerFile, { workerData: start }),
  );
  try {
    let row = 0;
    await Promise.all(
      workers.map(async (worker) => {
        while (row < PICTURE.height) {
          const from = row;
          row = Math.min(PICTURE.height, row + ROOM_ROWS);
          await ask(worker, { room: [from, row] });
        }
      }),
    );
    await inOrder(workers, timesMs, take);
  } finally {
    await Promise.all(workers.map((worker) => worker.terminate()));
  }
};

const inOrder = async (
  workers: readonly Worker[],
  timesMs: readonly number[],
  take: (painted: Painted) => Promise<void>,
): Promise<void> => {
  const waiting = new Map<number, Painted>();
  let [asked, handed] = [0, 0];
  let handing: Promise<void> = Promise.resolve();
  const handOver = async (): Promise<void> => {
    for (let next = waiting.get(handed); next !== undefined; next = waiting.get(handed)) {
      waiting.delete(handed);
      handed += 1;
      await take(next);
    }
  };
  await Promise.all(
    workers.map(async (worker) => {
      while (asked < timesMs.length) {
        const frame = asked;
        asked += 1;
        const delivery = await ask(worker, { frame, ms: timesMs[frame] ?? 0 });
        if (delivery.painted === 'frame') waiting.set(frame, delivery);
        handing = handing.then(handOver);
        if (waiting.size > AHEAD * workers.length) await handing;
      }
    }),
  );
  await handing;
};
