import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import { Clip } from './clip.entity.ts';

/** A clip with the person filmed and who sent it. */
export interface ClipInSight {
  readonly clip: Clip;
  readonly athlete: Athlete;
}

/**
 * The clip, if this actor may do this with it.
 * @param frames load the frame table too: thousands of numbers
 * @throws Problem 'not-found', 'not-allowed', 'consent-withdrawn' or 'supervision-not-agreed'
 */
export const clipInSight = async (
  { em, actor }: Unit<UserActor>,
  id: string,
  action: Action,
  { frames = false }: { readonly frames?: boolean } = {},
): Promise<ClipInSight> => {
  const clip = found(
    await em.findOne(
      Clip,
      { id },
      { populate: ['visit.athlete', 'uploadedBy', ...(frames ? (['frames'] as const) : [])] },
    ),
  );
  const athlete = clip.visit.unwrap().athlete.unwrap() as Athlete;
  needCaseload(actor, action, athlete);
  await needOpen({ em, actor }, athlete, action);
  return { clip: clip, athlete };
};

/**
 * How many frames a clip has, once it has any.
 * @throws Problem 'clip-refused' or 'clip-not-ready'
 */
export const frameCountOf = (clip: Clip): number => {
  if (clip.state === 'refused') throw new Problem('clip-refused');
  if (clip.state !== 'ready' || !clip.frameCount) throw new Problem('clip-not-ready');
  return clip.frameCount;
};

/** @throws Problem 'frame-out-of-range' */
export const needFrames = (clip: Clip, ...frames: readonly number[]): void => {
  const count = frameCountOf(clip);
  const outside = frames.find((frame) => frame >= count);
  if (outside !== undefined)
    throw new Problem(
      'frame-out-of-range',
      `The clip has frames 0 to ${count - 1}, not ${outside}.`,
    );
};
