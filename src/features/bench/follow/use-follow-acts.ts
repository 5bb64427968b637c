import { longEdgeOf } from '#src/canvas/viewport.ts';
import { useMemo } from 'react';
import { nextLandmark } from '../model/led.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { markAt } from '#shared/landmarks/commands.ts';
import { emptyHistory } from '#shared/landmarks/commands-history.ts';
import type { FoundRep } from '#shared/course/find-reps.ts';
import { type SpotId, spotOf } from '#shared/landmarks/spots.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import type { Keyframe } from '#src/tracking/types.ts';
import { useEdits } from '../actions/use-edits.ts';
import { commitMany } from '../actions/use-marking.ts';
import { useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { isDraft, NO_TOUCHES, touchedOnce } from '../model/draft.ts';
import { goTo } from '../store/bench-store.ts';
import { useNewest } from '../use-newest.ts';
import { fillRep, refill } from './fill-rep.ts';
import { withTracks } from './following.ts';
import { withFollowed } from './join-step.ts';
import { keyframesOf, keyframesOfTouches, spanAround } from './keyframes.ts';
import { repsFromTracks } from './reps-from-tracks.ts';
import {
  firstToShow,
  lenders,
  marksOfTaken,
  touchedMarks,
  withTouchedFrames,
} from './take-reps.ts';

export interface FollowActs {
  /** True once every landmark that is led through was touched, before there is a rep. */
  readonly complete: boolean;
  /** Follows all that was placed by hand, through the clip or through its reps. */
  readonly start: () => Promise<void>;
  /** Names the reps that were found, with their marks. */
  readonly take: (found: readonly FoundRep[]) => Promise<void>;
  /** A rep was named by hand: what was touched on its frames becomes its marks. */
  readonly adopt: () => void;
  /** A mark was placed anew: what was followed around it is followed again. */
  readonly again: (repId: string, landmark: LandmarkId, frame: FrameIndex) => Promise<void>;
}

const pointsOf = (keyframes: ReadonlyMap<SpotId, readonly Keyframe[]>) =>
  [...keyframes].map(([id, frames]) => ({ id, keyframes: frames }));

/** What a person can have the computer do with the marks; each act reads the newest state of the Bench. */
export function useFollowActs(): FollowActs {
  const tools = useBenchTools();
  const document = useBenchDocument();
  const model = useBenchModel();
  const edits = useEdits();
  const now = useNewest({ document, model });
  const { current, led } = model;
  const complete =
    isDraft(current) &&
    current !== null &&
    nextLandmark(led, touchedOnce(current.marks), null) === null;
  return useMemo(() => {
    const { store, follow, times, copySize } = tools;
    const pictureLongEdge = longEdgeOf(copySize);
    const last = times.length - 1;
    return {
      complete,
      async start() {
        if (!follow) return;
        const { touches } = store.getState();
        const { reps } = now.current.model;
        const draft = reps.length === 0;
        const keyframes = draft ? keyframesOfTouches(touches) : keyframesOf(reps);
        if (keyframes.size === 0) return;
        const from = draft ? 0 : Math.min(...reps.map(({ rep }) => rep.startFrame));
        const to = draft ? last : Math.max(...reps.map(({ rep }) => rep.endFrame));
        const outcome = await follow.follow(pointsOf(keyframes), frameIndex(from), frameIndex(to));
        if (!outcome) return;
        const { document: open, model: fresh } = now.current;
        const tracks = withTracks(follow.store.getState().tracks, outcome.tracks, from, to);
        follow.store.setState((state) => ({
          tracks,
          refused: outcome.refused,
          found: repsFromTracks(open, tracks, times),
          clock: { ...state.clock, followed: performance.now() },
        }));
        const filling = { tracks, document: open, times, set: fresh.set, pictureLongEdge };
        commitMany(
          tools,
          open,
          fresh.reps.map(({ rep, marks }) => ({
            repId: rep.id,
            commands: fillRep({ ...filling, rep, marks }),
          })),
        );
      },
      async take(found) {
        if (!follow) return;
        const { touches } = store.getState();
        const { tracks } = follow.store.getState();
        const wanted = withTouchedFrames(found, touches, times);
        const reps: Rep[] = [];
        follow.store.setState({ taking: true });
        let problem: Error | null = null;
        try {
          for (const { supportSide, startFrame, endFrame } of wanted)
            reps.push(await edits.addRep({ supportSide, startFrame, endFrame }));
          for (const { borrower, lender } of lenders(wanted, reps))
            await edits.editRep(borrower.id, { quietFrom: lender.id }, { undoable: false });
        } catch (error) {
          // what was named so far gets its marks; the rest stays proposed
          problem = error instanceof Error ? error : new Error('The reps were not named.');
        }
        if (problem !== null && reps.length === 0) {
          follow.store.setState({ taking: false });
          throw problem;
        }
        const { document: open, model: fresh } = now.current;
        const taking = { document: open, touches, tracks, times, set: fresh.set, pictureLongEdge };
        // the touches are marks of reps from now on: their own steps of undo lead nowhere
        store.setState({
          touches: NO_TOUCHES,
          history: emptyHistory(),
          repId: reps[0]?.id ?? null,
          desk: 'look',
        });
        follow.store.setState({
          taking: false,
          found: problem === null ? null : found.slice(reps.length),
          said: null,
        });
        commitMany(tools, open, marksOfTaken(reps, taking));
        goTo(store, firstToShow(reps, touches));
        if (problem !== null) throw problem;
      },
      adopt() {
        const { touches } = store.getState();
        const { document: open, model: fresh } = now.current;
        if (touches.size === 0 || fresh.reps.length === 0 || follow?.store.getState().taking)
          return;
        store.setState({ touches: NO_TOUCHES, history: emptyHistory() });
        commitMany(
          tools,
          open,
          fresh.reps.map(({ rep, marks }) => ({
            repId: rep.id,
            // a touch kept from earlier is older than a mark that stands there by now
            commands: touchedMarks(rep, touches).filter(
              ({ frame, landmark }) => markAt(marks, frame, landmark) === null,
            ),
          })),
        );
      },
      async again(repId, landmark, frame) {
        if (!follow) return;
        const { model: before } = now.current;
        const rep = before.reps.find((each) => each.rep.id === repId)?.rep;
        if (!rep) return;
        const spot = spotOf(landmark, rep);
        const keyframes = keyframesOf(before.reps).get(spot) ?? [];
        const [from, to] = spanAround(keyframes, frame, last);
        const point = { id: spot, keyframes };
        const outcome = await follow.follow([point], frameIndex(from), frameIndex(to));
        if (!outcome) return;
        const { document: open, model: fresh } = now.current;
        const tracks = withTracks(follow.store.getState().tracks, outcome.tracks, from, to);
        follow.store.setState({ tracks });
        const parts = fresh.reps.map(({ rep: each, marks }) => ({
          repId: each.id,
          commands: refill({ rep: each, marks, tracks, pictureLongEdge }, landmark, [from, to]),
        }));
        commitMany(tools, open, parts, (history, real) =>
          withFollowed(history, { repId, landmark, frame }, real),
        );
      },
    };
  }, [tools, edits, complete, now]);
}
