import * as z from 'zod';
import { role } from './accounts.ts';
import { AUDIT_DETAILS, AUDITED_ACTIONS } from './audit-actions.ts';
import { id, moment, pageOf, pageQuery, personRef } from './primitives.ts';
import { bytes, json, route } from './route.ts';

/** A file of more entries is refused: a spreadsheet takes no more with ease. */
export const AUDIT_FILE_ROWS = 50_000;

const filter = {
  person: id.optional(),
  athlete: id.optional(),
  action: z.enum(AUDITED_ACTIONS).optional(),
  /** The first moment. */
  from: moment.optional(),
  /** The moment after the last. */
  to: moment.optional(),
};
export const auditFilter = z.object(filter);
export type AuditFilter = z.infer<typeof auditFilter>;
export const auditQuery = z.object({ ...pageQuery, ...filter });

const detail = z.partialRecord(
  z.enum(AUDIT_DETAILS),
  z.union([z.string(), z.number(), z.boolean(), z.null()]),
);

/** Somebody whom an entry names by id; without a name where no such row is left. */
const namedOrGone = z.object({ id, name: z.string().nullable() });

export const auditEntry = z
  .object({
    id,
    at: moment,
    actor: z.enum(['user', 'link', 'product', 'nobody']),
    by: namedOrGone.nullable(),
    /** At that time. */
    role: role.nullable(),
    action: z.enum(AUDITED_ACTIONS),
    athlete: namedOrGone.nullable(),
    /** What it was done to; without a name where it is gone or has none. */
    subject: z.object({ kind: z.string(), id, name: z.string().nullable() }),
    detail: detail.nullable(),
    network: z.string().nullable(),
    requestId: z.string().nullable(),
  })
  .meta({ id: 'AuditEntry', description: 'Who did what to which athlete, and from where.' });
export type AuditEntry = z.infer<typeof auditEntry>;

export const auditPage = pageOf(auditEntry).meta({ id: 'AuditPage' });
export type AuditPage = z.infer<typeof auditPage>;

export const auditNames = z
  .object({ people: z.array(personRef), athletes: z.array(namedOrGone) })
  .meta({ id: 'AuditNames', description: 'Whom the trail can be asked for.' });
export type AuditNames = z.infer<typeof auditNames>;

export const auditRoutes = {
  audit: route({
    method: 'get',
    path: '/api/practice/audit',
    summary: 'The audit trail, newest first. The owner’s.',
    audience: 'staff',
    query: auditQuery,
    status: 200,
    answer: json(auditPage),
    problems: ['not-allowed'],
  }),
  auditNames: route({
    method: 'get',
    path: '/api/practice/audit/names',
    summary: 'The people of the practice, and the athletes whom the trail names.',
    audience: 'staff',
    status: 200,
    answer: json(auditNames),
    problems: ['not-allowed'],
  }),
  auditFile: route({
    method: 'get',
    path: '/api/practice/audit.csv',
    summary: `The same entries as a file; CSV (RFC 4180), at most ${AUDIT_FILE_ROWS} entries.`,
    audience: 'staff',
    query: auditFilter,
    status: 200,
    answer: bytes(['text/csv'] as const),
    problems: ['not-allowed'],
  }),
};
