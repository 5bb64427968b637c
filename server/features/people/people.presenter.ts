import type { Invitation, Person } from '#shared/contracts/people.ts';
import type { MailLink } from '../mail-links/mail-link.entity.ts';
import type { PersonRow } from './people-rows.ts';

const iso = (moment: string | Date | null): string | null =>
  moment === null ? null : new Date(moment).toISOString();

export const presentPersonRow = (row: PersonRow): Person => ({
  id: row.id,
  name: row.name,
  email: row.email,
  role: row.role,
  deactivatedAt: iso(row.disabled_at),
  lastSeenAt: iso(row.last_seen_at),
  athletes: row.athletes,
  coachIds: row.coach_ids,
  oneTimeCodes: row.codes,
});

/** @param link with `by` loaded */
export const presentInvitation = (link: MailLink): Invitation => ({
  id: link.id,
  email: link.email,
  role: link.role ?? 'coach',
  invitedBy: link.by?.unwrap()?.name ?? '',
  sentAt: iso(link.sentAt ?? null),
  expiresAt: link.expiresAt.toISOString(),
});
