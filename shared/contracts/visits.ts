import * as z from 'zod';
import { SAFETY_ANSWERS } from '#shared/plan/cautions.ts';
import { clip } from './clips.ts';
import { day, id, millimetres, moment, personRef, text, version } from './primitives.ts';
import { gates } from './protocol.ts';
import { reviewState } from './reviews.ts';
import { json, route } from './route.ts';

/**
 * A practice's saved way of filming. A thigh pointer's length counts from the skin to its tip,
 * a belt pointer's from the line between both ASIS to its tip.
 */
export const setUpFields = {
  name: text(80),
  distanceMm: millimetres(500, 20_000),
  lensHeightMm: millimetres(0, 3000).nullable(),
  rodMm: millimetres(100, 4000).nullable(),
  beltPointerMm: millimetres(30, 600).nullable(),
  thighPointerMm: millimetres(30, 600).nullable(),
};
export const setUpBody = z.object(setUpFields).meta({ id: 'SetUpBody' });
export const setUp = z
  .object({ id, ...setUpFields, lastUsed: day.nullable() })
  .meta({ id: 'SetUp' });
export type SetUp = z.infer<typeof setUp>;

/** The questions before filming. Starting unanswered is deliberate: nobody is assumed to be well. */
export const SAFETY_QUESTIONS = SAFETY_ANSWERS;
export const safetyQuestion = z.enum(SAFETY_QUESTIONS).meta({ id: 'SafetyQuestion' });
export type SafetyQuestion = z.infer<typeof safetyQuestion>;

export const safetyBody = z
  .object({
    answers: z.record(safetyQuestion, z.boolean({ error: 'Answer yes or no.' })),
    supportWithinReach: z.literal(true, { error: 'Put a support within reach first.' }),
    knowsWhenToStop: z.literal(true, { error: 'Tell the athlete to stop on pain or dizziness.' }),
    /** For a minor: a guardian or chaperone is in the room. Null for adults. */
    chaperone: z.boolean().nullable().default(null),
    /** A clinician's clearance where an answer is yes: who cleared it and when. */
    clearedBy: text(200).nullable().default(null),
  })
  .meta({ id: 'SafetyBody' });

export const safety = z
  .object({
    answers: z.record(safetyQuestion, z.boolean()),
    chaperone: z.boolean().nullable(),
    clearedBy: z.string().nullable(),
    /** False while an answer is yes and nobody has cleared it. */
    mayFilm: z.boolean(),
    askedBy: personRef,
    askedAt: moment,
  })
  .meta({ id: 'Safety' });

/** How this visit is filmed; copied into each of its clips, where it can be corrected. */
export const filming = z
  .object({
    distanceMm: millimetres(500, 20_000).nullable(),
    lensHeightMm: millimetres(0, 3000).nullable(),
    rodMm: millimetres(100, 4000).nullable(),
    beltPointerMm: millimetres(30, 600).nullable(),
    thighPointerMm: millimetres(30, 600).nullable(),
  })
  .meta({ id: 'Filming' });

export const visitBody = z
  .object({
    day: day.optional(),
    note: text(2000, 0).default(''),
    /** A retest: filmed as that earlier visit of this athlete was. */
    likeVisitId: id.nullable().default(null),
  })
  .meta({ id: 'VisitBody' });

export const visitEdit = z
  .object({
    note: text(2000, 0).optional(),
    filming: filming.optional(),
    setUpId: id.optional(),
    version,
  })
  .meta({ id: 'VisitEdit' });

export const visit = z
  .object({
    id,
    day,
    note: z.string(),
    athlete: z.object({
      id,
      name: z.string(),
      minor: z.boolean(),
      heightMm: z.number().nullable(),
    }),
    coach: personRef,
    safety: safety.nullable(),
    filming,
    setUpName: z.string().nullable(),
    version,
  })
  .meta({ id: 'Visit' });
export type Visit = z.infer<typeof visit>;

/** One line of an athlete's history; sides that have neither call nor reading are left out. */
export const visitRow = z
  .object({
    id,
    day,
    coach: personRef,
    clipCount: z.int(),
    sides: z.array(
      z.object({
        side: z.enum(['left', 'right']),
        call: z.enum(['early', 'on-time', 'still', 'unsure']).nullable(),
        /** Where its review stands. */
        review: reviewState,
        /** Null while no call was recorded, or nothing was measured. */
        reading: z
          .object({
            code: z.string(),
            label: z.string(),
            gates,
            change: z.number().nullable(),
            plusMinus: z.number().nullable(),
            /** u_c of `change`, degrees. */
            u: z.number().nullable(),
            provisional: z.boolean(),
          })
          .nullable(),
      }),
    ),
  })
  .meta({ id: 'VisitRow' });
export type VisitRow = z.infer<typeof visitRow>;

const params = z.object({ id });

export const visitRoutes = {
  listVisits: route({
    method: 'get',
    path: '/api/athletes/:id/visits',
    summary: 'An athlete’s visits, newest first.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(visitRow) })),
    problems: ['not-found'],
  }),
  addVisit: route({
    method: 'post',
    path: '/api/athletes/:id/visits',
    summary: 'Open a visit. The day is today unless given.',
    audience: 'staff',
    params,
    body: visitBody,
    status: 201,
    answer: json(visit),
    problems: ['not-found', 'not-allowed'],
  }),
  visit: route({
    method: 'get',
    path: '/api/visits/:id',
    summary: 'One visit with its clips.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ visit, clips: z.array(clip) })),
    problems: ['not-found'],
  }),
  editVisit: route({
    method: 'patch',
    path: '/api/visits/:id',
    summary: 'Change the note or the way of filming; `setUpId` fills it from a saved set-up.',
    audience: 'staff',
    params,
    body: visitEdit,
    status: 200,
    answer: json(visit),
    problems: ['not-found', 'not-allowed', 'edited-meanwhile'],
  }),
  answerSafety: route({
    method: 'put',
    path: '/api/visits/:id/safety',
    summary: 'Record the safety check. It stays with the visit.',
    audience: 'staff',
    params,
    body: safetyBody,
    status: 200,
    answer: json(visit),
    problems: ['not-found', 'not-allowed'],
  }),
  listSetUps: route({
    method: 'get',
    path: '/api/set-ups',
    summary: 'The practice’s saved ways of filming, last used first.',
    audience: 'staff',
    status: 200,
    answer: json(z.object({ items: z.array(setUp) })),
  }),
  addSetUp: route({
    method: 'post',
    path: '/api/set-ups',
    summary: 'Save a way of filming.',
    audience: 'staff',
    body: setUpBody,
    status: 201,
    answer: json(setUp),
  }),
  deleteSetUp: route({
    method: 'delete',
    path: '/api/set-ups/:id',
    summary: 'Forget a set-up. Visits filmed with it keep their figures.',
    audience: 'staff',
    params,
    status: 204,
    answer: { kind: 'none' },
    problems: ['not-found', 'not-allowed'],
  }),
};
