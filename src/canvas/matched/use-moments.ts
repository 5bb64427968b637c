import { useCallback, useEffect, useRef, useState } from 'react';
import { type FrameIndex, frameIndex, type Milliseconds } from '#shared/timing/units.ts';
import { createScrubScheduler, type ScrubScheduler } from '#src/video/scrub-scheduler.ts';
import { playSlowly } from '#src/video/slow-play.ts';
import type { FramePair } from './types.ts';
import type { Film } from './use-film.ts';

type Show = (moment: FrameIndex, signal: AbortSignal) => Promise<void>;

/** A quarter of life's own speed. */
const RATE = 0.25;

/** The moment on show in both films, and playing through all of them. */
export function useMoments(
  moments: readonly FramePair[],
  schedule: readonly Milliseconds[],
  films: readonly [Film, Film],
) {
  const [at, setAt] = useState(0);
  const [playing, setPlaying] = useState(false);
  const [failed, setFailed] = useState(false);
  const ready = films[0].ready && films[1].ready;
  const scrub = useRef<ScrubScheduler<FrameIndex> | null>(null);

  /** Both pictures are there before either is painted, so that they change together. */
  const show = useRef<Show>(() => Promise.resolve());
  useEffect(() => {
    show.current = async (moment, signal) => {
      const now = moments[moment];
      if (!now) return;
      const paint = await Promise.all([
        films[0].prepare(now.first.frame, signal),
        films[1].prepare(now.second.frame, signal),
      ]);
      await Promise.all(paint.map((each) => each()));
    };
  });

  useEffect(() => {
    if (!ready) return;
    const scheduler = createScrubScheduler<FrameIndex>(
      (moment, signal) => show.current(moment, signal),
      () => setFailed(true),
    );
    scrub.current = scheduler;
    return () => {
      scheduler.stop();
      scrub.current = null;
    };
  }, [ready]);

  useEffect(() => {
    if (ready && !playing) scrub.current?.want(frameIndex(at));
  }, [ready, playing, at, moments]);

  const last = moments.length - 1;
  const from = useRef(0);
  useEffect(() => {
    if (!playing || !ready || last < 1) return;
    return playSlowly(
      schedule,
      {
        span: { from: frameIndex(0), to: frameIndex(last) },
        from: frameIndex(from.current),
        rate: RATE,
        loop: true,
      },
      {
        show: async (moment, signal) => {
          await show.current(moment, signal);
          setAt(moment);
        },
        failed: () => {
          setPlaying(false);
          setFailed(true);
        },
      },
    );
  }, [playing, ready, last, schedule]);

  const goTo = useCallback(
    (moment: number) => {
      setPlaying(false);
      setFailed(false);
      setAt(Math.max(0, Math.min(last, moment)));
    },
    [last],
  );
  const toggle = () => {
    // played to its end, or not begun: from where it stands
    from.current = at >= last ? 0 : at;
    setFailed(false);
    setPlaying((is) => !is);
  };
  return { at, playing, goTo, toggle, failed };
}
