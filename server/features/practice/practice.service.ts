import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { practiceBody, PracticeSettings } from '#shared/contracts/practice.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { Practice } from './practice.entity.ts';

type Of = Unit<UserActor>;

const ofPractice = ({ practiceId }: UserActor) => ({ kind: 'practice', practiceId }) as const;

const presentSettings = ({ name, contact, ownersNeedCode }: Practice): PracticeSettings => ({
  name,
  contact,
  ownersNeedCode,
});

export const readPractice = async ({ em, actor }: Of): Promise<PracticeSettings> => {
  need(actor, 'practice.read', ofPractice(actor));
  return presentSettings(await em.findOneOrFail(Practice, { id: actor.practiceId }));
};

export const changePractice = async (
  unit: Of,
  given: z.output<typeof practiceBody>,
): Promise<PracticeSettings> => {
  const { em, actor } = unit;
  need(actor, 'practice.edit', ofPractice(actor));
  const practice = await em.findOneOrFail(Practice, { id: actor.practiceId });
  const fields = (['name', 'contact'] as const).filter((field) => practice[field] !== given[field]);
  em.assign(practice, given);
  if (fields.length > 0)
    audit(unit, 'practice.edit', actor.practiceId, { fields: fields.join(' ') });
  await em.flush();
  return presentSettings(practice);
};

/**
 * An owner without codes would lock themselves out, and cannot know what they ask of the others.
 * @throws Problem 'codes-first'
 */
export const setOwnersCode = async (unit: Of, needed: boolean): Promise<PracticeSettings> => {
  const { em, actor } = unit;
  need(actor, 'practice.edit', ofPractice(actor));
  const { codesSince } = await em.findOneOrFail(User, { id: actor.id });
  if (needed && !codesSince) throw new Problem('codes-first');
  const practice = await em.findOneOrFail(Practice, { id: actor.practiceId });
  if (practice.ownersNeedCode !== needed)
    audit(unit, 'practice.owners-code', actor.practiceId, { on: needed });
  em.assign(practice, { ownersNeedCode: needed });
  await em.flush();
  return presentSettings(practice);
};
