import { VideoError } from './errors.ts';

export interface Transport {
  readonly fetch: typeof fetch;
  readonly wait: (milliseconds: number) => Promise<void>;
}

export const browserTransport: Transport = {
  fetch: (input, init) => fetch(input, init),
  wait: (ms) => new Promise((resolve) => setTimeout(resolve, ms)),
};

/** Waits between tries, ms; three more tries bridge a change from wireless to mobile network. */
const RETRY_WAITS = [300, 1000, 3000];

const refusal = (status: number): VideoError => {
  if (status === 401) return new VideoError('signed-out', `status ${status}`);
  if (status === 403 || status === 404 || status === 410)
    return new VideoError('gone', `status ${status}`);
  return new VideoError('network', `status ${status}`);
};

/** Tries again while the fault is one of the network; any other fault, or an abort, ends it. */
const tryAgain = async <T>(
  once: () => Promise<T>,
  signal: AbortSignal,
  wait: Transport['wait'],
): Promise<T> => {
  for (let attempt = 0; ; attempt += 1) {
    try {
      return await once();
    } catch (error) {
      signal.throwIfAborted();
      if (error instanceof VideoError && error.code !== 'network') throw error;
      const pause = RETRY_WAITS[attempt];
      if (pause === undefined)
        throw error instanceof VideoError ? error : new VideoError('network', 'no answer', error);
      await wait(pause);
      signal.throwIfAborted();
    }
  }
};

export interface RangeAnswer {
  /** Where in the file `bytes` begins: 0 where the server sent the whole file instead. */
  readonly start: number;
  readonly bytes: Uint8Array;
  readonly totalBytes: number;
  /** The server's tag of this version of the file, null where it sends none. */
  readonly version: string | null;
}

export interface ByteRange {
  readonly start: number;
  /** Exclusive. */
  readonly end: number;
  /** Nobody waits for it yet. */
  readonly background: boolean;
}

/**
 * A range of a file; fewer bytes where the file ends before.
 * Rejects with `VideoError` (network, signed-out, gone) or the signal's reason.
 */
export const fetchRange = (
  url: string,
  range: ByteRange,
  signal: AbortSignal,
  transport: Transport,
): Promise<RangeAnswer> =>
  tryAgain(
    async () => {
      const response = await transport.fetch(url, {
        headers: { Range: `bytes=${range.start}-${range.end - 1}` },
        priority: range.background ? 'low' : 'high',
        signal,
      });
      if (response.status !== 206 && response.status !== 200) throw refusal(response.status);
      const bytes = new Uint8Array(await response.arrayBuffer());
      const version = response.headers.get('etag');
      if (response.status === 200) return { start: 0, bytes, totalBytes: bytes.length, version };
      const total = /\/(\d+)$/.exec(response.headers.get('content-range') ?? '')?.[1];
      if (total === undefined) throw new VideoError('network', 'a part without its total size');
      return { start: range.start, bytes, totalBytes: Number(total), version };
    },
    signal,
    transport.wait,
  );

/** A whole file. Rejects as `fetchRange` does. */
export const fetchBlob = (url: string, signal: AbortSignal, transport: Transport): Promise<Blob> =>
  tryAgain(
    async () => {
      const response = await transport.fetch(url, { signal });
      if (!response.ok) throw refusal(response.status);
      return response.blob();
    },
    signal,
    transport.wait,
  );
