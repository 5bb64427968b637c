import { Worker } from 'node:worker_threads';
import type { ReadingInput, ReadingResult } from '#shared/reading/types.ts';

/** What the thread is asked and what it answers. */
export interface Ask {
  readonly id: number;
  readonly input: ReadingInput;
}
export type Answer =
  | { readonly id: number; readonly result: ReadingResult }
  | { readonly id: number; readonly error: string };

interface Pending {
  readonly resolve: (result: ReadingResult) => void;
  readonly reject: (error: Error) => void;
}

/** Beside the bundle once it is built; the source itself while developing and testing, through its loader. */
const startThread = (): Worker => {
  if (!import.meta.url.endsWith('.ts'))
    return new Worker(new URL('./derive-thread.js', import.meta.url));
  const source = JSON.stringify(new URL('./derive-thread.ts', import.meta.url).href);
  return new Worker(
    `import('tsx/esm/api').then(({ register }) => { register(); return import(${source}); });`,
    { eval: true },
  );
};

const pending = new Map<number, Pending>();
let asked = 0;
let thread: Worker | null = null;

const giveUp = (error: Error): void => {
  thread = null;
  for (const { reject } of pending.values()) reject(error);
  pending.clear();
};

const settle = (answer: Answer): void => {
  const waiting = pending.get(answer.id);
  pending.delete(answer.id);
  if ('result' in answer) waiting?.resolve(answer.result);
  else waiting?.reject(new Error(answer.error));
  // a thread with nothing to do does not keep the process alive
  if (pending.size === 0) thread?.unref();
};

/** Started when first needed; a thread that breaks fails what it was asked, and the next ask starts another. */
const openThread = (): Worker => {
  const opened = startThread();
  opened.on('message', settle);
  opened.on('error', giveUp);
  opened.on('exit', () => {
    if (thread === opened) giveUp(new Error('The thread that derives readings has ended.'));
  });
  return opened;
};

/** Derives a reading on a thread of its own: its Monte Carlo takes a tenth of a second that no request should wait. */
export const deriveApart = (input: ReadingInput): Promise<ReadingResult> =>
  new Promise((resolve, reject) => {
    thread ??= openThread();
    thread.ref();
    asked += 1;
    pending.set(asked, { resolve, reject });
    thread.postMessage({ id: asked, input } satisfies Ask);
  });
