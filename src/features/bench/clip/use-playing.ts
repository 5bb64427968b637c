import { useEffect, useRef } from 'react';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import { playSlowly } from '#src/video/slow-play.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import type { Pictures } from './use-pictures.ts';

/** A quarter of life's own speed. */
const RATE = 0.25;

/** Plays the rep, or the clip where there is none, slowly and once, from where it stands. */
export function usePlaying(pictures: Pictures): void {
  const { store, times } = useBenchTools();
  const { current } = useBenchModel();
  const playing = useBench((state) => state.playing);
  const ready = pictures.source !== null;
  const first = current?.rep.startFrame ?? 0;
  const last = current?.rep.endFrame ?? times.length - 1;
  const show = useRef(pictures.show);
  useEffect(() => {
    show.current = pictures.show;
  });
  useEffect(() => {
    if (!playing || !ready) return;
    const now = store.getState().frame;
    const span = { from: frameIndex(first), to: frameIndex(last) };
    const from: FrameIndex = now >= first && now < last ? now : span.from;
    const stop = playSlowly(
      times,
      { span, from, rate: RATE, loop: false },
      {
        show: async (index, signal) => {
          await show.current(index, signal);
          goTo(store, index);
        },
        ended: () => store.setState({ playing: false }),
        failed: () => store.setState({ playing: false }),
      },
    );
    return stop;
  }, [playing, ready, first, last, store, times]);
}
