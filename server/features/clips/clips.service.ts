import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { clipEdit } from '#shared/contracts/clips.ts';
import { cameraStoodOf } from '#shared/records/views.ts';
import { seconds } from '#shared/timing/units.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { Problem } from '../../http/problem.ts';
import { enqueue } from '../../jobs/job.ts';
import { audit, auditOnce } from '../audit/audit.ts';
import { readingsAreStale } from '../readings/stale.ts';
import { Rep } from '../reps/rep.entity.ts';
import { type ClipInSight, clipInSight, frameCountOf } from './clip-in-sight.ts';
import { PREPARE_CLIP } from './jobs/prepare-clip-type.ts';
import type { Clip } from './clip.entity.ts';

type Of = Unit<UserActor>;

const tellClip = (unit: Of, { clip, athlete }: ClipInSight) =>
  tell(
    unit,
    { coachId: athlete.coach.id },
    {
      type: 'clip',
      clipId: clip.id,
      visitId: clip.visit.id,
      state: clip.state,
      progress: clip.progress ?? null,
      secondsLeft: clip.secondsLeft ?? null,
    },
  );

export const countReps = ({ em }: Of, clipId: string): Promise<number> =>
  em.count(Rep, { clip: clipId });

/** Corrects how a clip was filmed, if nobody has changed it meanwhile. */
export const editClip = async (
  unit: Of,
  id: string,
  edit: z.output<typeof clipEdit>,
): Promise<Clip> => {
  const sight = await clipInSight(unit, id, 'clip.edit');
  const { clip } = sight;
  if (clip.version !== edit.version) throw new Problem('edited-meanwhile');
  const { view, supportSide, mirrored, geometry } = edit;
  if (view !== undefined) clip.view = view;
  if (supportSide !== undefined) clip.supportSide = supportSide;
  if (mirrored !== undefined) clip.mirrored = mirrored;
  if (geometry !== undefined) clip.geometry = geometry;
  if (view !== undefined || supportSide !== undefined) {
    const stood = cameraStoodOf(clip.view, clip.supportSide ?? null);
    if (stood === null) throw new Problem('support-side-needed');
    clip.cameraStood = stood;
  }
  const fields = Object.keys(edit).filter((name) => name !== 'version');
  audit(unit, 'clip.edit', id, { athlete: sight.athlete.id, fields: fields.sort().join(' ') });
  await readingsAreStale(unit, clip.visit.id);
  await unit.em.flush();
  await tellClip(unit, sight);
  return clip;
};

/** The clip for whoever looks at its pictures; the first look of a session is written down. */
export const lookAtClip = async (
  unit: Of,
  id: string,
  options: { readonly frames?: boolean } = {},
): Promise<Clip> => {
  const { clip, athlete } = await clipInSight(unit, id, 'athlete.read', options);
  frameCountOf(clip);
  await auditOnce(unit, 'clip.open', id, { athlete: athlete.id });
  return clip;
};

/** Deletes the clip's rows; whoever asked then deletes its files. */
export const deleteClip = async (unit: Of, id: string): Promise<void> => {
  const { clip, athlete } = await clipInSight(unit, id, 'clip.delete');
  audit(unit, 'clip.delete', id, { athlete: athlete.id, visit: clip.visit.id });
  unit.em.remove(clip);
  await readingsAreStale(unit, clip.visit.id);
};

/** Prepares the part that is there of a cut file, or the named part of a long one. */
export const usePart = async (
  unit: Of,
  id: string,
  { fromSeconds, toSeconds }: { fromSeconds: number; toSeconds: number | null },
): Promise<Clip> => {
  const sight = await clipInSight(unit, id, 'clip.edit');
  const { clip } = sight;
  if (clip.state !== 'refused') throw new Problem('not-as-it-stands', 'This clip was not refused.');
  if (toSeconds !== null && toSeconds <= fromSeconds)
    throw new Problem('invalid-input', undefined, [
      { path: 'body.toSeconds', message: 'A part ends after it starts.' },
    ]);
  clip.acceptRemains = true;
  clip.part = toSeconds === null ? null : { from: seconds(fromSeconds), to: seconds(toSeconds) };
  clip.state = 'waiting';
  clip.refusalCode = null;
  clip.refusalFigures = null;
  clip.tries = 0;
  await enqueue(unit, PREPARE_CLIP, { clipId: id });
  await unit.em.flush();
  await tellClip(unit, sight);
  return clip;
};

/** Tries at once to prepare a clip that could not be prepared, and counts its tries anew. */
export const prepareAgain = async (unit: Of, id: string): Promise<Clip> => {
  const sight = await clipInSight(unit, id, 'clip.edit');
  const { clip } = sight;
  if (clip.state !== 'waiting' || !clip.trouble)
    throw new Problem('not-as-it-stands', 'This clip is not waiting for another try.');
  unit.em.assign(clip, { trouble: null, nextTryAt: null, tries: 0 });
  await enqueue(unit, PREPARE_CLIP, { clipId: id });
  await unit.em.flush();
  await tellClip(unit, sight);
  return clip;
};
