import * as z from 'zod';
import { painPlace } from './athlete-plan.ts';
import { id, moment, personRef, side } from './primitives.ts';
import { reviewItem } from './reviews.ts';
import { json, route } from './route.ts';

/** One thing that waits for this person. Each kind opens one exact place. */
export const waiting = z
  .discriminatedUnion('kind', [
    z.object({
      kind: z.literal('clip-preparing'),
      clipId: id,
      visitId: id,
      name: z.string(),
      progress: z.number().nullable(),
    }),
    z.object({
      kind: z.literal('clip-refused'),
      clipId: id,
      visitId: id,
      name: z.string(),
      sentence: z.string(),
    }),
    /** The machine failed it and does not try again by itself. */
    z.object({
      kind: z.literal('clip-held'),
      clipId: id,
      visitId: id,
      name: z.string(),
      sentence: z.string(),
    }),
    z.object({ kind: z.literal('call-missing'), visitId: id, side }),
    z.object({
      kind: z.literal('rep-unmarked'),
      clipId: id,
      repNumber: z.int().nullable(),
      side: side.nullable(),
    }),
    z.object({
      kind: z.literal('reading-ready'),
      visitId: id,
      side,
      label: z.string(),
      /** By a reviewer, as it stands. */
      signedOff: z.boolean(),
    }),
    /** Handed in, and waiting for this person’s word. */
    reviewItem.extend({ kind: z.literal('to-review') }),
    z.object({
      kind: z.literal('sent-back'),
      visitId: id,
      side,
      reason: z.string(),
      by: personRef,
    }),
    z.object({
      kind: z.literal('comment-open'),
      clipId: id,
      commentId: id,
      frame: z.int(),
      body: z.string(),
      by: personRef,
    }),
    z.object({
      kind: z.literal('second-marking-asked'),
      secondMarkingId: id,
      repNumber: z.int(),
      side,
      /** How many are to be marked again. */
      frames: z.int(),
      askedBy: personRef,
      /** Asked for by the one who marks. */
      mine: z.boolean(),
    }),
    /** An athlete answered by their link that something hurts, and nobody has looked at it. */
    z.object({
      kind: z.literal('pain-reported'),
      planId: id,
      side,
      /** The worst of what was not looked at yet, 1 to 10, and where that was. */
      level: z.int(),
      places: z.array(painPlace),
    }),
    z.object({ kind: z.literal('retest-due'), planId: id, side, due: z.iso.date() }),
    /** Filming was withdrawn: all of the athlete goes on this day, unless they consent anew. */
    z.object({ kind: z.literal('deletion-due'), due: z.iso.date() }),
    z.object({ kind: z.literal('consent-lapses'), until: z.iso.date() }),
    z.object({
      kind: z.literal('link-lapses'),
      visitId: id,
      side,
      replayId: id,
      expiresAt: moment,
    }),
  ])
  .and(z.object({ athlete: personRef, at: moment }))
  .meta({ id: 'Waiting' });
export type Waiting = z.infer<typeof waiting>;

/** What of a beginning is done, of the athletes in this person's sight. */
export const firstSteps = z
  .object({
    /** The practice says how athletes reach it. */
    contact: z.boolean(),
    consent: z.boolean(),
    clip: z.boolean(),
    call: z.boolean(),
    /** The first athlete; null where there is none. */
    athleteId: id.nullable(),
  })
  .meta({ id: 'FirstSteps' });
export type FirstSteps = z.infer<typeof firstSteps>;

export const today = z
  .object({
    items: z.array(waiting),
    athletes: z.int(),
    visitsThisWeek: z.int(),
    steps: firstSteps,
  })
  .meta({ id: 'Today' });
export type Today = z.infer<typeof today>;

export const todayRoutes = {
  today: route({
    method: 'get',
    path: '/api/today',
    summary: 'What waits for this person, most pressing first.',
    audience: 'staff',
    status: 200,
    answer: json(today),
  }),
};
