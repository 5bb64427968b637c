import type { EntityManager } from '@mikro-orm/postgresql';
import { group } from 'd3-array';
import type { Rep as RepShape } from '#shared/contracts/reps.ts';
import { type Borrowing, sharedQuietOf } from '#shared/records/shared-quiet.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { type MarkRow, readMarks } from '../marks/mark-store.ts';
import { Rep } from './rep.entity.ts';
import { presentRep, repInput, type StoredRep, timesOfClip } from './reps.presenter.ts';

/** The place of a rep among those of its clip: by where it starts, then by when it was made. */
export const REP_ORDER = { startFrame: 'asc', createdAt: 'asc', id: 'asc' } as const;

/** A rep ready to be presented. */
export interface NumberedRep extends StoredRep {
  readonly number: number;
}

const borrowing = (stored: StoredRep): Borrowing => ({
  input: repInput(stored, timesOfClip(stored.clip)),
  clipId: stored.clip.id,
  quietFrom: stored.rep.quietFrom ?? null,
});

/** The quiet stance of the rep that lends it. */
const taken = (own: StoredRep, all: readonly StoredRep[]) =>
  sharedQuietOf(
    borrowing(own),
    all.filter(({ rep }) => rep.id === own.rep.quietFrom).map(borrowing),
  );

/**
 * The reps of some clips with their marks, clip by clip in the order of each.
 * @param clips with the lazy `frames` loaded
 */
export const storedReps = async (
  em: EntityManager,
  clips: readonly Clip[],
  athlete: Athlete,
): Promise<NumberedRep[]> => {
  const reps = (await em.find(
    Rep,
    { clip: { $in: clips.map(({ id }) => id) } },
    { orderBy: REP_ORDER },
  )) as Rep[];
  const marks = group(
    await readMarks(
      em,
      reps.map(({ id }) => id),
    ),
    ({ repId }) => repId,
  );
  const none: readonly MarkRow[] = [];
  const stored = clips.flatMap((clip) =>
    reps
      .filter((rep) => rep.clip.id === clip.id)
      .map((rep, index) => ({
        rep,
        clip,
        marks: marks.get(rep.id) ?? none,
        bodyHeightMm: athlete.heightMm ?? null,
        number: index + 1,
      })),
  );
  return stored.map((own) =>
    own.rep.quietFrom ? { ...own, sharedQuiet: taken(own, stored) } : own,
  );
};

export const presentNumbered = (stored: NumberedRep): RepShape => presentRep(stored, stored.number);
