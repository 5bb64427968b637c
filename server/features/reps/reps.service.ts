import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { Rep as RepShape, repBody, repEdit } from '#shared/contracts/reps.ts';
import { viewOf } from '#shared/records/views.ts';
import { MOMENT_ORDER } from '#shared/records/engine-input.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { type ClipInSight, clipInSight, needFrames } from '../clips/clip-in-sight.ts';
import { readingsAreStale } from '../readings/stale.ts';
import { needOrder } from './boundary-order.ts';
import { type HandBoundaries, Rep } from './rep.entity.ts';
import { repInSight } from './rep-in-sight.ts';
import { type NumberedRep, presentNumbered, storedReps } from './stored-reps.ts';

/** The reps of a clip with their marks, in order. */
export const repsOfClip = async (unit: Unit<UserActor>, clipId: string): Promise<NumberedRep[]> => {
  const { clip, athlete } = await clipInSight(unit, clipId, 'athlete.read', { frames: true });
  return storedReps(unit.em, [clip], athlete);
};

/** One rep of a clip as it now stands, with its number. */
export const presentStored = async (
  { em }: Unit<UserActor>,
  { clip, athlete }: ClipInSight,
  repId: string,
): Promise<RepShape> =>
  presentNumbered(
    found((await storedReps(em, [clip], athlete)).find(({ rep }) => rep.id === repId)),
  );

/** Tells the tabs, and has the readings that rest on the clip made anew. */
const tellClip = async (unit: Unit<UserActor>, { clip, athlete }: ClipInSight, repId: string) => {
  await readingsAreStale(unit, clip.visit.id);
  await tell(
    unit,
    { coachId: athlete.coach.id },
    {
      type: 'marks',
      clipId: clip.id,
      repId,
      byUserId: unit.actor.id,
    },
  );
};

/** Names a span of a clip as a rep. */
export const addRep = async (
  unit: Unit<UserActor>,
  clipId: string,
  { supportSide, startFrame, endFrame }: z.output<typeof repBody>,
): Promise<RepShape> => {
  const { em, actor } = unit;
  const sight = await clipInSight(unit, clipId, 'rep.edit', { frames: true });
  needFrames(sight.clip, startFrame, endFrame);
  const rep = em.create(Rep, {
    clip: sight.clip,
    supportSide,
    startFrame,
    endFrame,
    handBoundaries: {},
    createdBy: em.getReference(User, actor.id),
  });
  audit(unit, 'rep.add', rep.id, { athlete: sight.athlete.id, clip: clipId });
  await em.flush();
  await tellClip(unit, sight, rep.id);
  return presentStored(unit, sight, rep.id);
};

/** What hands have moved after an edit: a frame is set, null gives the moment back to the marks. */
const movedAfter = (
  moved: HandBoundaries,
  edit: NonNullable<z.output<typeof repEdit>['boundaries']>,
): HandBoundaries =>
  Object.fromEntries(
    MOMENT_ORDER.flatMap((moment) => {
      const frame = edit[moment] === undefined ? moved[moment] : edit[moment];
      return frame === undefined || frame === null ? [] : [[moment, frame]];
    }),
  );

/** @throws Problem 'invalid-input' unless it is another rep of the clip, of the same side, with its own quiet stance */
const needLender = async ({ em }: Unit<UserActor>, rep: Rep, lenderId: string): Promise<void> => {
  const lender = await em.findOne(Rep, { id: lenderId, clip: rep.clip.id });
  if (lender && lender.id !== rep.id && lender.supportSide === rep.supportSide && !lender.quietFrom)
    return;
  throw new Problem('invalid-input', undefined, [
    {
      path: 'body.quietFrom',
      message: 'Choose another rep of this clip, of the same side, that has its own quiet stance.',
    },
  ]);
};

/** @throws Problem 'invalid-input' unless one is a front rep and the other a lifted-side rep of the same visit and leg */
const needSideRep = async (
  { em }: Unit<UserActor>,
  rep: Rep,
  clip: Clip,
  sideId: string,
): Promise<void> => {
  const side = await em.findOne(Rep, { id: sideId }, { populate: ['clip'] });
  const other = side?.clip.unwrap();
  if (
    side &&
    other?.visit.id === clip.visit.id &&
    side.supportSide === rep.supportSide &&
    clip.cameraStood === 'front' &&
    viewOf(other.cameraStood, side.supportSide) === 'lifted-side'
  )
    return;
  throw new Problem('invalid-input', undefined, [
    {
      path: 'body.liftFrom',
      message:
        'Choose a rep of this visit, standing on the same leg, in a clip from the lifted side; a clip from the front takes its lift.',
    },
  ]);
};

/** Changes a rep, if nobody has changed it meanwhile. */
export const editRep = async (
  unit: Unit<UserActor>,
  id: string,
  edit: z.output<typeof repEdit>,
): Promise<RepShape> => {
  const sight = await repInSight(unit, id, 'rep.edit');
  const { rep, clip } = sight;
  if (rep.version !== edit.version) throw new Problem('edited-meanwhile');
  const { supportSide, startFrame, endFrame, excluded, excludedNote } = edit;
  if (supportSide !== undefined) rep.supportSide = supportSide;
  if (startFrame !== undefined) rep.startFrame = startFrame;
  if (endFrame !== undefined) rep.endFrame = endFrame;
  if (excluded !== undefined) rep.excluded = excluded;
  if (excludedNote !== undefined) rep.excludedNote = excludedNote;
  if (edit.quietFrom !== undefined) {
    if (edit.quietFrom !== null) await needLender(unit, rep, edit.quietFrom);
    rep.quietFrom = edit.quietFrom;
  }
  if (edit.liftFrom !== undefined) {
    if (edit.liftFrom !== null) await needSideRep(unit, rep, clip, edit.liftFrom);
    rep.liftFrom = edit.liftFrom;
  }
  if (edit.clapFrame !== undefined) {
    if (edit.clapFrame !== null) needFrames(clip, edit.clapFrame, edit.clapFrame);
    rep.clapFrame = edit.clapFrame;
  }
  if (edit.boundaries) rep.handBoundaries = movedAfter(rep.handBoundaries, edit.boundaries);
  needFrames(clip, rep.startFrame, rep.endFrame);
  needOrder(rep, rep.handBoundaries);
  const fields = Object.keys(edit).filter((name) => name !== 'version');
  audit(unit, 'rep.edit', id, {
    athlete: sight.athlete.id,
    clip: clip.id,
    fields: fields.sort().join(' '),
  });
  await unit.em.flush();
  await tellClip(unit, sight, id);
  return presentStored(unit, sight, id);
};

/** Deletes a rep with its marks; a replay link that plays it dies with it, and who took its quiet stance or its lift has its own again. */
export const deleteRep = async (unit: Unit<UserActor>, id: string): Promise<void> => {
  const sight = await repInSight(unit, id, 'rep.edit');
  audit(unit, 'rep.delete', id, { athlete: sight.athlete.id, clip: sight.clip.id });
  unit.em.remove(sight.rep);
  await unit.em.flush();
  await tellClip(unit, sight, id);
};
