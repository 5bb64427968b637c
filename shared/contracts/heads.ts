import * as z from 'zod';
import { LEAST_HEAD_PX } from '#shared/head/head-track.ts';
import { coordinate, frameIndex, id, moment, personRef } from './primitives.ts';
import { json, route } from './route.ts';

const edge = z
  .number()
  .min(LEAST_HEAD_PX, `At least ${LEAST_HEAD_PX} pixels: draw a larger box.`)
  .max(40_000);

/** The edge of the picture may cut a box that was followed to be narrower than any that is drawn. */
const cutEdge = z.number().positive().max(40_000);

const drawnHead = z.object({
  frame: frameIndex,
  box: z.object({ left: coordinate, top: coordinate, width: edge, height: edge }),
});
const followedHead = z.object({
  frame: frameIndex,
  box: z.object({ left: coordinate, top: coordinate, width: cutEdge, height: cutEdge }),
  /** 0 to 1; below 0.5 the head counts as lost on that frame. */
  confidence: z.number().min(0).max(1),
});

const stretch = z.object({ from: frameIndex, to: frameIndex });

export const head = z
  .object({
    version: z.int(),
    /** The frames that were looked through for the head, both inclusive. */
    fromFrame: frameIndex,
    toFrame: frameIndex,
    drawn: z.array(drawnHead),
    followed: z.array(followedHead),
    /** By which part of its larger edge the last box grows a frame while the head is lost. */
    growth: z.number(),
    /** Where the head was lost and a grown box covers it. */
    lost: z.array(stretch),
    /** Frames of the clip without any box, which are never published. */
    uncovered: z.array(stretch),
    by: personRef,
    at: moment,
    /** Who looked whether the head is covered; null: nobody yet. */
    looked: z.object({ by: personRef, at: moment }).nullable(),
  })
  .meta({ id: 'Head', description: 'A box around the head, by frame; source pixels.' });
export type Head = z.infer<typeof head>;

/** The clip's box, and what this person may do with it. */
export const headPage = z
  .object({ head: head.nullable(), may: z.object({ save: z.boolean() }) })
  .meta({ id: 'HeadPage' });
export type HeadPage = z.infer<typeof headPage>;

const once = (heads: readonly { frame: number }[]): boolean =>
  new Set(heads.map(({ frame }) => frame)).size === heads.length;

export const headBody = z
  .object({
    /** The version that was changed, 0 for the first; another one made meanwhile is not passed over. */
    after: z.int().min(0),
    fromFrame: frameIndex,
    toFrame: frameIndex,
    drawn: z
      .array(drawnHead)
      .min(1, 'Draw a box around the head on one frame at least.')
      .max(500)
      .refine(once, 'A frame has one box.'),
    followed: z.array(followedHead).max(20_000).refine(once, 'A frame has one box.'),
  })
  .refine(({ fromFrame, toFrame }) => toFrame >= fromFrame, {
    path: ['toFrame'],
    message: 'The span ends after it starts.',
  })
  .meta({ id: 'HeadBody' });

const params = z.object({ id });

export const headRoutes = {
  head: route({
    method: 'get',
    path: '/api/clips/:id/head',
    summary: 'The box around the head of a clip as it stands, and who looked at it.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(headPage),
    problems: ['not-found'],
  }),
  saveHead: route({
    method: 'post',
    path: '/api/clips/:id/head',
    summary:
      'A new version of the box. Replays that hide the head show nothing until somebody has looked at it.',
    audience: 'staff',
    params,
    body: headBody,
    status: 201,
    answer: json(headPage),
    problems: [
      'not-found',
      'not-allowed',
      'clip-not-ready',
      'clip-refused',
      'frame-out-of-range',
      'edited-meanwhile',
    ],
  }),
  lookedAtHead: route({
    method: 'post',
    path: '/api/clips/:id/head/looked',
    summary: 'Somebody has looked: the head is covered on every frame of this version.',
    audience: 'staff',
    params,
    body: z.object({ version: z.int().positive() }).meta({ id: 'LookedAtHead' }),
    status: 200,
    answer: json(headPage),
    problems: ['not-found', 'not-allowed', 'edited-meanwhile'],
  }),
};
