import type * as z from 'zod';
import { LockMode } from '@mikro-orm/core';
import type { UserActor } from '#shared/access/actors.ts';
import type { athleteBody, athleteEdit } from '#shared/contracts/athletes.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, need } from '../../http/need.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { athleteInSight } from './athlete-in-sight.ts';
import { type AthleteRow, readAthletes } from './athlete-rows.ts';
import { Athlete } from './athlete.entity.ts';
import { today } from './days.ts';

export const rowOf = async ({ em }: Unit<UserActor>, id: string): Promise<AthleteRow> => {
  const [row] = await readAthletes(em, today(), { sql: 'a.id = ?', params: [id] });
  return found(row);
};

export const readAthlete = async (unit: Unit<UserActor>, id: string): Promise<AthleteRow> => {
  await athleteInSight(unit, id, 'athlete.read');
  return rowOf(unit, id);
};

/** Adds an athlete to the actor's own caseload. */
export const addAthlete = async (
  unit: Unit<UserActor>,
  given: z.infer<typeof athleteBody>,
): Promise<AthleteRow> => {
  const { em, actor } = unit;
  need(actor, 'athlete.add', { kind: 'practice', practiceId: actor.practiceId });
  const athlete = em.create(Athlete, { ...given, coach: em.getReference(User, actor.id) });
  audit(unit, 'athlete.add', athlete.id, { athlete: athlete.id });
  await em.flush();
  return rowOf(unit, athlete.id);
};

/** @throws Problem 'edited-meanwhile' where another version is stored by now */
export const editAthlete = async (
  unit: Unit<UserActor>,
  id: string,
  { version, ...changes }: z.infer<typeof athleteEdit>,
): Promise<AthleteRow> => {
  const athlete = await athleteInSight(unit, id, 'athlete.edit');
  await unit.em.lock(athlete, LockMode.OPTIMISTIC, version);
  unit.em.assign(athlete, changes);
  audit(unit, 'athlete.edit', id, { athlete: id, fields: Object.keys(changes).sort().join(' ') });
  await unit.em.flush();
  return rowOf(unit, id);
};
