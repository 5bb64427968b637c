import { longEdgeOf } from '#src/canvas/viewport.ts';
import { useMemo, useSyncExternalStore } from 'react';
import type { FrameInput } from '#shared/measures/inputs.ts';
import type { Moved } from '#src/canvas/konva-layer.tsx';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { engineMarks } from '#shared/records/engine-input.ts';
import type { FrameMarks } from '#shared/landmarks/commands.ts';
import { marksOn } from '../model/bench-model.ts';
import { type FrameFigures, figuresOf } from './frame-figures.ts';

/** Marks of a frame with one of them elsewhere, as while it is dragged. */
export const withMoved = (marks: FrameMarks, moved: Moved, longEdge: number): FrameMarks => {
  if (!moved) return marks;
  return {
    ...marks,
    [moved.landmark]: {
      to: 'point',
      point: moved.point,
      source: 'hand',
      looked: true,
      confidence: null,
      pictureLongEdge: longEdge,
    },
  };
};

/**
 * The figures of the frame on show, following a mark while it is moved. Null where nothing is
 * marked, or where figures are not to be shown before the call by eye.
 */
export function useFrameFigures(): FrameFigures | null {
  const { hand, frameSize, times } = useBenchTools();
  const { current, figures } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const { moved } = useSyncExternalStore(hand.subscribe, hand.get);
  return useMemo(() => {
    const longEdge = longEdgeOf(frameSize);
    const marks = withMoved(marksOn(current, frame), moved, longEdge);
    const time = times[frame];
    if (!current || !figures || time === undefined || Object.keys(marks).length === 0) return null;
    const input: FrameInput = { frame, time, marks: engineMarks(marks, longEdge) };
    return figuresOf(current, input);
  }, [current, figures, frame, moved, times, frameSize]);
}
