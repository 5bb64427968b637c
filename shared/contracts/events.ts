import * as z from 'zod';
import { clipState } from './clips.ts';
import { id, personRef, side } from './primitives.ts';
import { eventStream, route } from './route.ts';

/**
 * What a tab is told. An event says that something changed, never what it says: the tab asks again. Only who is on
 * a clip stands in the event itself, because it is kept nowhere.
 */
export const liveEvent = z
  .discriminatedUnion('type', [
    z.object({
      type: z.literal('clip'),
      clipId: id,
      visitId: id,
      state: clipState,
      progress: z.number().nullable(),
      secondsLeft: z.number().nullable(),
    }),
    z.object({ type: z.literal('marks'), clipId: id, repId: id, byUserId: id }),
    z.object({ type: z.literal('comments'), clipId: id, byUserId: id }),
    z.object({ type: z.literal('reading'), visitId: id, side }),
    z.object({ type: z.literal('plan'), planId: id, visitId: id }),
    z.object({ type: z.literal('report'), visitId: id }),
    /** Somebody has this clip open, or has left it. Said anew while it lasts, and kept nowhere. */
    z.object({ type: z.literal('here'), clipId: id, by: personRef, here: z.boolean() }),
    /** A consent was given or withdrawn: what is open of this athlete may be closed by now. */
    z.object({ type: z.literal('consent'), athleteId: id }),
    z.object({ type: z.literal('signed-out') }),
    /** Told after a gap: events may have been missed, so ask again for all that is shown. */
    z.object({ type: z.literal('missed') }),
  ])
  .meta({ id: 'LiveEvent' });
export type LiveEvent = z.infer<typeof liveEvent>;

export const eventRoutes = {
  events: route({
    method: 'get',
    path: '/api/events',
    summary:
      'Server-sent events of this practice, as far as this person may see; one stream per tab.',
    audience: 'staff',
    status: 200,
    answer: eventStream,
  }),
};
