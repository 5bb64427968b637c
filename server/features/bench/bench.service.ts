import type { UserActor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { caseloadOf } from '../../http/need.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Call } from '../calls/call.entity.ts';
import { presentCall } from '../calls/calls.presenter.ts';
import { Clip } from '../clips/clip.entity.ts';
import { clipInSight } from '../clips/clip-in-sight.ts';
import { presentClip, presentClipWithFrames } from '../clips/clips.presenter.ts';
import { Comment } from '../comments/comment.entity.ts';
import { COMMENT_ORDER, presentComment } from '../comments/comments.presenter.ts';
import { presentMark } from '../marks/mark-store.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { presentRules } from '../protocol/protocol.presenter.ts';
import { errorOfHands, handsOn } from '../readings/inputs-of-side.ts';
import { presentMarkError } from '../readings/readings.presenter.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import { timesOfClip } from '../reps/reps.presenter.ts';
import { type NumberedRep, presentNumbered, storedReps } from '../reps/stored-reps.ts';

const withMarks = (stored: NumberedRep) => ({
  rep: presentNumbered(stored),
  marks: stored.marks.map(presentMark),
});

const mayOn = (actor: UserActor, athlete: Athlete): BenchDocument['may'] => {
  const caseload = caseloadOf(athlete);
  return {
    mark: can(actor, 'marks.save', caseload),
    comment: can(actor, 'comment.add', caseload),
    markAgain: can(actor, 'marks.second', caseload),
  };
};

/** What a reading made now takes: the error of the hands on that side, or of the one whose hands will be the first. */
const markErrorsOf = ({ em, actor }: Unit<UserActor>, reps: readonly NumberedRep[]) =>
  Promise.all(
    side.options.map(async (each) => {
      const hands = handsOn(
        reps.flatMap(({ rep, marks }) => (rep.supportSide === each ? marks : [])),
      );
      const error = await errorOfHands(em, hands.length === 0 ? [actor.id] : hands);
      return { side: each, ...presentMarkError(error) };
    }),
  );

/** Everything that opening the Bench needs, in a handful of statements however many marks there are. */
export const benchOf = async (unit: Unit<UserActor>, clipId: string): Promise<BenchDocument> => {
  const { em, actor } = unit;
  const { clip, athlete } = await clipInSight(unit, clipId, 'athlete.read', { frames: true });
  const visit = clip.visit.unwrap();
  const others = (await em.find(
    Clip,
    { visit: visit.id, id: { $ne: clipId }, state: 'ready' },
    { populate: ['uploadedBy', 'frames'], orderBy: { uploadedAt: 'asc' } },
  )) as Clip[];
  const all = await storedReps(em, [clip, ...others], athlete);
  const repCount = (of: Clip) => all.filter((stored) => stored.clip === of).length;
  const calls = await em.find(
    Call,
    { visit: visit.id },
    { populate: ['by'], orderBy: { at: 'asc' } },
  );
  const comments = await em.find(
    Comment,
    { clip: clipId },
    { populate: ['by', 'resolvedBy'], orderBy: COMMENT_ORDER },
  );
  const assumed = await em.find(SideSetting, { visit: visit.id, assumption: true });
  return {
    clip: presentClipWithFrames(clip, repCount(clip)),
    visit: { id: visit.id, day: visit.day },
    athlete: {
      id: athlete.id,
      name: `${athlete.givenName} ${athlete.familyName}`,
      heightMm: athlete.heightMm ?? null,
    },
    reps: all.filter((stored) => stored.clip === clip).map(withMarks),
    comments: comments.map((comment) => presentComment(comment as Comment, actor.id)),
    calls: calls.map((call) => presentCall(call as Call)),
    assumption: side.options.filter((each) => assumed.some((setting) => setting.side === each)),
    markErrors: await markErrorsOf(unit, all),
    protocol: presentRules(await currentProtocol(em)),
    otherReps: all
      .filter((stored) => stored.clip !== clip)
      .map((stored) => {
        const times = timesOfClip(stored.clip);
        const clap = stored.rep.clapFrame ?? [];
        const frames = [...new Set(stored.marks.map(({ frame }) => frame).concat(clap))];
        return {
          clip: presentClip(stored.clip, repCount(stored.clip)),
          ...withMarks(stored),
          times: frames.flatMap((frame) => {
            const time = times[frame];
            return time === undefined ? [] : [{ frame, milliseconds: time }];
          }),
        };
      }),
    may: mayOn(actor, athlete),
  };
};
