import * as z from 'zod';
import { id, side } from '#shared/contracts/primitives.ts';
import type { Reading } from '#shared/contracts/readings.ts';
import { liftWay } from '#shared/course/match-lifts.ts';
import type { RepResult } from '#shared/reading/types.ts';

/** One of the two that are compared: a side of a visit, and the rep of it that plays; null: the one that says most. */
export interface End {
  readonly visitId: string;
  readonly side: z.infer<typeof side>;
  readonly repId: string | null;
}

const parts = z.tuple([id, side]).rest(id);

/** `visit.side` or `visit.side.rep`; null where it is none of these. */
export const endOf = (text: string | null): End | null => {
  const read = parts.safeParse((text ?? '').split('.'));
  if (!read.success) return null;
  const [visitId, which, repId = null] = read.data;
  return { visitId, side: which, repId };
};

export const endText = ({ visitId, side: which, repId }: End): string =>
  [visitId, which, ...(repId === null ? [] : [repId])].join('.');

/** What the two are to each other; it decides what is compared and in which words. */
export type Relation = 'reps' | 'sides' | 'visits' | 'both';
export const relationOf = (first: End, second: End): Relation => {
  const sameVisit = first.visitId === second.visitId;
  if (first.side === second.side) return sameVisit ? 'reps' : 'visits';
  return sameVisit ? 'sides' : 'both';
};

/** A rep that can be matched: it has a rise with known lifts. */
export interface PlayableRep {
  readonly id: string;
  readonly clipId: string;
  readonly number: number;
  readonly clipName: string;
  readonly used: boolean;
  readonly result: RepResult;
}

export const playableReps = ({ result, reps }: Reading): PlayableRep[] =>
  result.reps.flatMap((rep) => {
    const named = reps.find(({ id: own }) => own === rep.id);
    if (!named || liftWay(rep.frames).rise.length < 2) return [];
    const { id: repId, clipId, number, clipName } = named;
    return [{ id: repId, clipId, number, clipName, used: rep.used, result: rep }];
  });

/** The rep that was asked for, otherwise the one with the largest share in the reading. */
export const chosenRep = (
  reps: readonly PlayableRep[],
  asked: string | null,
): PlayableRep | null => {
  const named = reps.find(({ id: own }) => own === asked);
  if (named) return named;
  const share = ({ used, result }: PlayableRep) => (used ? (result.fit?.share ?? 0) : -1);
  return reps.reduce<PlayableRep | null>(
    (best, rep) => (best && share(best) >= share(rep) ? best : rep),
    null,
  );
};
