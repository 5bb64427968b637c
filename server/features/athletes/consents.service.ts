import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { consentBody } from '#shared/contracts/athletes.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { athleteInSight } from './athlete-in-sight.ts';
import type { Athlete } from './athlete.entity.ts';
import { hasConsent } from './consent-check.ts';
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
    { orderBy: { recordedAt: 'desc', id: 'desc' }, populate: ['recordedBy', 'athlete'] },
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
      message: 'Without the athlete’s own yes nothing is recorded and nothing is filmed.',
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
  const consent = em.create(Consent, {
    ...given,
    purposes: [...new Set(given.purposes)],
    athlete,
    validFrom: today(),
    recordedBy: await em.findOneOrFail(User, { id: actor.id }),
  });
  audit(unit, 'consent.record', consent.id, { athlete: athleteId });
  await em.flush();
  return consent;
};

/** Withdraws a consent. Links to replays die with the last consent to sharing. */
export const withdrawConsent = async (unit: Unit<UserActor>, id: string): Promise<Consent> => {
  const { em, actor } = unit;
  const consent = found(await em.findOne(Consent, { id }, { populate: ['athlete', 'recordedBy'] }));
  const athlete = consent.athlete.unwrap();
  needCaseload(actor, 'consent.withdraw', athlete);
  if (consent.withdrawnAt) return consent;
  em.assign(consent, { withdrawnAt: new Date(), withdrawnBy: em.getReference(User, actor.id) });
  audit(unit, 'consent.withdraw', id, { athlete: athlete.id });
  await em.flush();
  if (!(await hasConsent(em, athlete.id, 'sharing-by-link'))) {
    await em.execute(
      `update replay set revoked_at = now() from visit
       where visit.id = replay.visit_id and visit.athlete_id = ? and replay.revoked_at is null`,
      [athlete.id],
    );
  }
  return consent;
};
