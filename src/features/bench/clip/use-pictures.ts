import { useEffect, useRef, useState } from 'react';
import type { ClipWithFrames } from '#shared/contracts/clips.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { type CanvasPainter, createCanvasPainter } from '#src/video/canvas-painter.ts';
import { VideoError } from '#src/video/errors.ts';
import { openClip } from '#src/video/open-clip.ts';
import { createScrubScheduler } from '#src/video/scrub-scheduler.ts';
import type { FrameSource } from '#src/video/types.ts';
import type { BenchTools } from '../bench-context.ts';
import { clipSourceOf } from '#src/api/clip-source.ts';

export interface Pictures {
  /** Null until the first picture can come. */
  readonly source: FrameSource | null;
  /** The frame whose pixels are on the canvas. */
  readonly shown: FrameIndex | null;
  readonly loaded: number;
  readonly error: VideoError | null;
  readonly retry: () => void;
  /** Brings a frame onto the canvas; settles once its pixels are there. */
  readonly show: (frame: FrameIndex, signal: AbortSignal) => Promise<void>;
}

/** Opens the prepared copy and keeps the frame of the store on the canvas of the board. */
export function usePictures(clip: ClipWithFrames, tools: BenchTools): Pictures {
  const { board, store, times, copySize } = tools;
  const [source, setSource] = useState<FrameSource | null>(null);
  const [shown, setShown] = useState<FrameIndex | null>(null);
  const [loaded, setLoaded] = useState(0);
  const [error, setError] = useState<VideoError | null>(null);
  const [attempt, setAttempt] = useState(0);
  const painter = useRef<{ canvas: HTMLCanvasElement; painter: CanvasPainter } | null>(null);
  const sourceRef = useRef<FrameSource | null>(null);
  const latestClip = useRef(clip);

  const show = async (frame: FrameIndex, signal: AbortSignal) => {
    const canvas = board.copy();
    const from = sourceRef.current;
    if (!from || !canvas) return;
    const picture = await from.frame(frame, { signal });
    if (painter.current?.canvas !== canvas)
      painter.current = { canvas, painter: createCanvasPainter(canvas) };
    if (!(await painter.current.painter.show(picture))) return;
    canvas.dataset.frame = String(frame);
    setShown(frame);
    board.painted();
  };
  const showRef = useRef(show);
  useEffect(() => {
    showRef.current = show;
    latestClip.current = clip;
  });

  useEffect(() => {
    const stopper = new AbortController();
    const failed = (problem: unknown) => {
      if (stopper.signal.aborted) return;
      setError(problem instanceof VideoError ? problem : new VideoError('damaged', '', problem));
    };
    let opened: FrameSource | null = null;
    let unsubscribe = () => undefined as void;
    const scrub = createScrubScheduler<FrameIndex>(
      (frame, signal) => showRef.current(frame, signal),
      failed,
    );
    const begin = async () => {
      const { signal } = stopper;
      opened = await openClip(clipSourceOf(latestClip.current, copySize, times), { signal });
      if (signal.aborted) return opened.close();
      sourceRef.current = opened;
      setSource(opened);
      const stopProgress = opened.onProgress(({ share }) => setLoaded(share));
      const stopStore = store.subscribe((state, before) => {
        // while it plays, the player itself brings the frames
        if (state.frame !== before.frame && !state.playing) scrub.want(state.frame);
        if (!state.playing && before.playing) scrub.want(state.frame);
      });
      // a canvas that comes anew (another layout) wants its picture
      let canvas = board.copy();
      const stopBoard = board.subscribe(() => {
        if (board.copy() === canvas) return;
        canvas = board.copy();
        if (canvas) scrub.want(store.getState().frame);
      });
      unsubscribe = () => {
        stopProgress();
        stopStore();
        stopBoard();
      };
      scrub.want(store.getState().frame);
    };
    begin().catch(failed);
    return () => {
      stopper.abort();
      unsubscribe();
      scrub.stop();
      sourceRef.current = null;
      setSource(null);
      opened?.close();
    };
  }, [board, store, times, copySize, attempt]);

  const retry = () => {
    setError(null);
    setAttempt((n) => n + 1);
  };
  return { source, shown, loaded, error, retry, show };
}
