import * as z from 'zod';
import { email, id, moment, text } from './primitives.ts';
import { json, none, route } from './route.ts';

export const role = z.enum(['owner', 'supervisor', 'coach']).meta({ id: 'Role' });
export type Role = z.infer<typeof role>;

export const signInBody = z
  .object({ email, password: z.string().min(1, 'Write your password.').max(200) })
  .meta({ id: 'SignIn' });

const utf8 = new TextEncoder();
/** Long rather than odd; bcrypt reads 72 bytes and no more. The least length is common practice, no source. */
export const newPassword = z
  .string()
  .min(12, 'At least 12 characters. A few words in a row are good.')
  .refine((given) => utf8.encode(given).length <= 72, 'At most 72 characters, fewer with accents.');
export const personName = text(120);

/** The person signed in and the practice they work in. */
export const me = z
  .object({
    user: z.object({ id, name: z.string(), email: z.string(), role }),
    practice: z.object({ id, name: z.string() }),
    session: z.object({ id, expiresAt: moment }),
    /** One-time codes have to be set up before anything else. */
    codeMissing: z.boolean(),
  })
  .meta({ id: 'Me' });
export type Me = z.infer<typeof me>;

/** The password was right; the second step asks for a code. */
export const codeNeeded = z.object({ codeNeeded: z.literal(true) }).meta({ id: 'CodeNeeded' });

export const sessionRow = z
  .object({
    id,
    device: z.string(),
    createdAt: moment,
    lastSeenAt: moment,
    current: z.boolean(),
  })
  .meta({ id: 'Session' });
export type SessionRow = z.infer<typeof sessionRow>;

/** One's own account, as nobody else sees it. */
export const account = z
  .object({
    name: z.string(),
    email: z.string(),
    /** A change that waits for the two confirmations. */
    emailChange: z
      .object({
        to: z.string(),
        confirmedFromOld: z.boolean(),
        confirmedFromNew: z.boolean(),
        until: moment,
      })
      .nullable(),
    /** One-time codes at the sign-in: since when, null while they are off; how many recovery codes are unused. */
    codes: z.object({ since: moment.nullable(), recoveryLeft: z.int() }),
  })
  .meta({ id: 'Account' });
export type Account = z.infer<typeof account>;

const presentPassword = z.string().min(1, 'Write your present password.').max(200);
export const nameBody = z.object({ name: personName }).meta({ id: 'NameChange' });
export const passwordBody = z
  .object({ current: presentPassword, next: newPassword })
  .meta({ id: 'PasswordChange' });
export const emailBody = z.object({ email, password: presentPassword }).meta({ id: 'EmailChange' });

export const accountRoutes = {
  account: route({
    method: 'get',
    path: '/api/account',
    summary: 'One’s own account.',
    audience: 'staff',
    status: 200,
    answer: json(account),
  }),
  changeName: route({
    method: 'patch',
    path: '/api/account',
    summary: 'Change one’s own name.',
    audience: 'staff',
    body: nameBody,
    status: 200,
    answer: json(account),
  }),
  changePassword: route({
    method: 'post',
    path: '/api/account/password',
    summary: 'Change one’s own password. Every other session of the account ends.',
    audience: 'staff',
    body: passwordBody,
    status: 204,
    answer: none,
    problems: ['password-wrong', 'too-many-tries'],
  }),
  changeEmail: route({
    method: 'post',
    path: '/api/account/email',
    summary: 'Ask for another e-mail address. It holds once it is confirmed from both addresses.',
    audience: 'staff',
    body: emailBody,
    status: 200,
    answer: json(account),
    problems: ['password-wrong', 'too-many-tries'],
  }),
  dropEmailChange: route({
    method: 'delete',
    path: '/api/account/email',
    summary: 'Give up a change of address that is not confirmed yet.',
    audience: 'staff',
    status: 200,
    answer: json(account),
  }),
  signIn: route({
    method: 'post',
    path: '/api/sign-in',
    summary:
      'Open a session; the answer sets an httpOnly cookie. An account with one-time codes goes on to the second step.',
    audience: 'anyone',
    body: signInBody,
    status: 200,
    answer: json(z.union([me, codeNeeded])),
    problems: ['sign-in-refused', 'too-many-tries'],
  }),
  signOut: route({
    method: 'post',
    path: '/api/sign-out',
    summary: 'End this session. Fine to call without one.',
    audience: 'anyone',
    status: 204,
    answer: none,
  }),
  signOutEverywhere: route({
    method: 'post',
    path: '/api/sign-out-everywhere',
    summary: 'End every session of this account, this one included.',
    audience: 'staff',
    beforeCodes: true,
    status: 204,
    answer: none,
  }),
  me: route({
    method: 'get',
    path: '/api/me',
    summary: 'Who is signed in.',
    audience: 'staff',
    beforeCodes: true,
    status: 200,
    answer: json(me),
  }),
  sessions: route({
    method: 'get',
    path: '/api/sessions',
    summary: 'The open sessions of this account.',
    audience: 'staff',
    status: 200,
    answer: json(z.object({ items: z.array(sessionRow) })),
  }),
  endSession: route({
    method: 'delete',
    path: '/api/sessions/:id',
    summary: 'Sign out on one device.',
    audience: 'staff',
    params: z.object({ id }),
    status: 204,
    answer: none,
  }),
};
