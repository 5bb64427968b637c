import { useCallback } from 'react';
import { changing, type MarkingCommand } from '#shared/landmarks/commands.ts';
import { place } from '#shared/landmarks/commands-make.ts';
import { record, stepBack } from '#shared/landmarks/commands-history.ts';
import { distance, type FramePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { newMarks } from '../actions/use-marking.ts';
import {
  type BenchTools,
  useBenchDocument,
  useBenchModel,
  useBenchTools,
} from '../bench-context.ts';
import type { CurrentRep } from '../model/bench-model.ts';
import { isDraft, touchesAfter } from '../model/draft.ts';
import { useNewest } from '../use-newest.ts';
import type { BenchDocument } from '#shared/contracts/bench.ts';

/** A snap of less than this is none, source px. */
const LEAST_SNAP = 0.05;

/**
 * Puts another value in the place of the mark that was just placed, as part of the same step of undo;
 * null takes it away, and its step with it.
 */
const amend = (
  { store, queue }: BenchTools,
  document: BenchDocument,
  current: CurrentRep,
  commands: readonly MarkingCommand[],
): void => {
  const { history, touches } = store.getState();
  const back = stepBack(history);
  if (!back) return;
  const [step, before] = back;
  const kept = { done: before.done, undone: [] };
  if (step.kind === 'touches' && isDraft(current)) {
    const after = touchesAfter(touches, commands, current.rep);
    const gone = commands.every((each) => each.after === null);
    store.setState({ touches: after, history: gone ? kept : record(kept, { ...step, after }) });
  }
  if (step.kind === 'marks' && step.repId === current.rep.id) {
    void queue.add(newMarks(document, step.repId, commands));
    const joined = step.commands.map((own) => {
      const newer = commands.find(
        (each) => each.frame === own.frame && each.landmark === own.landmark,
      );
      return newer ? { ...own, after: newer.after } : own;
    });
    store.setState({ history: record(kept, { ...step, commands: joined }) });
  }
};

/**
 * What happens to a touch after it was placed: it goes to the middle of a dot, or is told that nothing
 * there can be followed. Escape keeps the touch where the hand was.
 */
export function useTouched() {
  const tools = useBenchTools();
  const document = useBenchDocument();
  const model = useBenchModel();
  const now = useNewest({ document, model });

  const moveTo = useCallback(
    (landmark: LandmarkId, frame: FrameIndex, point: FramePoint | null) => {
      const { document: open, model: fresh } = now.current;
      const { current } = fresh;
      const there = current?.marks.get(frame)?.[landmark];
      if (!current || there?.to !== 'point') return;
      const { pictureLongEdge } = there;
      const commands = point
        ? place(current.marks, { frame, landmark, point, pictureLongEdge })
        : changing(current.marks, [{ frame, landmark, after: null }]);
      amend(tools, open, current, commands);
    },
    [tools, now],
  );

  const touched = useCallback(
    async (landmark: LandmarkId, point: FramePoint) => {
      const { follow, store } = tools;
      const { current } = now.current.model;
      if (!follow || !current) return;
      const draft = isDraft(current);
      const { frame } = store.getState();
      follow.store.setState(({ clock }) => ({
        said: null,
        clock: {
          ...clock,
          firstTouch: clock.firstTouch ?? performance.now(),
          lastTouch: performance.now(),
        },
      }));
      if (!draft && follow.store.getState().tracks.size === 0) return;
      const seen = await follow.look(frame, point);
      const still = now.current.model.current?.marks.get(frame)?.[landmark];
      // moved or taken back meanwhile: the hand is newer than what was seen
      if (!seen || still?.to !== 'point' || distance(still.point, point) > LEAST_SNAP) return;
      if (seen.dot) {
        if (distance(seen.dot.centre, point) < LEAST_SNAP) return;
        moveTo(landmark, frame, seen.dot.centre);
        follow.store.setState({ said: { is: 'snapped', landmark, frame, touched: point } });
      } else if (seen.refusal) {
        follow.store.setState({ said: { is: 'refused', landmark, code: seen.refusal } });
        if (!draft) return;
        moveTo(landmark, frame, null);
        store.setState({ chosen: landmark });
      }
    },
    [tools, moveTo, now],
  );

  const keepTouch = useCallback(() => {
    const { follow } = tools;
    const said = follow?.store.getState().said;
    if (!follow || said?.is !== 'snapped') return false;
    moveTo(said.landmark, said.frame, said.touched);
    follow.store.setState({ said: null });
    return true;
  }, [tools, moveTo]);

  return { touched, keepTouch };
}
