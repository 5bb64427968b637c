import * as z from 'zod';
import { json, route } from './route.ts';

/** What somebody is written to about, each kind with a switch of its own. */
export const waitingMailKind = z
  .enum(['to-review', 'sent-back', 'comment', 'second-marking', 'pain'])
  .meta({ id: 'WaitingMailKind' });
export type WaitingMailKind = z.infer<typeof waitingMailKind>;

export const waitingMail = z
  .object({ items: z.array(z.object({ kind: waitingMailKind, on: z.boolean() })) })
  .meta({ id: 'WaitingMail' });
export type WaitingMail = z.infer<typeof waitingMail>;

export const waitingMailRoutes = {
  waitingMail: route({
    method: 'get',
    path: '/api/account/waiting-mail',
    summary: 'About what one is written to when it waits.',
    audience: 'staff',
    status: 200,
    answer: json(waitingMail),
  }),
  setWaitingMail: route({
    method: 'put',
    path: '/api/account/waiting-mail',
    summary: 'Turn the letters of one kind on or off.',
    audience: 'staff',
    body: z.object({ kind: waitingMailKind, on: z.boolean() }).meta({ id: 'WaitingMailChoice' }),
    status: 200,
    answer: json(waitingMail),
  }),
};
