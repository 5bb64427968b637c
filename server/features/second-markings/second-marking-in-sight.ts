import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import type { Clip } from '../clips/clip.entity.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { SecondMarking } from './second-marking.entity.ts';

/** A second marking with the rep, the clip and the person filmed. */
export interface SecondInSight {
  readonly marking: SecondMarking;
  readonly rep: Rep;
  readonly clip: Clip;
  readonly athlete: Athlete;
}

/**
 * The second marking, if this actor may do this with it. The first marks that it keeps are not loaded.
 * @throws Problem 'not-found' or 'not-allowed'
 */
export const secondInSight = async (
  { em, actor }: Unit<UserActor>,
  id: string,
  action: Action,
): Promise<SecondInSight> => {
  const marking = found(
    await em.findOne(
      SecondMarking,
      { id },
      {
        populate: [
          'marker',
          'askedBy',
          'rep.clip.visit.athlete',
          'rep.clip.frames',
          'rep.clip.uploadedBy',
        ],
      },
    ),
  ) as SecondMarking;
  const rep = marking.rep.unwrap() as Rep;
  const clip = rep.clip.unwrap() as Clip;
  const athlete = clip.visit.unwrap().athlete.unwrap() as Athlete;
  needCaseload(actor, action, athlete);
  await needOpen({ em, actor }, athlete, action);
  return { marking, rep, clip, athlete };
};

/**
 * The same for the one who marks, held until the unit of work ends.
 * @throws Problem 'not-found' or 'not-allowed'
 */
export const ownSecondMarking = async (
  unit: Unit<UserActor>,
  id: string,
): Promise<SecondInSight> => {
  await unit.em.execute('select 1 from second_marking where id = ? for update', [id]);
  const sight = await secondInSight(unit, id, 'marks.second');
  if (sight.marking.marker.id !== unit.actor.id)
    throw new Problem('not-allowed', 'Only the one who was asked marks here.');
  return sight;
};
