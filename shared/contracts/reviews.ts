import * as z from 'zod';
import { seen } from './calls.ts';
import { id, moment, personRef, side, text } from './primitives.ts';
import { answerAgreement } from './reliability.ts';
import { json, route } from './route.ts';

/** What a word of the review is about: the reading as it stood, or a call by eye. */
export const reviewSubject = z
  .object({ kind: z.enum(['reading', 'call']), id })
  .meta({ id: 'ReviewSubject' });
export type ReviewSubject = z.infer<typeof reviewSubject>;

/** One step of a review; none is ever changed. */
export const reviewStep = z
  .object({
    id,
    step: z.enum(['handed-in', 'signed-off', 'sent-back']),
    about: reviewSubject,
    /** What was said of it then: a reading's label, or what the eye saw. */
    label: z.string().nullable(),
    seen: seen.nullable(),
    /** Why it was sent back, or what is said with it. */
    reason: z.string(),
    by: personRef,
    at: moment,
  })
  .meta({ id: 'ReviewStep' });
export type ReviewStep = z.infer<typeof reviewStep>;

/**
 * Where a side stands: `none` nobody has handed it in; `waits` for a reviewer; `sent-back` to the coach; `signed-off`
 * as it stands; `changed` was signed off, and other marks have made another reading since.
 */
export const reviewState = z
  .enum(['none', 'waits', 'sent-back', 'signed-off', 'changed'])
  .meta({ id: 'ReviewState' });
export type ReviewState = z.infer<typeof reviewState>;

export const sideReview = z
  .object({
    state: reviewState,
    /** Newest first. */
    steps: z.array(reviewStep),
    /** Who may sign it off, by name; never the athlete’s own coach. */
    reviewers: z.array(personRef),
    /** Threads of the side’s clips that nobody has resolved. */
    openComments: z.int(),
    may: z.object({ handIn: z.boolean(), decide: z.boolean() }),
  })
  .meta({ id: 'SideReview' });
export type SideReview = z.infer<typeof sideReview>;

/** One side that waits for a reviewer’s word, with the moment at which it is opened. */
export const reviewItem = z
  .object({
    visitId: id,
    side,
    day: z.iso.date(),
    athlete: personRef,
    coach: personRef,
    /** When it was handed in. */
    at: moment,
    about: z.enum(['reading', 'call']),
    label: z.string().nullable(),
    change: z.number().nullable(),
    plusMinus: z.number().nullable(),
    /** The latest call by eye. */
    seen: seen.nullable(),
    /** It was sent back before, and handed in again. */
    again: z.boolean(),
    openComments: z.int(),
    /** The first comment that nobody has resolved, otherwise the start of the side’s first rep; null without a clip. */
    opens: z
      .object({ clipId: id, frame: z.int(), commentId: id.nullable(), mine: z.boolean() })
      .nullable(),
  })
  .meta({ id: 'ReviewItem' });
export type ReviewItem = z.infer<typeof reviewItem>;

/** How often what a coach's eye saw first and what the side's reading says are the same. */
export const eyeAgreement = z
  .object({
    person: personRef,
    /** Sides where both said something. */
    agreement: answerAgreement,
    /** Sides where the eye was unsure or the reading cannot tell. */
    unsaid: z.int(),
  })
  .meta({ id: 'EyeAgreement' });
export type EyeAgreement = z.infer<typeof eyeAgreement>;

export const handInBody = z
  .object({ about: reviewSubject, note: text(1000, 0).default('') })
  .meta({ id: 'HandInBody' });

export const verdictBody = z
  .discriminatedUnion('verdict', [
    z.object({ verdict: z.literal('sign-off'), about: reviewSubject }),
    z.object({ verdict: z.literal('send-back'), about: reviewSubject, reason: text(1000) }),
  ])
  .meta({ id: 'VerdictBody' });

const params = z.object({ id, side });

export const reviewRoutes = {
  reviewQueue: route({
    method: 'get',
    path: '/api/reviews',
    summary: 'What waits for this person’s word, longest waiting first.',
    audience: 'staff',
    status: 200,
    answer: json(z.object({ items: z.array(reviewItem), total: z.int() })),
  }),
  eyeAgreement: route({
    method: 'get',
    path: '/api/reviews/eyes',
    summary: 'Calls by eye against measured readings, for each coach in sight.',
    audience: 'staff',
    status: 200,
    answer: json(z.object({ items: z.array(eyeAgreement) })),
  }),
  sideReview: route({
    method: 'get',
    path: '/api/visits/:id/sides/:side/review',
    summary: 'Where the review of one side stands, and every step of it.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(sideReview),
    problems: ['not-found'],
  }),
  handIn: route({
    method: 'post',
    path: '/api/visits/:id/sides/:side/hand-in',
    summary: 'Hand a reading or a call by eye in for review.',
    audience: 'staff',
    params,
    body: handInBody,
    status: 201,
    answer: json(sideReview),
    problems: [
      'not-found',
      'not-allowed',
      'edited-meanwhile',
      'reading-provisional',
      'not-as-it-stands',
    ],
  }),
  decideReview: route({
    method: 'post',
    path: '/api/visits/:id/sides/:side/review',
    summary: 'Sign a reading or a call by eye off, or send it back with a reason.',
    audience: 'staff',
    params,
    body: verdictBody,
    status: 201,
    answer: json(sideReview),
    problems: [
      'not-found',
      'not-allowed',
      'edited-meanwhile',
      'reading-provisional',
      'not-as-it-stands',
    ],
  }),
};
