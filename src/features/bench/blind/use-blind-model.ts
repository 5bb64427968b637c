import { useMemo, useSyncExternalStore } from 'react';
import { useStore } from 'zustand';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import { NO_MARKS } from '#shared/landmarks/commands.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import type { BenchTools } from '../bench-context.ts';
import { type BenchModel, repsOf, setOf } from '../model/bench-model.ts';
import type { Blind } from './blind-context.ts';
import { nextToMark, orderOf } from './blind-order.ts';

/** The Bench's model of a second marking: its own marks, no course, no figures, and what is asked on this frame. */
export function useBlindModel(
  second: SecondMarkingDocument,
  document: BenchDocument,
  tools: BenchTools,
): { readonly model: BenchModel; readonly blind: Blind } {
  const { queue, store, times } = tools;
  const { marks: waiting } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const frame = useStore(store, (state) => state.frame);
  const reps = useMemo(() => repsOf(document, waiting, times), [document, waiting, times]);
  const current = useMemo(() => {
    const [only] = reps;
    return only
      ? {
          ...only,
          course: null,
          courseMissing: null,
          frames: [],
          hill: [],
          markError: ASSUMED_MARK_ERROR,
        }
      : null;
  }, [reps]);
  const order = useMemo(
    () => orderOf(second.frames, current?.marks ?? NO_MARKS),
    [second.frames, current],
  );
  const led = order.find((each) => each.frame === frame)?.landmarks;
  const model = useMemo(
    (): BenchModel => ({
      reps,
      current,
      view: second.view,
      set: setOf(document, null),
      led: led ?? [],
      figures: false,
    }),
    [reps, current, second.view, document, led],
  );
  const next = nextToMark(order, frame);
  const { id } = second.summary;
  const blind = useMemo((): Blind => ({ id, order, next }), [id, order, next]);
  return { model, blind };
}
