import * as z from 'zod';
import { me, newPassword, personName, role } from './accounts.ts';
import { email, text } from './primitives.ts';
import { json, none, route } from './route.ts';

/** Sent in the body, where no log keeps it. Any text: what is not a token answers like one that is used. */
const token = z.string().max(500);

export const forgotBody = z.object({ email }).meta({ id: 'Forgot' });
export const startBody = z
  .object({ practiceName: text(120), name: personName, email })
  .meta({ id: 'Start' });
export const joinBody = z
  .object({ token, name: personName, password: newPassword })
  .meta({ id: 'Join' });
export const resetBody = z.object({ token, password: newPassword }).meta({ id: 'Reset' });

/** The two of an address that changes are confirmed from the old address and from the new one. */
export const mailLinkKind = z.enum(['invitation', 'start', 'reset', 'email-from', 'email-to']);
export type MailLinkKind = z.infer<typeof mailLinkKind>;

/** What a link in a letter is for; the link stays unused. */
export const mailLinkLook = z
  .object({
    kind: mailLinkKind,
    email: z.string(),
    practiceName: z.string(),
    personName: z.string(),
    role: role.nullable(),
    newEmail: z.string().nullable(),
  })
  .meta({ id: 'MailLinkLook' });
export type MailLinkLook = z.infer<typeof mailLinkLook>;

export const mailLinkRoutes = {
  forgot: route({
    method: 'post',
    path: '/api/forgot',
    summary: 'Ask for a link that sets a new password. The same answer for every address.',
    audience: 'anyone',
    body: forgotBody,
    status: 204,
    answer: none,
    problems: ['too-many-tries'],
  }),
  startPractice: route({
    method: 'post',
    path: '/api/start',
    summary: 'Ask for a link that starts a new practice. The same answer for every address.',
    audience: 'anyone',
    body: startBody,
    status: 204,
    answer: none,
    problems: ['too-many-tries'],
  }),
  lookAtMailLink: route({
    method: 'post',
    path: '/api/mail-links/look',
    summary: 'What a link in a letter is for. It is not used by this.',
    audience: 'anyone',
    body: z.object({ token }),
    status: 200,
    answer: json(mailLinkLook),
    problems: ['link-gone', 'too-many-tries'],
  }),
  join: route({
    method: 'post',
    path: '/api/join',
    summary: 'Make the account that a link invites to, and open a session.',
    audience: 'anyone',
    body: joinBody,
    status: 201,
    answer: json(me),
    problems: ['link-gone', 'address-taken', 'too-many-tries'],
  }),
  resetPassword: route({
    method: 'post',
    path: '/api/reset',
    summary: 'Set a new password by a link. Every session of the account ends.',
    audience: 'anyone',
    body: resetBody,
    status: 204,
    answer: none,
    problems: ['link-gone', 'too-many-tries'],
  }),
  confirmEmail: route({
    method: 'post',
    path: '/api/confirm-email',
    summary: 'Confirm a new e-mail address from the old one or from itself.',
    audience: 'anyone',
    body: z.object({ token }),
    status: 200,
    answer: json(z.object({ /** Both have confirmed. */ done: z.boolean() })),
    problems: ['link-gone', 'address-taken', 'too-many-tries'],
  }),
};
