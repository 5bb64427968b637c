import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import { NO_ASSENT, type consentBody } from '#shared/contracts/athletes.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { athleteInSight } from './athlete-in-sight.ts';
import type { Athlete } from './athlete.entity.ts';
import { takeBackDeletion, tellConsent } from './deletion-due.ts';
import { currentWording } from '../consents/wording.service.ts';
import { Consent } from './consent.entity.ts';
import { isMinor, today } from './days.ts';

/** Newest first. */
export const listConsents = async (
  unit: Unit<UserActor>,
  athleteId: string,
): Promise<Consent[]> => {
  await athleteInSight(unit, athleteId, 'athlete.read');
  return unit.em.find(
    Consent,
    { athlete: athleteId },
    { orderBy: { recordedAt: 'desc', id: 'desc' }, populate: ['recordedBy', 'athlete', 'wording'] },
  );
};

type ConsentGiven = z.infer<typeof consentBody>;

/** What the contract cannot know: whose consent it is, and which day it is. */
const needUsable = (athlete: Athlete, given: ConsentGiven): void => {
  const faults = [];
  if (isMinor(athlete.birthDate) && given.givenBy === 'athlete') {
    faults.push({
      path: 'body.givenBy',
      message:
        'The athlete is under 18: a guardian gives the consent, the athlete’s own yes stands beside it.',
    });
  }
  if (isMinor(athlete.birthDate) && !given.assent) {
    faults.push({
      path: 'body.assent',
      message: NO_ASSENT,
    });
  }
  if (given.validUntil < today()) {
    faults.push({ path: 'body.validUntil', message: 'Choose today or a later day.' });
  }
  if (faults.length > 0) throw new Problem('invalid-input', undefined, faults);
};

/** Records a consent that holds from today. */
export const recordConsent = async (
  unit: Unit<UserActor>,
  athleteId: string,
  given: ConsentGiven,
): Promise<Consent> => {
  const { em, actor } = unit;
  const athlete = await athleteInSight(unit, athleteId, 'consent.record');
  needUsable(athlete, given);
  const { wordingId, ...said } = given;
  const wording = wordingId === null ? null : await currentWording(em);
  if (wording && wording.id !== wordingId)
    throw new Problem(
      'edited-meanwhile',
      'The wording was changed meanwhile. Read out the new one, then record the consent.',
    );
  const purposes = [...new Set(given.purposes)];
  const consent = em.create(Consent, {
    ...said,
    purposes,
    held: purposes,
    wording,
    athlete,
    validFrom: today(),
    recordedBy: await em.findOneOrFail(User, { id: actor.id }),
  });
  audit(unit, 'consent.record', consent.id, { athlete: athleteId });
  await em.flush();
  await takeBackDeletion(unit, athlete);
  await tellConsent(unit, athlete);
  return consent;
};
