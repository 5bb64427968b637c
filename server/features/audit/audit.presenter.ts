import { AUDIT_ACTIONS } from '#shared/contracts/audit-actions.ts';
import type { AuditEntry } from '#shared/contracts/audit.ts';
import type { Cell } from '#shared/exports/frame-rows.ts';
import { csvText } from '../exports/csv.ts';
import type { AuditRow } from './audit-rows.ts';

export const presentAudit = (row: AuditRow): AuditEntry => ({
  id: row.id,
  at: new Date(row.at).toISOString(),
  actor: row.actor,
  by: row.by_user === null ? null : { id: row.by_user, name: row.by_name },
  role: row.role,
  action: row.action,
  athlete: row.athlete_id === null ? null : { id: row.athlete_id, name: row.athlete_name },
  subject: { kind: row.subject, id: row.subject_id, name: row.subject_name },
  detail: row.detail,
  network: row.network,
  requestId: row.request_id,
});

const COLUMNS = [
  'at',
  'actor',
  'person',
  'person id',
  'role',
  'what',
  'action',
  'athlete',
  'athlete id',
  'done to',
  'done to, id',
  'details',
  'network',
  'request',
] as const;

const cellsOf = (entry: AuditEntry): Cell[] => [
  entry.at,
  entry.actor,
  entry.by?.name ?? null,
  entry.by?.id ?? null,
  entry.role,
  AUDIT_ACTIONS[entry.action][1],
  entry.action,
  entry.athlete?.name ?? null,
  entry.athlete?.id ?? null,
  entry.subject.kind,
  entry.subject.id,
  Object.entries(entry.detail ?? {})
    .map(([key, value]) => `${key}: ${value ?? 'none'}`)
    .join('; '),
  entry.network,
  entry.requestId,
];

/** One line an entry; names as they are now. */
export const auditCsv = (rows: readonly AuditRow[]): string =>
  csvText(
    COLUMNS,
    rows.map((row) => cellsOf(presentAudit(row))),
  );
