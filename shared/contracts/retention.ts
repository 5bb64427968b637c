import * as z from 'zod';
import { day, id, moment, personRef, text } from './primitives.ts';
import { bytes, json, route } from './route.ts';

/** asked: by the owner. withdrawn: after the consent to filming. term: the practice's own. */
export const erasureReason = z.enum(['asked', 'withdrawn', 'term']).meta({ id: 'ErasureReason' });
export type ErasureReason = z.infer<typeof erasureReason>;

const keepMonths = z
  .int('Write a whole number.')
  .min(1, 'At least 1 month.')
  .max(600, 'At most 600 months.');
export const retentionTerm = z
  .object({
    /** An athlete goes so long after their last visit; null: nobody goes by time alone. */
    keepMonths: keepMonths.nullable(),
    /** So many days lie between the withdrawal of a consent to filming and the deletion. */
    withdrawalDays: z
      .int('Write a whole number.')
      .min(0, 'Not less than 0.')
      .max(365, 'At most 365 days.'),
  })
  .meta({ id: 'RetentionTerm' });
export type RetentionTerm = z.infer<typeof retentionTerm>;

/** Somebody who goes, with everything that goes with them. */
export const goingAthlete = z
  .object({
    athlete: personRef,
    why: z.enum(['withdrawn', 'term']),
    on: day,
    visits: z.int(),
    clips: z.int(),
    /** Of the clips as they were sent. */
    bytes: z.number(),
  })
  .meta({ id: 'GoingAthlete' });
export type GoingAthlete = z.infer<typeof goingAthlete>;

export const erasure = z
  .object({
    id,
    athleteId: id,
    why: erasureReason,
    askedBy: personRef.nullable(),
    askedAt: moment,
    visits: z.int(),
    clips: z.int(),
    bytes: z.number(),
    /** Null while files are still being deleted; nothing of it can be seen any more. */
    doneAt: moment.nullable(),
  })
  .meta({ id: 'Erasure' });
export type Erasure = z.infer<typeof erasure>;

const retentionPage = z
  .object({
    term: retentionTerm,
    /** Of those who were erased, newest first; no more than a hundred. */
    erasures: z.array(erasure),
  })
  .meta({ id: 'RetentionPage' });
export type RetentionPage = z.infer<typeof retentionPage>;

const params = z.object({ id });

export const retentionRoutes = {
  retention: route({
    method: 'get',
    path: '/api/practice/retention',
    summary: 'How long the practice keeps data, and what was erased.',
    audience: 'staff',
    status: 200,
    answer: json(retentionPage),
    problems: ['not-allowed'],
  }),
  setRetention: route({
    method: 'put',
    path: '/api/practice/retention',
    summary: 'Set how long data is kept. Days that were named to somebody stay.',
    audience: 'staff',
    body: retentionTerm,
    status: 200,
    answer: json(retentionPage),
    problems: ['not-allowed'],
  }),
  previewRetention: route({
    method: 'get',
    path: '/api/practice/retention/preview',
    summary:
      'Who goes until a day, by the term as it is or by another: what the daily job then deletes.',
    audience: 'staff',
    query: z.object({
      until: day.optional(),
      /** Another term than the one that is set; 0 for none. */
      keepMonths: z.coerce.number().int().min(0).max(600).optional(),
    }),
    status: 200,
    answer: json(z.object({ until: day, items: z.array(goingAthlete) })),
    problems: ['not-allowed'],
  }),
  eraseAthlete: route({
    method: 'post',
    path: '/api/athletes/:id/erase',
    summary: 'Erase an athlete with everything. It cannot be undone.',
    audience: 'staff',
    params,
    body: z
      .object({
        /** The athlete's name as it stands there, typed by whoever erases. */
        name: text(161),
      })
      .meta({ id: 'EraseBody' }),
    status: 202,
    answer: json(erasure),
    problems: ['not-found', 'not-allowed'],
  }),
  exportAthlete: route({
    method: 'get',
    path: '/api/athletes/:id/export',
    summary: 'All that is held about an athlete as one ZIP, in open formats.',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(['application/zip']),
    problems: ['not-found', 'not-allowed'],
  }),
};
