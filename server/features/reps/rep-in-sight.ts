import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { Rep } from './rep.entity.ts';

/** A rep with its clip and the person filmed. */
export interface RepInSight {
  readonly rep: Rep;
  readonly clip: Clip;
  readonly athlete: Athlete;
}

/**
 * The rep, if this actor may do this with it.
 * @throws Problem 'not-found', 'not-allowed', 'consent-withdrawn' or 'supervision-not-agreed'
 */
export const repInSight = async (
  { em, actor }: Unit<UserActor>,
  id: string,
  action: Action,
): Promise<RepInSight> => {
  const rep = found(
    await em.findOne(Rep, { id }, { populate: ['clip.visit.athlete', 'clip.frames'] }),
  ) as Rep;
  const clip = rep.clip.unwrap() as Clip;
  const athlete = clip.visit.unwrap().athlete.unwrap() as Athlete;
  needCaseload(actor, action, athlete);
  await needOpen({ em, actor }, athlete, action);
  return { rep, clip, athlete };
};
