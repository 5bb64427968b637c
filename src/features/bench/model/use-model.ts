import { useMemo, useSyncExternalStore } from 'react';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { useStore } from 'zustand';
import { type BenchTools, useBench, useBenchDocument, useBenchModel } from '../bench-context.ts';
import {
  askedFor,
  type BenchModel,
  currentRep,
  modelOf,
  repsOf,
  setOf,
  withCourse,
} from './bench-model.ts';
import { markErrorOn } from './mark-error-on.ts';

/** Works the model out anew only where something it rests on has changed. */
export function useModel(document: BenchDocument, tools: BenchTools): BenchModel {
  const { queue, store, times } = tools;
  const { marks: waiting } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const repId = useStore(store, (state) => state.repId);
  const { set: chosenSet, extras } = useStore(store, (state) => state.taste);
  const set = setOf(document, chosenSet);
  const reps = useMemo(() => repsOf(document, waiting, times), [document, waiting, times]);
  const frame = useStore(store, (state) => state.frame);
  const chosen = currentRep(reps, repId, frame);
  const current = useMemo(
    () =>
      chosen && withCourse(chosen, set, markErrorOn(document.markErrors, chosen.rep.supportSide)),
    [chosen, set, document.markErrors],
  );
  return useMemo(
    () => modelOf(document, reps, current, set, extras),
    [document, reps, current, set, extras],
  );
}

/** The landmark that is asked for on the frame on show; null where none is. */
export function useAsked(): LandmarkId | null {
  const model = useBenchModel();
  const frame = useBench((state) => state.frame);
  const chosen = useBench((state) => state.chosen);
  const lastPlaced = useBench((state) => state.lastPlaced);
  const { may } = useBenchDocument();
  const marking = useBench((state) => state.tool.kind === 'mark');
  return marking && may.mark ? askedFor(model, frame, chosen, lastPlaced) : null;
}
