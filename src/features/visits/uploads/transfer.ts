import type { DetailedError, Upload } from 'tus-js-client';
import { ApiProblem, problemFrom } from '#src/api/problem.ts';

export type TransferListener = {
  onProgress: (sentBytes: number) => void;
  onDone: () => void;
  /** It stopped; `offline` and `shutting-down` are worth going on later. */
  onFailed: (problem: ApiProblem) => void;
};
/** Sends what the server does not have yet of `file`. Returns how to stop. */
export type StartTransfer = (
  file: File,
  uploadUrl: string,
  listener: TransferListener,
) => () => void;

/** Pieces of one request each: a proxy's limit on a body, or a lost last byte, costs at most one piece. */
const PIECE_BYTES = 64 * 1024 * 1024;
/** A connection that says nothing for so long is gone, even where the browser does not notice. */
const SILENT_MS = 45_000;

/** By tus 1.0.0 with the session's cookie: asks how much is there, then sends the rest. */
export const startTransfer: StartTransfer = (file, uploadUrl, listener) => {
  let upload: Upload | null = null;
  let stopped = false;
  let watchdog: ReturnType<typeof setTimeout> | undefined;

  const stop = () => {
    stopped = true;
    clearTimeout(watchdog);
    void upload?.abort();
  };
  const fail = (problem: ApiProblem) => {
    if (stopped) return;
    stop();
    listener.onFailed(problem);
  };
  const alive = () => {
    clearTimeout(watchdog);
    watchdog = setTimeout(() => fail(new ApiProblem('offline')), SILENT_MS);
  };

  const start = async () => {
    const tus = await import('tus-js-client');
    if (stopped) return;
    upload = new tus.Upload(file, {
      uploadUrl,
      chunkSize: PIECE_BYTES,
      // going on after a break is the uploader's: it knows of pauses and of the browser's network events
      retryDelays: null,
      storeFingerprintForResuming: false,
      onProgress: (sent) => {
        if (stopped) return;
        alive();
        listener.onProgress(sent);
      },
      onSuccess: () => {
        if (stopped) return;
        stopped = true;
        clearTimeout(watchdog);
        listener.onDone();
      },
      onError: (error) => fail(problemOfTransfer(error)),
    });
    alive();
    upload.start();
  };
  // the code itself could not be fetched: no connection
  start().catch((cause: unknown) => fail(new ApiProblem('offline', { cause })));
  return stop;
};

function problemOfTransfer(error: Error | DetailedError): ApiProblem {
  const response = 'originalResponse' in error ? error.originalResponse : null;
  if (!response) return new ApiProblem('offline', { cause: error });
  const requestId = response.getHeader('x-request-id');
  return problemFrom(response.getStatus(), parsed(response.getBody()), requestId);
}

function parsed(body: string): unknown {
  try {
    return JSON.parse(body);
  } catch {
    return null;
  }
}
