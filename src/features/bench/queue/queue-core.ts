import type { Mark, MarkOutcome } from '#shared/contracts/reps.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';

/**
 * Marks that wait on this device until the server has answered for each. Pure: lists in, lists out.
 * Nothing here is ever dropped but by an answer or by a person.
 */
export interface QueuedMark {
  /** The command's id; sending it again does nothing. */
  readonly id: string;
  readonly clipId: string;
  readonly repId: string;
  readonly frame: FrameIndex;
  readonly landmark: LandmarkId;
  /** Null takes the mark away. */
  readonly after: MarkValue | null;
  /** The revision that the hand saw, those of earlier waiting commands counted in; 0: none. */
  readonly baseRevision: number;
  /** True where the hand saw no mark: then a removed one is nothing to disagree about. */
  readonly sawNothing: boolean;
  readonly state: Waiting | Disputed | Refused;
}
export interface Waiting {
  readonly is: 'waiting';
}
/** Somebody else changed the mark first. Both are kept until a person decides. */
export interface Disputed {
  readonly is: 'disputed';
  /** Null: they took the mark away. */
  readonly theirs: Mark | null;
  readonly revision: number;
}
/** The server will never take it, for this reason. */
export interface Refused {
  readonly is: 'refused';
  readonly reason: string;
}

export type MarkKey = Pick<QueuedMark, 'repId' | 'frame' | 'landmark'>;
export const keyOf = ({ repId, frame, landmark }: MarkKey): string =>
  `${repId}/${frame}/${landmark}`;

const WAITING: Waiting = { is: 'waiting' };

export interface NewMark extends MarkKey {
  readonly id: string;
  readonly clipId: string;
  readonly before: MarkValue | null;
  readonly after: MarkValue | null;
  /** Revision of the mark as the server last told it; 0: none known. */
  readonly known: number;
}

const added = (mark: NewMark, last: QueuedMark | undefined): QueuedMark => {
  const { id, clipId, repId, frame, landmark, after } = mark;
  return {
    id,
    clipId,
    repId,
    frame,
    landmark,
    after,
    baseRevision: last ? last.baseRevision + 1 : mark.known,
    sawNothing: mark.before === null,
    state: WAITING,
  };
};

/** Adds changes, each behind what already waits for the same mark. */
export const enqueueAll = (
  queue: readonly QueuedMark[],
  marks: readonly NewMark[],
): readonly QueuedMark[] => {
  const next = [...queue];
  // followed marks come by the thousand: looking through the queue for each would take seconds
  const lastOf = new Map(queue.map((each, at) => [keyOf(each), at]));
  for (const mark of marks) {
    const at = lastOf.get(keyOf(mark));
    const last = at === undefined ? undefined : next[at];
    if (at !== undefined && last?.state.is === 'disputed') {
      // in a dispute the newest is what this person stands for
      next[at] = { ...last, id: mark.id, after: mark.after };
      continue;
    }
    lastOf.set(keyOf(mark), next.length);
    next.push(added(mark, last));
  }
  return next;
};

/** Adds a change behind what already waits for the same mark. */
export const enqueue = (queue: readonly QueuedMark[], mark: NewMark): readonly QueuedMark[] =>
  enqueueAll(queue, [mark]);

/** The oldest rep's waiting commands, in order; empty where nothing can be sent. */
export const nextBatch = (queue: readonly QueuedMark[], limit: number): readonly QueuedMark[] => {
  const waiting = queue.filter((each) => each.state.is === 'waiting');
  const repId = waiting[0]?.repId;
  return waiting.filter((each) => each.repId === repId).slice(0, limit);
};

const samePlace = (value: MarkValue | null, mark: Mark | null): boolean => {
  if (!value || !mark) return !value && !mark;
  if (value.to === 'hidden') return mark.hidden;
  return !mark.hidden && mark.u === value.point.u && mark.v === value.point.v;
};

/** What one answer makes of the queue. `newId` is used where a command must be sent anew. */
const settleOne = (
  queue: readonly QueuedMark[],
  outcome: MarkOutcome,
  newId: () => string,
): readonly QueuedMark[] => {
  const own = queue.find((each) => each.id === outcome.id);
  if (!own) return queue;
  const without = queue.filter((each) => each !== own);
  if (outcome.outcome !== 'conflict') return without;
  const key = keyOf(own);
  const later = without.filter((each) => keyOf(each) === key);
  const mine = later.at(-1) ?? own;
  const others = without.filter((each) => keyOf(each) !== key);
  if (samePlace(mine.after, outcome.mark)) return others;
  // the hand saw nothing there, and nothing is there: only the count was behind
  const onlyBehind = outcome.mark === null && own.sawNothing;
  // one of these commands was done, and its answer was lost on the way or came out of turn
  const isOwn =
    outcome.mark !== null && [own, ...later].some((each) => samePlace(each.after, outcome.mark));
  const state: Waiting | Disputed =
    onlyBehind || isOwn
      ? WAITING
      : { is: 'disputed', theirs: outcome.mark, revision: outcome.revision };
  return [
    ...others,
    {
      ...mine,
      id: newId(),
      baseRevision: outcome.revision,
      sawNothing: outcome.mark === null,
      state,
    },
  ];
};

export const settle = (
  queue: readonly QueuedMark[],
  outcomes: readonly MarkOutcome[],
  newId: () => string,
): readonly QueuedMark[] =>
  outcomes.reduce((left, outcome) => settleOne(left, outcome, newId), queue);

/** The server will not take these commands. They stay until the person has seen why. */
export const refuse = (
  queue: readonly QueuedMark[],
  ids: ReadonlySet<string>,
  reason: string,
): readonly QueuedMark[] =>
  queue.map((each) => (ids.has(each.id) ? { ...each, state: { is: 'refused', reason } } : each));

/** Sends the own mark again, over theirs, which this person has now seen. */
export const keepMine = (
  queue: readonly QueuedMark[],
  id: string,
  newId: () => string,
): readonly QueuedMark[] =>
  queue.map((each) =>
    each.id === id && each.state.is === 'disputed'
      ? {
          ...each,
          id: newId(),
          baseRevision: each.state.revision,
          sawNothing: each.state.theirs === null,
          state: WAITING,
        }
      : each,
  );

/** Gives the own mark up: theirs stands. Also clears what was refused. */
export const letGo = (
  queue: readonly QueuedMark[],
  ids: ReadonlySet<string>,
): readonly QueuedMark[] => queue.filter((each) => !ids.has(each.id));

/** Theirs has changed again while a person was deciding. */
export const refreshDispute = (
  queue: readonly QueuedMark[],
  key: string,
  theirs: Mark | null,
): readonly QueuedMark[] =>
  queue.map((each) =>
    keyOf(each) === key &&
    each.state.is === 'disputed' &&
    theirs !== null &&
    theirs.revision > each.state.revision
      ? { ...each, state: { ...each.state, theirs, revision: theirs.revision } }
      : each,
  );

export interface QueueCount {
  readonly waiting: number;
  readonly disputed: number;
  readonly refused: number;
}

export const countOf = (queue: readonly QueuedMark[]): QueueCount => ({
  waiting: queue.filter((each) => each.state.is === 'waiting').length,
  disputed: queue.filter((each) => each.state.is === 'disputed').length,
  refused: queue.filter((each) => each.state.is === 'refused').length,
});
