import { useMemo } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { MarkingCommand, MarksByFrame } from '#shared/landmarks/commands.ts';
import { hide, lookedAt, place, remove, removeFrame } from '#shared/landmarks/commands-make.ts';
import { type History, record } from '#shared/landmarks/commands-history.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { pictureLongEdge } from '#src/canvas/picture-board.ts';
import {
  type BenchTools,
  useBenchDocument,
  useBenchModel,
  useBenchTools,
} from '../bench-context.ts';
import { NO_MARKS } from '#shared/landmarks/commands.ts';
import { newId } from '../queue/new-id.ts';
import type { NewMark } from '../queue/queue-core.ts';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { isDraft, touchesAfter } from '../model/draft.ts';
import type { BenchStep, RepMarks } from '../store/bench-store.ts';

export interface Marking {
  /** Puts the landmark at a point of the frame on show; leading goes on. */
  place: (landmark: LandmarkId, point: FramePoint) => void;
  hide: (landmark: LandmarkId) => void;
  remove: (landmark: LandmarkId) => void;
  removeFrame: () => void;
  /** The tracked marks of this frame are right as they are. */
  lookedAt: () => void;
}

/** Commands as the queue takes them: each with the revision that the server last told. */
export const newMarks = (
  document: BenchDocument,
  repId: string,
  commands: readonly MarkingCommand[],
): NewMark[] => {
  const stored = document.reps.find((each) => each.rep.id === repId)?.marks ?? [];
  return commands.map(({ frame, landmark, before, after }) => ({
    id: newId(),
    clipId: document.clip.id,
    repId,
    frame,
    landmark,
    before,
    after,
    known: stored.find((mark) => mark.frame === frame && mark.landmark === landmark)?.revision ?? 0,
  }));
};

/** One gesture: kept, sent, and a step of undo. */
export const commit = (
  tools: BenchTools,
  document: BenchDocument,
  repId: string,
  commands: readonly MarkingCommand[],
): void => {
  if (commands.length === 0) return;
  void tools.queue.add(newMarks(document, repId, commands));
  tools.store.setState((state) => ({
    history: record(state.history, { kind: 'marks', repId, commands }),
  }));
};

/**
 * Marks of several reps as one step of undo.
 * @param step the history with them; without it a step of their own
 */
export const commitMany = (
  tools: BenchTools,
  document: BenchDocument,
  parts: readonly RepMarks[],
  step = (history: History<BenchStep>, real: readonly RepMarks[]) =>
    record(history, { kind: 'many-marks', parts: real }),
): void => {
  const real = parts.filter(({ commands }) => commands.length > 0);
  if (real.length === 0) return;
  void tools.queue.add(real.flatMap(({ repId, commands }) => newMarks(document, repId, commands)));
  tools.store.setState((state) => ({ history: step(state.history, real) }));
};

/** Marks before there is a rep are kept in the page, and are a step of undo all the same. */
const touch = (tools: BenchTools, rep: Rep, commands: readonly MarkingCommand[]): void => {
  if (commands.length === 0) return;
  tools.store.setState((state) => {
    const step = {
      kind: 'touches' as const,
      before: state.touches,
      after: touchesAfter(state.touches, commands, rep),
    };
    return { touches: step.after, history: record(state.history, step) };
  });
};

/** The marking gestures on the rep and frame on show. */
export function useMarking(): Marking {
  const tools = useBenchTools();
  const document = useBenchDocument();
  const { current } = useBenchModel();
  return useMemo(() => {
    const { store, board, frameSize, copySize } = tools;
    const run = (make: (marks: MarksByFrame, frame: FrameIndex) => MarkingCommand[]) => {
      if (!current || !document.may.mark) return;
      const { frame } = store.getState();
      if (frame < current.rep.startFrame || frame > current.rep.endFrame) return;
      const commands = make(current.marks ?? NO_MARKS, frame);
      if (isDraft(current)) touch(tools, current.rep, commands);
      else commit(tools, document, current.rep.id, commands);
    };
    const goOn = (landmark: LandmarkId) => store.setState({ chosen: null, lastPlaced: landmark });
    return {
      place(landmark, point) {
        run((marks, frame) =>
          place(marks, {
            frame,
            landmark,
            point,
            pictureLongEdge: pictureLongEdge(board, frameSize, copySize),
          }),
        );
        goOn(landmark);
      },
      hide(landmark) {
        run((marks, frame) => hide(marks, frame, landmark));
        goOn(landmark);
      },
      remove: (landmark) => run((marks, frame) => remove(marks, frame, landmark)),
      removeFrame: () => run(removeFrame),
      lookedAt: () => run(lookedAt),
    };
  }, [tools, document, current]);
}
