import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import {
  AUDIT_FILE_ROWS,
  type AuditFilter,
  type AuditNames,
  type AuditPage,
  type auditQuery,
} from '#shared/contracts/audit.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from './audit.ts';
import { countAudit, readAudit } from './audit-rows.ts';
import { auditCsv, presentAudit } from './audit.presenter.ts';

type Of = Unit<UserActor>;

const needOwner = ({ actor }: Of): void =>
  need(actor, 'audit.read', { kind: 'practice', practiceId: actor.practiceId });

export const readTrail = async (
  unit: Of,
  { page, pageSize, ...filter }: z.output<typeof auditQuery>,
): Promise<AuditPage> => {
  needOwner(unit);
  const total = await countAudit(unit.em, filter);
  const rows = await readAudit(unit.em, filter, { limit: pageSize, offset: (page - 1) * pageSize });
  return { items: rows.map(presentAudit), total, page, pageSize };
};

/** Whom the trail can be asked for: everybody with an account, and every athlete whom an entry names. */
export const namesInTrail = async (unit: Of): Promise<AuditNames> => {
  needOwner(unit);
  const people = await unit.em.find(User, {}, { orderBy: { name: 'asc', id: 'asc' } });
  const athletes = await unit.em.execute<AuditNames['athletes']>(
    `select e.athlete_id as id, a.given_name || ' ' || a.family_name as name
     from (select distinct athlete_id from audit_entry where athlete_id is not null) e
     left join athlete a on a.id = e.athlete_id
     order by a.family_name nulls last, a.given_name, e.athlete_id`,
  );
  return { people: people.map(({ id, name }) => ({ id, name })), athletes };
};

/** @throws Problem 'invalid-input' where a file would be too long */
export const exportTrail = async (unit: Of, filter: AuditFilter): Promise<string> => {
  needOwner(unit);
  const rows = await countAudit(unit.em, filter);
  if (rows > AUDIT_FILE_ROWS)
    throw new Problem(
      'invalid-input',
      `These are ${rows} entries, and a file takes ${AUDIT_FILE_ROWS}. Choose fewer days, a person or an athlete.`,
    );
  const text = auditCsv(await readAudit(unit.em, filter, { limit: AUDIT_FILE_ROWS }));
  audit(unit, 'audit.export', unit.actor.practiceId, { rows });
  return text;
};
