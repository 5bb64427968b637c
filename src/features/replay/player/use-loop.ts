import { useCallback, useEffect, useRef, useState } from 'react';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { LoopPlayer } from './loop-player.ts';

const quiet = (): boolean =>
  typeof matchMedia === 'function' && matchMedia('(prefers-reduced-motion: reduce)').matches;

/** Plays the span at a quarter of its speed from the start; with reduced motion it stands at the upper gate until asked. */
export function useLoop(replay: PublicReplay, times: readonly Milliseconds[]) {
  const video = useRef<HTMLVideoElement>(null);
  const player = useRef<LoopPlayer | null>(null);
  const { fromFrame, toFrame, moments } = replay;
  const start = moments.to ?? moments.top ?? fromFrame;
  const [frame, setFrame] = useState<number>(quiet() ? start : fromFrame);
  const [playing, setPlaying] = useState(false);
  const [rate, setRate] = useState(0.25);
  useEffect(() => {
    const element = video.current;
    if (!element) return;
    const own = new LoopPlayer(
      element,
      times,
      { from: fromFrame, to: toFrame },
      { onFrame: setFrame, onPlaying: setPlaying },
    );
    player.current = own;
    if (quiet()) own.show(start);
    // a browser that saves power lets nothing play by itself: then the first moment stands
    else own.play().catch(() => undefined);
    return () => {
      own.close();
      player.current = null;
    };
  }, [times, fromFrame, toFrame, start]);

  return {
    video,
    frame,
    playing,
    rate,
    toggle: useCallback(() => {
      if (playing) player.current?.pause();
      else player.current?.play().catch(() => setPlaying(false));
    }, [playing]),
    changeRate: useCallback((next: number) => {
      player.current?.setRate(next);
      setRate(next);
    }, []),
    pause: useCallback(() => player.current?.pause(), []),
    show: useCallback((at: number) => player.current?.show(at), []),
  };
}
