import { useMemo } from 'react';
import { lookedAt } from '#shared/landmarks/commands-make.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { commitMany } from '../actions/use-marking.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { type BenchRep, withCourse } from '../model/bench-model.ts';
import { goTo } from '../store/bench-store.ts';
import { type Courses, framesToLookAt, type HollowFrame, nextUnsure } from './followed.ts';

export interface Look {
  /** Frames with marks that nobody has looked at, rep by rep. */
  readonly waiting: readonly HollowFrame[];
  /** These frames are right: one step of undo. */
  readonly confirm: (frames: readonly HollowFrame[]) => void;
  readonly show: (frame: HollowFrame) => void;
  /** Goes to the next frame that the tracker was not sure of; null where there is none. */
  readonly next: (() => void) | null;
}

const coursesOf = (reps: readonly BenchRep[], set: LandmarkSetId): Courses =>
  new Map(
    reps.map((rep) => [
      rep.rep.id,
      new Map(withCourse(rep, set).frames.map((frame) => [frame.frame, frame])),
    ]),
  );

/** Looking at what was followed. */
export function useLook(): Look {
  const tools = useBenchTools();
  const document = useBenchDocument();
  const { reps, set } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const waiting = useMemo(() => framesToLookAt(reps, coursesOf(reps, set)), [reps, set]);
  return useMemo(() => {
    const { store, follow } = tools;
    const show = ({ rep, frame: at }: HollowFrame) => {
      store.setState({ repId: rep.rep.id, playing: false });
      goTo(store, at);
    };
    const next = nextUnsure(waiting, frame);
    return {
      waiting,
      show,
      confirm(frames) {
        const parts = reps.map((own) => ({
          repId: own.rep.id,
          commands: frames
            .filter(({ rep }) => rep.rep.id === own.rep.id)
            .flatMap((each) => lookedAt(own.marks, each.frame)),
        }));
        commitMany(tools, document, parts);
        follow?.store.setState(({ clock }) => ({ clock: { ...clock, looked: performance.now() } }));
      },
      next: next && (() => show(next)),
    };
  }, [tools, document, reps, waiting, frame]);
}
