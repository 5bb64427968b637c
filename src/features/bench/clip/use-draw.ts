import { longEdgeOf } from '#src/canvas/viewport.ts';
import { useMemo, useSyncExternalStore } from 'react';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { NoteShape } from '#shared/overlay/notes.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import type { Moved } from '#src/canvas/konva-layer.tsx';
import { engineMarks } from '#shared/records/engine-input.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { marksOn } from '../model/bench-model.ts';
import { figuresOf } from '../values/frame-figures.ts';
import { noteOn } from '../values/measured-on.ts';
import { withMoved } from '../values/use-frame-figures.ts';
import { lastOnly } from './last-only.ts';
import { drawnOn } from './overlay-of.ts';

/** Landmarks of the frame on show that two people have set differently. */
export function useConflicts(): ReadonlySet<LandmarkId> {
  const { queue } = useBenchTools();
  const { current } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const { marks } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const repId = current?.rep.id;
  return useMemo(
    () =>
      new Set(
        marks
          .filter(
            (each) => each.state.is === 'disputed' && each.repId === repId && each.frame === frame,
          )
          .map((each) => each.landmark),
      ),
    [marks, repId, frame],
  );
}

/** What is painted on the frame on show, as a function of the mark that is being moved. */
export function useDraw(): (moved: Moved) => readonly Primitive[] {
  const { frameSize, times } = useBenchTools();
  const document = useBenchDocument();
  const model = useBenchModel();
  const frame = useBench((state) => state.frame);
  const tool = useBench((state) => state.tool);
  const setUp = useBench((state) => state.desk === 'set-up');
  const conflicts = useConflicts();
  return useMemo(() => {
    const { current, figures } = model;
    const longEdge = longEdgeOf(frameSize);
    const shapes = document.comments.flatMap(({ shape, fromFrame, toFrame, resolved }) =>
      shape && !resolved && fromFrame <= frame && frame <= toFrame ? [shape] : [],
    );
    return lastOnly((moved: Moved): readonly Primitive[] => {
      const marks = withMoved(marksOn(current, frame), moved, longEdge);
      const time = times[frame];
      const known =
        current && figures && time !== undefined && Object.keys(marks).length > 0
          ? { current, input: { frame, time, marks: engineMarks(marks, longEdge) } }
          : null;
      const values = known && figuresOf(known.current, known.input).shown;
      const pointedAt = shapes.flatMap((shape): NoteShape[] => {
        if (shape.kind !== 'measure') return [shape];
        // lift and turn stand on the picture as it is
        if (!known || shape.measure === 'lift' || shape.measure === 'turn') return [];
        const note = noteOn(known.current, known.input, shape.measure);
        return note ? [note.shape] : [];
      });
      return drawnOn({
        model,
        marks,
        sourceLongEdge: longEdge,
        values,
        conflicts,
        shapes: pointedAt,
        tool,
        geometry: document.clip.geometry,
        setUp,
      });
    });
  }, [document, model, frame, tool, setUp, conflicts, frameSize, times]);
}
