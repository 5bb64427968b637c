import { useMemo, useSyncExternalStore } from 'react';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { LandmarkId, LandmarkSetId, Side } from '#shared/landmarks/types.ts';
import { viewOf } from '#shared/records/views.ts';
import { useStore } from 'zustand';
import { type BenchTools, useBench, useBenchDocument, useBenchModel } from '../bench-context.ts';
import {
  askedFor,
  type BenchModel,
  type BenchRep,
  currentRep,
  modelOf,
  repsOf,
  setOf,
  withCourse,
} from './bench-model.ts';
import { askedSide, draftRep } from './draft.ts';
import { type Extra, ledLandmarks } from './led.ts';
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
  const draft = useDraft(document, tools, set, extras);
  const chosen = reps.length > 0 ? currentRep(reps, repId, frame) : draft;
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

/** What marking goes on with while the clip has no rep; null for those who may not mark. */
function useDraft(
  document: BenchDocument,
  { store, times }: BenchTools,
  set: LandmarkSetId,
  extras: readonly Extra[],
): BenchRep | null {
  const touches = useStore(store, (state) => state.touches);
  const standsOn = useStore(store, (state) => state.standsOn);
  const none = document.reps.length === 0 && document.may.mark;
  return useMemo(() => {
    if (!none) return null;
    const { clip } = document;
    const led = (side: Side) => ledLandmarks(viewOf(clip.cameraStood, side), set, extras);
    return draftRep(document, askedSide(standsOn, touches, clip, led), touches, times);
  }, [none, document, touches, standsOn, set, extras, times]);
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
