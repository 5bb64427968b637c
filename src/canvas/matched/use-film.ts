import { useCallback, useEffect, useRef, useState } from 'react';
import type { FrameIndex } from '#shared/timing/units.ts';
import { type CanvasPainter, createCanvasPainter } from '#src/video/canvas-painter.ts';
import { VideoError } from '#src/video/errors.ts';
import { openClip } from '#src/video/open-clip.ts';
import type { ClipSource, FrameSource } from '#src/video/types.ts';

/** Two films at once: each gets half of the usual memory. */
const CACHE_BYTES = 96 * 1024 * 1024;

export interface Film {
  /** Takes the canvas that the frames are painted on. */
  readonly attach: (canvas: HTMLCanvasElement | null) => void;
  readonly ready: boolean;
  readonly error: VideoError | null;
  readonly retry: () => void;
  /** Brings a frame as far as to be painted; what it answers paints it, so that two films change together. */
  readonly prepare: (frame: FrameIndex, signal: AbortSignal) => Promise<() => Promise<void>>;
}

/**
 * A prepared copy, frame by frame on a canvas.
 * @param name opened anew when it changes
 * @param sourceOf what is opened; null where there is nothing yet
 */
export function useFilm(name: string, sourceOf: () => ClipSource | null): Film {
  const canvas = useRef<HTMLCanvasElement | null>(null);
  const source = useRef<FrameSource | null>(null);
  const painter = useRef<CanvasPainter | null>(null);
  const [ready, setReady] = useState(false);
  const [error, setError] = useState<VideoError | null>(null);
  const [attempt, setAttempt] = useState(0);
  const latest = useRef(sourceOf);
  useEffect(() => {
    latest.current = sourceOf;
  });

  useEffect(() => {
    const stopper = new AbortController();
    const clip = latest.current();
    const open = async () => {
      if (!clip) throw new VideoError('damaged');
      const opened = await openClip(clip, {
        signal: stopper.signal,
        cacheBytes: CACHE_BYTES,
      });
      if (stopper.signal.aborted) {
        opened.close();
        return;
      }
      source.current = opened;
      setReady(true);
    };
    open().catch((problem: unknown) => {
      if (stopper.signal.aborted) return;
      setError(problem instanceof VideoError ? problem : new VideoError('damaged', '', problem));
    });
    return () => {
      stopper.abort();
      source.current?.close();
      source.current = null;
      setReady(false);
    };
  }, [name, attempt]);

  const attach = useCallback((element: HTMLCanvasElement | null) => {
    if (element === canvas.current) return;
    canvas.current = element;
    painter.current = element && createCanvasPainter(element);
  }, []);
  const prepare = useCallback(async (frame: FrameIndex, signal: AbortSignal) => {
    const picture = await source.current?.frame(frame, { signal });
    return async () => {
      const shown = picture && (await painter.current?.show(picture));
      if (shown && canvas.current) canvas.current.dataset.frame = String(frame);
    };
  }, []);
  const retry = useCallback(() => {
    setError(null);
    setAttempt((n) => n + 1);
  }, []);
  return { attach, ready, error, retry, prepare };
}
