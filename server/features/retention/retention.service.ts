import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type {
  Erasure as ErasureShape,
  GoingAthlete,
  RetentionPage,
  retentionTerm,
} from '#shared/contracts/retention.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { athleteInSight } from '../athletes/athlete-in-sight.ts';
import { today } from '../athletes/days.ts';
import { audit } from '../audit/audit.ts';
import { Practice } from '../practice/practice.entity.ts';
import { eraseAthlete } from './erase.ts';
import { Erasure } from './erasure.entity.ts';
import { goingUntil } from './going.ts';
import { presentErasure } from './retention.presenter.ts';

type Of = Unit<UserActor>;
const AT_MOST = 100;

const practiceOf = ({ em, actor }: Of, action: 'retention.read' | 'retention.change') => {
  need(actor, action, { kind: 'practice', practiceId: actor.practiceId });
  return em.findOneOrFail(Practice, { id: actor.practiceId });
};

/** The term and what was erased. */
export const retentionPage = async (unit: Of): Promise<RetentionPage> => {
  const { keepMonths = null, withdrawalDays } = await practiceOf(unit, 'retention.read');
  const erasures = await unit.em.find(
    Erasure,
    {},
    { populate: ['askedBy'], orderBy: { askedAt: 'desc', id: 'desc' }, limit: AT_MOST },
  );
  return { term: { keepMonths, withdrawalDays }, erasures: erasures.map(presentErasure) };
};

/** Sets the term. Days of deletion that were named to somebody stay. */
export const setRetention = async (
  unit: Of,
  term: z.output<typeof retentionTerm>,
): Promise<RetentionPage> => {
  const practice = await practiceOf(unit, 'retention.change');
  unit.em.assign(practice, term);
  audit(unit, 'retention.change', practice.id, {
    months: term.keepMonths,
    days: term.withdrawalDays,
  });
  await unit.em.flush();
  return retentionPage(unit);
};

/** Who goes until a day; `keepMonths` 0 asks how it were without a term. */
export const previewRetention = async (
  unit: Of,
  asked: { readonly until?: string | undefined; readonly keepMonths?: number | undefined },
): Promise<{ until: string; items: GoingAthlete[] }> => {
  const practice = await practiceOf(unit, 'retention.read');
  const until = asked.until ?? today();
  const keepMonths = asked.keepMonths === 0 ? null : (asked.keepMonths ?? practice.keepMonths);
  return { until, items: await goingUntil(unit.em, keepMonths ?? null, until) };
};

const sameName = (typed: string, name: string): boolean =>
  typed.normalize('NFC').replaceAll(/\s+/g, ' ') === name.normalize('NFC').replaceAll(/\s+/g, ' ');

/**
 * Erases one athlete because somebody asked.
 * @throws Problem 'invalid-input' where the typed name is not theirs
 */
export const eraseAsked = async (unit: Of, id: string, name: string): Promise<ErasureShape> => {
  const athlete = await athleteInSight(unit, id, 'athlete.erase');
  if (!sameName(name, `${athlete.givenName} ${athlete.familyName}`))
    throw new Problem('invalid-input', undefined, [
      { path: 'body.name', message: 'Type the name exactly as it stands above.' },
    ]);
  const erasure = await eraseAthlete(unit, athlete, 'asked');
  await unit.em.populate(erasure, ['askedBy']);
  return presentErasure(erasure);
};
