import * as z from 'zod';
import { call } from './calls.ts';
import { clipWithFrames } from './clips.ts';
import { comment } from './comments.ts';
import { frameIndex, id, personRef, side } from './primitives.ts';
import { protocolRef, readingRules } from './protocol.ts';
import { markErrorShape } from './readings.ts';
import { mark, rep } from './reps.ts';
import { json, none, route } from './route.ts';

/** Everything that opening the Bench needs, in one answer; the video comes beside it. */
export const benchDocument = z
  .object({
    clip: clipWithFrames,
    visit: z.object({ id, day: z.iso.date() }),
    athlete: personRef.extend({ heightMm: z.number().nullable() }),
    reps: z.array(z.object({ rep, marks: z.array(mark) })),
    comments: z.array(comment),
    /** Figures of a side are shown only where it has a call. */
    calls: z.array(call),
    /** Sides for which the 'planted thigh turns little' assumption is on. */
    assumption: z.array(side),
    /** By side, the error of one anatomical mark that a reading made now takes. */
    markErrors: z.array(markErrorShape.extend({ side })),
    /** What a reading made now is made with. */
    protocol: protocolRef.extend({ rules: readingRules }),
    /** Other reps of the same visit, for the reading over all reps: their clips and marks. */
    otherReps: z.array(
      z.object({
        clip: clipWithFrames.omit({ frames: true }),
        rep,
        marks: z.array(mark),
        /** When each marked frame, and the one of the clap, is shown, milliseconds from the clip's first. */
        times: z.array(z.object({ frame: frameIndex, milliseconds: z.number() })),
      }),
    ),
    may: z.object({ mark: z.boolean(), comment: z.boolean(), markAgain: z.boolean() }),
  })
  .meta({ id: 'BenchDocument' });
export type BenchDocument = z.infer<typeof benchDocument>;

export const benchRoutes = {
  bench: route({
    method: 'get',
    path: '/api/clips/:id/bench',
    summary: 'A clip with its reps, marks, comments and calls, in one answer.',
    audience: 'staff',
    params: z.object({ id }),
    status: 200,
    answer: json(benchDocument),
    problems: ['not-found'],
  }),
  sayHere: route({
    method: 'post',
    path: '/api/clips/:id/here',
    summary: 'Tell those who may see this clip that one has it open, or has left it. Kept nowhere.',
    audience: 'staff',
    params: z.object({ id }),
    body: z.object({ here: z.boolean() }).meta({ id: 'Here' }),
    status: 204,
    answer: none,
    problems: ['not-found'],
  }),
};
