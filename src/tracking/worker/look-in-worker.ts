import { abortReason } from '#src/video/errors.ts';
import { TrackingError } from '../errors.ts';
import type { TakeLook } from '../take/look-at-take.ts';
import type { TakeAsked, TakeTold } from './take.worker.ts';

/**
 * Looks at a take away from the page, which goes on meanwhile.
 * Rejects with a `TrackingError` where it cannot be read, or with the signal's reason.
 */
export const lookInWorker = (asked: TakeAsked, signal: AbortSignal): Promise<TakeLook> =>
  new Promise((resolve, reject) => {
    if (signal.aborted) return reject(abortReason(signal));
    const worker = new Worker(new URL('./take.worker.ts', import.meta.url), { type: 'module' });
    const end = (): void => {
      worker.terminate();
      signal.removeEventListener('abort', stop);
    };
    const fail = (error: Error): void => {
      end();
      reject(error);
    };
    const stop = (): void => fail(abortReason(signal));
    signal.addEventListener('abort', stop);
    worker.onmessage = ({ data }: MessageEvent<TakeTold>) => {
      if (data.say === 'failed') return fail(new TrackingError('unsupported', data.detail));
      end();
      resolve(data.look);
    };
    worker.onerror = (event) => fail(new TrackingError('crashed', event.message));
    worker.postMessage(asked);
  });
