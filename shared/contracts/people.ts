import * as z from 'zod';
import { role } from './accounts.ts';
import { email, id, moment } from './primitives.ts';
import { json, none, route } from './route.ts';

export const person = z
  .object({
    id,
    name: z.string(),
    email: z.string(),
    role,
    /** Null while the account is open. */
    deactivatedAt: moment.nullable(),
    /** Null where nobody ever signed in. */
    lastSeenAt: moment.nullable(),
    athletes: z.int(),
    /** Whose athletes a supervisor sees. */
    coachIds: z.array(id),
    oneTimeCodes: z.boolean(),
  })
  .meta({ id: 'Person' });
export type Person = z.infer<typeof person>;

export const invitation = z
  .object({
    id,
    email: z.string(),
    role,
    invitedBy: z.string(),
    /** Null until a mail server has taken the letter. */
    sentAt: moment.nullable(),
    expiresAt: moment,
  })
  .meta({ id: 'Invitation' });
export type Invitation = z.infer<typeof invitation>;

export const peoplePage = z
  .object({ people: z.array(person), invitations: z.array(invitation) })
  .meta({ id: 'PeoplePage' });
export type PeoplePage = z.infer<typeof peoplePage>;

/** What is left out stays. */
export const personBody = z
  .object({ role: role.optional(), coachIds: z.array(id).max(500).optional() })
  .meta({ id: 'PersonChange' });
export const handOverBody = z
  .object({ to: z.uuid('Choose who takes the athletes over.') })
  .meta({ id: 'HandOver' });

export const inviteBody = z.object({ email, role }).meta({ id: 'Invite' });

export const peopleRoutes = {
  people: route({
    method: 'get',
    path: '/api/practice/people',
    summary: 'The people of the practice and the invitations that are open.',
    audience: 'staff',
    status: 200,
    answer: json(peoplePage),
    problems: ['not-allowed'],
  }),
  invite: route({
    method: 'post',
    path: '/api/practice/invitations',
    summary: 'Invite somebody by e-mail. An earlier invitation of the same address ends.',
    audience: 'staff',
    body: inviteBody,
    status: 201,
    answer: json(peoplePage),
    problems: ['not-allowed', 'invalid-input'],
  }),
  withdrawInvitation: route({
    method: 'delete',
    path: '/api/practice/invitations/:id',
    summary: 'End an invitation: its link opens nothing any more.',
    audience: 'staff',
    params: z.object({ id }),
    status: 204,
    answer: none,
    problems: ['not-allowed', 'not-found'],
  }),
  changePerson: route({
    method: 'patch',
    path: '/api/practice/people/:id',
    summary: 'Change a person’s role, or whose athletes a supervisor sees. It holds at once.',
    audience: 'staff',
    params: z.object({ id }),
    body: personBody,
    status: 200,
    answer: json(peoplePage),
    problems: ['not-allowed', 'not-found', 'invalid-input', 'last-owner'],
  }),
  deactivatePerson: route({
    method: 'post',
    path: '/api/practice/people/:id/deactivate',
    summary:
      'Close an account: its sessions end at once. Athletes stay until they are handed over.',
    audience: 'staff',
    params: z.object({ id }),
    status: 200,
    answer: json(peoplePage),
    problems: ['not-allowed', 'not-found', 'last-owner'],
  }),
  resetCodes: route({
    method: 'post',
    path: '/api/practice/people/:id/codes/reset',
    summary:
      'Turn off the one-time codes of somebody who lost phone and recovery codes. They are told by letter, and signed out.',
    audience: 'staff',
    params: z.object({ id }),
    status: 200,
    answer: json(peoplePage),
    problems: ['not-allowed', 'not-found', 'codes-off', 'not-as-it-stands'],
  }),
  reactivatePerson: route({
    method: 'post',
    path: '/api/practice/people/:id/reactivate',
    summary: 'Open a closed account again.',
    audience: 'staff',
    params: z.object({ id }),
    status: 200,
    answer: json(peoplePage),
    problems: ['not-allowed', 'not-found'],
  }),
  handOver: route({
    method: 'post',
    path: '/api/practice/people/:id/hand-over',
    summary: 'Hand all athletes of a person to another coach or owner, all or none.',
    audience: 'staff',
    params: z.object({ id }),
    body: handOverBody,
    status: 200,
    answer: json(peoplePage),
    problems: ['not-allowed', 'not-found', 'invalid-input'],
  }),
};
