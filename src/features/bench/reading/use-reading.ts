import { createContext, useContext, useEffect, useMemo, useRef, useState } from 'react';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { FrameOffer } from '#shared/reading/next-frame.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { BenchModel } from '../model/bench-model.ts';
import type { ReadingAnswer, ReadingQuestion } from './reading.worker.ts';
import { readingInputOf, unmarkedFrames } from './reading-input.ts';

export interface ReadingSoFar {
  /** Of the current rep's side, over all its reps of this visit; null before the first answer. */
  readonly result: ReadingResult | null;
  readonly offers: readonly FrameOffer[];
  /** True while newer marks are being worked in. */
  readonly working: boolean;
  /** How long the newest answer took, ms; null before the first. */
  readonly tookMs: number | null;
}

export const NO_READING: ReadingSoFar = {
  result: null,
  offers: [],
  working: false,
  tookMs: null,
};
export const ReadingContext = createContext<ReadingSoFar>(NO_READING);
export const useReading = (): ReadingSoFar => useContext(ReadingContext);

/** Marks come one after the other; the reading follows when the hand pauses. */
const PAUSE_MS = 250;

/** Works the reading out in a worker: one question at a time, always the newest. */
export function useReadingWorker(
  document: BenchDocument,
  model: BenchModel,
  times: readonly Milliseconds[],
): ReadingSoFar {
  const [answer, setAnswer] = useState<(ReadingAnswer & { side: string; tookMs: number }) | null>(
    null,
  );
  const [asked, setAsked] = useState(0);
  const worker = useRef<Worker | null>(null);
  const count = useRef(0);
  const { reps, current } = model;
  const side = current?.rep.supportSide ?? null;
  const question = useMemo(() => {
    const input = side && readingInputOf(document, reps, side);
    if (!input) return null;
    return { input, unmarked: current ? unmarkedFrames(current, times) : [] };
  }, [document, reps, current, side, times]);

  useEffect(() => {
    const made = new Worker(new URL('./reading.worker.ts', import.meta.url), { type: 'module' });
    worker.current = made;
    return () => {
      worker.current = null;
      made.terminate();
    };
  }, []);

  useEffect(() => {
    const made = worker.current;
    if (!made || !question) return;
    const timer = setTimeout(() => {
      const n = (count.current += 1);
      const began = performance.now();
      setAsked(n);
      const { supportSide } = question.input;
      const hear = (event: MessageEvent<ReadingAnswer>) => {
        if (event.data.n !== n) return;
        made.removeEventListener('message', hear);
        // an older answer that comes late is passed over
        if (n === count.current)
          setAnswer({ ...event.data, side: supportSide, tookMs: performance.now() - began });
      };
      made.addEventListener('message', hear);
      made.postMessage({ n, ...question } satisfies ReadingQuestion);
    }, PAUSE_MS);
    return () => clearTimeout(timer);
  }, [question]);

  const shown = answer?.side === side ? answer : null;
  return useMemo(
    () =>
      shown
        ? {
            result: shown.result,
            offers: shown.offers,
            working: shown.n < asked,
            tookMs: shown.tookMs,
          }
        : { ...NO_READING, working: asked > 0 },
    [shown, asked],
  );
}
