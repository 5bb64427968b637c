import type { MailLinkLook } from '#shared/contracts/mail-links.ts';
import type { liveMailLink } from './live-mail-link.ts';

/** For who holds the letter: what they were sent, and no more. */
export const presentMailLink = (link: Awaited<ReturnType<typeof liveMailLink>>): MailLinkLook => ({
  kind: link.kind,
  email: link.email,
  practiceName: link.practice_name,
  personName: link.person_name,
  role: link.role,
  newEmail: link.new_email,
});
