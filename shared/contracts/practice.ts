import * as z from 'zod';
import { text } from './primitives.ts';
import { json, route } from './route.ts';

export const practiceSettings = z
  .object({
    name: z.string(),
    /** How an athlete reaches the practice; shown on replays and in mails. */
    contact: z.string(),
    /** Owners do nothing before they have set up one-time codes. */
    ownersNeedCode: z.boolean(),
  })
  .meta({ id: 'PracticeSettings' });
export type PracticeSettings = z.infer<typeof practiceSettings>;

/** One line each: they stand in a sentence, in a letterhead and in a subject. */
const line = (max: number, min: number) =>
  text(max, min).regex(/^[^\n\t]*$/, 'Keep it on one line.');

export const practiceBody = z
  .object({ name: line(80, 2), contact: line(200, 0) })
  .meta({ id: 'PracticeBody' });

export const practiceRoutes = {
  practice: route({
    method: 'get',
    path: '/api/practice',
    summary: 'What athletes are told of the practice, and what it asks of its owners.',
    audience: 'staff',
    status: 200,
    answer: json(practiceSettings),
  }),
  changePractice: route({
    method: 'put',
    path: '/api/practice',
    summary: 'Change the practice’s name and contact. The owner’s.',
    audience: 'staff',
    body: practiceBody,
    status: 200,
    answer: json(practiceSettings),
    problems: ['not-allowed'],
  }),
  setOwnersCode: route({
    method: 'put',
    path: '/api/practice/owners-code',
    summary: 'Say whether owners need one-time codes. The owner’s, who has them on already.',
    audience: 'staff',
    body: z.object({ needed: z.boolean() }).meta({ id: 'OwnersCode' }),
    status: 200,
    answer: json(practiceSettings),
    problems: ['not-allowed', 'codes-first'],
  }),
};
