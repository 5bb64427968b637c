import * as z from 'zod';
import { id, moment, personRef, side, text } from './primitives.ts';
import { gates } from './protocol.ts';
import { json, route } from './route.ts';

export const seen = z.enum(['early', 'on-time', 'still', 'unsure']).meta({ id: 'Seen' });
export type Seen = z.infer<typeof seen>;

export const seenSubstitution = z
  .enum([
    'side-bend-to-support',
    'side-bend-away',
    'pelvis-hikes',
    'pelvis-drops',
    'knee-falls-in',
    'foot-turns-out',
    'heel-rises',
    'lifted-knee-drifts',
    'lifted-foot-swings-in',
    'leans-back',
  ])
  .meta({ id: 'SeenSubstitution' });
export type SeenSubstitution = z.infer<typeof seenSubstitution>;

export const callBody = z
  .object({
    seen,
    substitutions: z.array(seenSubstitution).max(10).default([]),
    confidence: z.enum(['guess', 'fairly-sure', 'sure']),
    /** What the hands felt; kept, shown, never used in a computation. */
    handsFelt: text(400, 0).default(''),
  })
  .meta({ id: 'CallBody' });

export const call = z
  .object({
    id,
    visitId: id,
    side,
    seen,
    substitutions: z.array(seenSubstitution),
    confidence: z.enum(['guess', 'fairly-sure', 'sure']),
    handsFelt: z.string(),
    by: personRef,
    at: moment,
    /** True where no figure of this side had been shown to anyone before. */
    beforeFigures: z.boolean(),
    /** Lifts between which the eye judged. */
    gates,
  })
  .meta({ id: 'Call' });
export type Call = z.infer<typeof call>;

const params = z.object({ id, side });

export const callRoutes = {
  listCalls: route({
    method: 'get',
    path: '/api/visits/:id/sides/:side/call',
    summary: 'The calls by eye of one side, oldest first; none is ever changed.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(call) })),
    problems: ['not-found'],
  }),
  recordCall: route({
    method: 'post',
    path: '/api/visits/:id/sides/:side/call',
    summary: 'Record what was seen. A second call stands beside the first, never over it.',
    audience: 'staff',
    params,
    body: callBody,
    status: 201,
    answer: json(call),
    problems: ['not-found', 'not-allowed'],
  }),
};
