import type { Actor } from '#shared/access/actors.ts';
import type { EntityManager } from '@mikro-orm/postgresql';
import { tell } from '../../events/tell.ts';
import { Clip } from '../clips/clip.entity.ts';
import { PREPARE_CLIP } from '../clips/jobs/prepare-clip-type.ts';
import { enqueue } from '../../jobs/job.ts';
import { Practice } from '../practice/practice.entity.ts';
import type { Athlete } from './athlete.entity.ts';
import { daysLater, today } from './days.ts';
import { hasConsent } from './consent-check.ts';

interface Of {
  readonly em: EntityManager;
  readonly actor: Extract<Actor, { kind: 'user' }>;
}

/** Without the entity, whose version would tell an open form that somebody changed the person's details. */
const setDue = ({ em }: Of, athlete: Athlete, day: string | null) =>
  em.execute('update athlete set deletion_due = ?::date where id = ?', [day, athlete.id]);

/** Closes what was filmed and names the day on which it goes; a day that was named before stays. */
export const scheduleDeletion = async (unit: Of, athlete: Athlete): Promise<void> => {
  if (athlete.deletionDue) return;
  const practice = await unit.em.findOneOrFail(Practice, { id: unit.actor.practiceId });
  await setDue(unit, athlete, daysLater(today(), practice.withdrawalDays));
};

/** A new consent to filming takes the deletion back; clips that waited meanwhile are prepared. */
export const takeBackDeletion = async (unit: Of, athlete: Athlete): Promise<void> => {
  const { em } = unit;
  if (!athlete.deletionDue || !(await hasConsent(em, athlete.id, 'assessment'))) return;
  await setDue(unit, athlete, null);
  const waiting = await em.find(Clip, {
    visit: { athlete: athlete.id },
    state: { $in: ['waiting', 'preparing'] },
  });
  for (const { id } of waiting) await enqueue(unit, PREPARE_CLIP, { clipId: id });
};

/** Open pages of this athlete ask again, and are refused what is closed by now. */
export const tellConsent = (unit: Of, athlete: Athlete): Promise<void> =>
  tell(unit, { coachId: athlete.coach.id }, { type: 'consent', athleteId: athlete.id });
