import { useMemo } from 'react';
import { inverseOf, NO_MARKS, stillAsLeft } from '#shared/landmarks/commands.ts';
import { stepAgain, stepBack } from '#shared/landmarks/commands-history.ts';
import { useStatus } from '#src/ui/status.tsx';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import type { BenchStep } from '../store/bench-store.ts';
import { goTo } from '../store/bench-store.ts';
import { useEdits } from './use-edits.ts';
import { newMarks } from './use-marking.ts';

export interface Undo {
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  readonly undo: () => void;
  readonly redo: () => void;
}

/** Turned round, a step takes itself back. */
const turned = (step: BenchStep): BenchStep => {
  if (step.kind === 'marks') return { ...step, commands: inverseOf(step.commands) };
  if (step.kind === 'many-marks') {
    const parts = step.parts.map((part) => ({ ...part, commands: inverseOf(part.commands) }));
    return { ...step, parts: parts.reverse() };
  }
  if (step.kind === 'rep') return { ...step, before: step.after, after: step.before };
  if (step.kind === 'touches') return { ...step, before: step.after, after: step.before };
  return { ...step, before: step.after, after: step.before };
};

/** Takes back and does again, as far as the moment at which the Bench was opened. */
export function useUndo(): Undo {
  const tools = useBenchTools();
  const document = useBenchDocument();
  const { reps } = useBenchModel();
  const edits = useEdits();
  const say = useStatus();
  const canUndo = useBench((state) => state.history.done.length > 0);
  const canRedo = useBench((state) => state.history.undone.length > 0);
  return useMemo(() => {
    const { store, queue } = tools;
    /** Does the step; false where the marks are no longer as they were left. */
    const perform = (step: BenchStep): boolean => {
      if (step.kind === 'touches') {
        store.setState({ touches: step.after });
        return true;
      }
      if (step.kind === 'marks' || step.kind === 'many-marks') {
        const parts = step.kind === 'marks' ? [step] : step.parts;
        const asLeft = parts.every(({ repId, commands }) => {
          const rep = reps.find((each) => each.rep.id === repId);
          return rep && stillAsLeft(rep.marks ?? NO_MARKS, inverseOf(commands));
        });
        if (!asLeft) return false;
        void queue.add(parts.flatMap(({ repId, commands }) => newMarks(document, repId, commands)));
        // what changes must be seen to change
        const first = parts[0]?.commands[0];
        const shown = step.kind === 'many-marks' ? step.shown : undefined;
        if (first) goTo(store, shown ?? first.frame);
        return true;
      }
      const work =
        step.kind === 'rep'
          ? edits.editRep(step.repId, step.after, { undoable: false })
          : edits.editGeometry(step.after, { undoable: false });
      work.catch((error: unknown) => say(error instanceof Error ? error.message : 'Not undone.'));
      return true;
    };
    const undo = () => {
      const back = stepBack(store.getState().history);
      if (!back) return;
      const [step, history] = back;
      if (perform(turned(step))) store.setState({ history });
      else {
        // it cannot be taken back without writing over somebody: it is left out of the history
        store.setState({ history: { ...history, undone: store.getState().history.undone } });
        say('Somebody has changed this mark since. It was left as it is.');
      }
    };
    const redo = () => {
      const again = stepAgain(store.getState().history);
      if (!again) return;
      const [step, history] = again;
      if (perform(step)) store.setState({ history });
      else {
        store.setState({ history: { ...history, done: store.getState().history.done } });
        say('Somebody has changed this mark since. It was left as it is.');
      }
    };
    return { canUndo, canRedo, undo, redo };
  }, [tools, document, reps, edits, say, canUndo, canRedo]);
}
