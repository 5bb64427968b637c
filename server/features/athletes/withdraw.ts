import type { UserActor } from '#shared/access/actors.ts';
import type { Purpose } from '#shared/contracts/consents.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { enqueue } from '../../jobs/job.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { REMOVE_HIDDEN } from '../replays/jobs/remove-hidden-type.ts';
import { athleteInSight } from './athlete-in-sight.ts';
import type { AthleteRow } from './athlete-rows.ts';
import type { Athlete } from './athlete.entity.ts';
import { rowOf } from './athletes.service.ts';
import { hasConsent } from './consent-check.ts';
import { Consent } from './consent.entity.ts';
import { scheduleDeletion, tellConsent } from './deletion-due.ts';

type Of = Unit<UserActor>;

/** Takes purposes from a consent; without filming nothing of it holds. @returns what was taken */
const take = ({ em, actor }: Of, consent: Consent, purposes: readonly Purpose[]): Purpose[] => {
  const taken = consent.held.filter(
    (purpose) => purposes.includes('assessment') || purposes.includes(purpose),
  );
  if (taken.length === 0) return taken;
  const at = new Date();
  const more = taken.map((purpose) => ({ purpose, at: at.toISOString(), byId: actor.id }));
  em.assign(consent, {
    held: consent.held.filter((purpose) => !taken.includes(purpose)),
    withdrawals: [...consent.withdrawals, ...more],
  });
  if (consent.held.length === 0)
    em.assign(consent, { withdrawnAt: at, withdrawnBy: em.getReference(User, actor.id) });
  return taken;
};

/** Links end for good, and copies that were made for them go. */
const endLinks = async ({ em }: Of, athleteId: string): Promise<void> => {
  const ended = await em.execute<{ id: string; has_files: boolean }[]>(
    `update replay set revoked_at = now() from visit
     where visit.id = replay.visit_id and visit.athlete_id = ? and replay.revoked_at is null
     returning replay.id, replay.hide_head or exists (
       select from kept_film f where f.replay_id = replay.id) as has_files`,
    [athleteId],
  );
  for (const { id, has_files: hasFiles } of ended)
    if (hasFiles) await enqueue({ em }, REMOVE_HIDDEN, { replayId: id });
};

/** What rested on the purposes stops in the same unit of work: links die, what was filmed is closed. */
const stopWhatRested = async (unit: Of, athlete: Athlete): Promise<void> => {
  const { em } = unit;
  await em.flush();
  if (!(await hasConsent(em, athlete.id, 'sharing-by-link'))) await endLinks(unit, athlete.id);
  if (!(await hasConsent(em, athlete.id, 'assessment'))) await scheduleDeletion(unit, athlete);
  await tellConsent(unit, athlete);
};

/** Withdraws a whole consent. */
export const withdrawConsent = async (unit: Of, id: string): Promise<Consent> => {
  const consent = found(
    await unit.em.findOne(Consent, { id }, { populate: ['athlete', 'recordedBy', 'wording'] }),
  ) as Consent;
  const athlete = consent.athlete.unwrap() as Athlete;
  needCaseload(unit.actor, 'consent.withdraw', athlete);
  const taken = take(unit, consent, consent.held);
  if (taken.length === 0) return consent;
  audit(unit, 'consent.withdraw', id, { athlete: athlete.id, purposes: taken.join(' ') });
  await stopWhatRested(unit, athlete);
  return consent;
};

/** Withdraws purposes from every consent that holds them, lapsed ones too. */
export const withdrawPurposes = async (
  unit: Of,
  athleteId: string,
  purposes: readonly Purpose[],
): Promise<AthleteRow> => {
  const athlete = await athleteInSight(unit, athleteId, 'consent.withdraw');
  const consents = await unit.em.find(Consent, { athlete: athleteId, withdrawnAt: null });
  let any = false;
  for (const consent of consents as Consent[]) {
    const taken = take(unit, consent, purposes);
    if (taken.length === 0) continue;
    any = true;
    audit(unit, 'consent.withdraw', consent.id, { athlete: athleteId, purposes: taken.join(' ') });
  }
  if (any) await stopWhatRested(unit, athlete);
  return rowOf(unit, athleteId);
};
