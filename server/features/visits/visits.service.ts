import { isDeepStrictEqual } from 'node:util';
import { LockMode } from '@mikro-orm/core';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { safetyBody, visitBody, visitEdit } from '#shared/contracts/visits.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { athleteInSight } from '../athletes/athlete-in-sight.ts';
import { isMinor, today } from '../athletes/days.ts';
import { audit } from '../audit/audit.ts';
import { filmingOf } from './set-ups.service.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { SetUp } from './set-up.entity.ts';
import { type Filming, Visit } from './visit.entity.ts';
import { visitInSight, type VisitInSight } from './visit-in-sight.ts';

const NOT_KNOWN_YET: Filming = {
  distanceMm: null,
  lensHeightMm: null,
  rodMm: null,
  beltPointerMm: null,
  thighPointerMm: null,
};

export const readVisit = (unit: Unit<UserActor>, id: string): Promise<VisitInSight> =>
  visitInSight(unit, id, 'athlete.read');

export const addVisit = async (
  unit: Unit<UserActor>,
  athleteId: string,
  { day, note, likeVisitId }: z.infer<typeof visitBody>,
): Promise<VisitInSight> => {
  const { em, actor } = unit;
  const athlete = await athleteInSight(unit, athleteId, 'visit.add');
  const coach = await em.findOneOrFail(User, { id: actor.id });
  const like = likeVisitId && found(await em.findOne(Visit, { id: likeVisitId, athlete }));
  const { setUpId } = (await currentProtocol(em)).values;
  // one that was deleted since is no set-up any more
  const setUp = setUpId === null || like ? null : await em.findOne(SetUp, { id: setUpId });
  const visit = em.create(Visit, {
    athlete,
    coach,
    day: day ?? today(),
    note,
    filming: like ? { ...like.filming } : setUp ? filmingOf(setUp) : NOT_KNOWN_YET,
    setUpName: like ? like.setUpName : (setUp?.name ?? null),
  });
  audit(unit, 'visit.add', visit.id, { athlete: athleteId });
  await em.flush();
  return { visit, athlete, coach };
};

/** Fills the filming from a set-up, then takes what was typed over it. */
export const editVisit = async (
  unit: Unit<UserActor>,
  id: string,
  { version, note, filming, setUpId }: z.infer<typeof visitEdit>,
): Promise<VisitInSight> => {
  const { em } = unit;
  const seen = await visitInSight(unit, id, 'visit.edit');
  const { visit } = seen;
  await em.lock(visit, LockMode.OPTIMISTIC, version);
  if (note !== undefined) visit.note = note;
  if (setUpId !== undefined) {
    const setUp = found(await em.findOne(SetUp, { id: setUpId }));
    setUp.lastUsed = today();
    visit.filming = filmingOf(setUp);
    visit.setUpName = setUp.name;
  }
  if (filming !== undefined) {
    if (!isDeepStrictEqual(filming, visit.filming)) visit.setUpName = null;
    visit.filming = filming;
  }
  const fields = Object.entries({ note, filming, setUpId }).filter(([, v]) => v !== undefined);
  audit(unit, 'visit.edit', id, {
    athlete: seen.athlete.id,
    fields: fields.map(([name]) => name).join(' '),
  });
  await em.flush();
  return seen;
};

/** Records the answers with who asked and when. A second check replaces the first; both stand in the audit trail. */
export const answerSafety = async (
  unit: Unit<UserActor>,
  id: string,
  given: z.infer<typeof safetyBody>,
): Promise<VisitInSight> => {
  const { em, actor } = unit;
  const seen = await visitInSight(unit, id, 'visit.edit');
  const minor = isMinor(seen.athlete.birthDate);
  if (minor && given.chaperone === null) {
    throw new Problem('invalid-input', undefined, [
      {
        path: 'body.chaperone',
        message: 'Say whether a guardian or chaperone is in the room.',
      },
    ]);
  }
  const asker = await em.findOneOrFail(User, { id: actor.id });
  seen.visit.safety = {
    answers: given.answers,
    chaperone: minor ? given.chaperone : null,
    clearedBy: given.clearedBy,
    askedBy: { id: asker.id, name: asker.name },
    askedAt: new Date().toISOString(),
  };
  audit(unit, 'visit.safety', id, {
    athlete: seen.athlete.id,
    yes: Object.values(given.answers).filter(Boolean).length,
    cleared: given.clearedBy !== null,
  });
  await em.flush();
  return seen;
};
