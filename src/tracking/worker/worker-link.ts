import { TrackingError } from '../errors.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { FollowOptions, FollowResult, Touch } from '../types.ts';
import type { FromWorker, ToWorker } from './messages.ts';

/** What is waited for, by the number of its request. */
interface Wait {
  readonly followed: (result: FollowResult) => void;
  readonly looked: (touch: Touch) => void;
  readonly failed: (error: unknown) => void;
  readonly options: FollowOptions;
}

const nothing = (): void => undefined;

/** Requests and answers of one worker, paired. */
export class WorkerLink {
  readonly #worker: Worker;
  readonly #waits = new Map<number, Wait>();
  readonly #onNeed: (frame: FrameIndex) => void;
  #opening: { resolve: () => void; reject: (error: unknown) => void } | null = null;
  #count = 0;
  #ended: TrackingError | null = null;

  constructor(worker: Worker, onNeed: (frame: FrameIndex) => void) {
    this.#worker = worker;
    this.#onNeed = onNeed;
    worker.onmessage = ({ data }: MessageEvent<FromWorker>) => this.#hear(data);
    worker.onerror = (event) => this.end(new TrackingError('crashed', event.message));
    worker.onmessageerror = () => this.end(new TrackingError('crashed', 'a message was lost'));
  }

  post(message: ToWorker, transfer: Transferable[] = []): void {
    if (!this.#ended) this.#worker.postMessage(message, transfer);
  }

  open(message: Extract<ToWorker, { do: 'open' }>): Promise<void> {
    return new Promise((resolve, reject) => {
      this.#opening = { resolve, reject };
      this.post(message);
    });
  }

  follow(message: (n: number) => ToWorker, options: FollowOptions): Promise<FollowResult> {
    return new Promise((followed, failed) =>
      this.#ask(message, { followed, looked: nothing, failed, options }),
    );
  }

  look(message: (n: number) => ToWorker, signal: AbortSignal | undefined): Promise<Touch> {
    return new Promise((looked, failed) =>
      this.#ask(message, { looked, followed: nothing, failed, options: signal ? { signal } : {} }),
    );
  }

  /** Ends the worker; whatever is waited for fails with this. */
  end(error: TrackingError): void {
    if (this.#ended) return;
    this.#ended = error;
    this.#worker.terminate();
    this.#opening?.reject(error);
    for (const { failed } of this.#waits.values()) failed(error);
    this.#waits.clear();
  }

  #ask(message: (n: number) => ToWorker, wait: Wait): void {
    const { signal } = wait.options;
    if (this.#ended) return wait.failed(this.#ended);
    if (signal?.aborted) return wait.failed(signal.reason);
    const n = (this.#count += 1);
    const abort = (): void => {
      if (!this.#waits.delete(n)) return;
      this.post({ do: 'cancel', n });
      wait.failed(signal?.reason);
    };
    signal?.addEventListener('abort', abort, { once: true });
    const settled = <T>(settle: (value: T) => void) => {
      return (value: T): void => {
        signal?.removeEventListener('abort', abort);
        settle(value);
      };
    };
    this.#waits.set(n, {
      followed: settled(wait.followed),
      looked: settled(wait.looked),
      failed: settled(wait.failed),
      options: wait.options,
    });
    this.post(message(n));
  }

  #hear(message: FromWorker): void {
    if (message.say === 'need') return this.#onNeed(message.frame);
    if (message.say === 'opened') return this.#opening?.resolve();
    if (message.say === 'failed' && message.n === null) {
      const error = new TrackingError(message.code, message.detail);
      return this.#opening?.reject(error);
    }
    if (message.n === null) return;
    const wait = this.#waits.get(message.n);
    if (!wait) return;
    if (message.say === 'progress') return wait.options.onProgress?.(message.progress);
    if (message.say === 'places') return wait.options.onPlaces?.(message.id, message.places);
    this.#waits.delete(message.n);
    if (message.say === 'followed') wait.followed(message.result);
    else if (message.say === 'looked') wait.looked(message.touch);
    else wait.failed(new TrackingError(message.code, message.detail));
  }
}
