import { useEffect } from 'react';
import { NavigationType, useNavigationType, useSearchParams } from 'react-router-dom';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import { useBench, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';

/** Browsers allow an address to be changed about three times a second; scrubbing asks for sixty. */
const SETTLE_MS = 300;

/** The frame that an address names, within the clip; null where it names none. */
export const frameOf = (search: URLSearchParams, count: number): FrameIndex | null => {
  const text = search.get('frame');
  if (text === null || !/^\d{1,7}$/.test(text)) return null;
  return frameIndex(Math.min(Number(text), count - 1));
};

/** Keeps frame and rep in the address (`?frame=132&rep=2`), and follows it when it is changed. */
export function useFrameAddress(repNumber: number | null): void {
  const { store, times } = useBenchTools();
  const [search, setSearch] = useSearchParams();
  const frame = useBench((state) => state.frame);
  const playing = useBench((state) => state.playing);
  const navigation = useNavigationType();

  useEffect(() => {
    if (playing) return;
    const timer = setTimeout(() => {
      setSearch(
        (before) => {
          const next = new URLSearchParams(before);
          next.set('frame', String(frame));
          // asked for once, when the page was opened
          next.delete('again');
          if (repNumber !== null) next.set('rep', String(repNumber));
          return next;
        },
        { replace: true, preventScrollReset: true },
      );
    }, SETTLE_MS);
    return () => clearTimeout(timer);
  }, [frame, repNumber, playing, setSearch]);

  useEffect(() => {
    // the own writing replaces, and may arrive when the frame has gone on since; links and the Back button do not
    if (navigation === NavigationType.Replace) return;
    const wanted = frameOf(search, times.length);
    if (wanted !== null) goTo(store, wanted);
  }, [search, navigation, store, times.length]);
}
