import * as z from 'zod';
import { coordinate, frameIndex, framePoint, id, moment, personRef, text } from './primitives.ts';
import { json, none, route } from './route.ts';

/** Corners that a stroke may have. */
export const LONGEST_STROKE = 200;

/** Drawn on the picture by hand, in pixels of the upright source frame. */
const drawnShapes = [
  z.object({ kind: z.literal('point'), u: coordinate, v: coordinate }),
  z.object({
    kind: z.literal('ring'),
    u: coordinate,
    v: coordinate,
    radius: z.number().min(2).max(5000),
  }),
  /** Corner to corner. */
  z.object({
    kind: z.literal('stroke'),
    points: z.array(framePoint).min(2).max(LONGEST_STROKE),
  }),
] as const;

/**
 * What a comment points at. An angle is never laid freely: it is a measure of the registry by its id, worked out
 * with its ± from the marks of the comment's frame whenever it is shown.
 */
export const shape = z
  .discriminatedUnion('kind', [
    ...drawnShapes,
    z.object({ kind: z.literal('measure'), measure: z.string().min(1).max(60) }),
  ])
  .meta({ id: 'Shape' });
export type Shape = z.infer<typeof shape>;

/** The same as the athlete's link shows it: a measure comes worked out. */
export const shownShape = z
  .discriminatedUnion('kind', [
    ...drawnShapes,
    z.object({
      kind: z.literal('measured'),
      u: coordinate,
      v: coordinate,
      label: z.string(),
      text: z.string(),
    }),
  ])
  .meta({ id: 'ShownShape' });
export type ShownShape = z.infer<typeof shownShape>;

export const commentBody = z
  .object({
    body: text(2000),
    /** First and last frame that it speaks of, both inclusive; equal for a single frame. */
    fromFrame: frameIndex,
    toFrame: frameIndex,
    shape: shape.nullable().default(null),
    /** Set for an answer; it then stands at the moment of the comment it answers. */
    answerTo: id.nullable().default(null),
    /** Shown to the athlete on a replay. */
    shared: z.boolean().default(false),
  })
  .refine((value) => value.toFrame >= value.fromFrame, {
    path: ['toFrame'],
    message: 'A span ends where it starts, or later.',
  })
  .refine(({ shape, fromFrame, toFrame }) => shape?.kind !== 'measure' || fromFrame === toFrame, {
    path: ['shape'],
    message: 'A measure is taken on one frame.',
  })
  .meta({ id: 'CommentBody' });

export const comment = z
  .object({
    id,
    clipId: id,
    answerTo: id.nullable(),
    body: z.string(),
    fromFrame: frameIndex,
    toFrame: frameIndex,
    shape: shape.nullable(),
    shared: z.boolean(),
    by: personRef,
    at: moment,
    editedAt: moment.nullable(),
    resolved: z.object({ by: personRef, at: moment }).nullable(),
    mine: z.boolean(),
  })
  .meta({ id: 'Comment' });
export type Comment = z.infer<typeof comment>;

export const commentEdit = z
  .object({ body: text(2000), shared: z.boolean(), resolved: z.boolean() })
  .partial()
  .meta({ id: 'CommentEdit' });

const params = z.object({ id });

export const commentRoutes = {
  listComments: route({
    method: 'get',
    path: '/api/clips/:id/comments',
    summary: 'The comments of a clip, by moment, answers behind what they answer.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(comment) })),
    problems: ['not-found'],
  }),
  addComment: route({
    method: 'post',
    path: '/api/clips/:id/comments',
    summary:
      'Comment at a frame or a span, with a point, a ring or a stroke on the picture or a measure of its frame, or answer.',
    audience: 'staff',
    params,
    body: commentBody,
    status: 201,
    answer: json(comment),
    problems: ['not-found', 'not-allowed', 'frame-out-of-range'],
  }),
  editComment: route({
    method: 'patch',
    path: '/api/comments/:id',
    summary: 'Change one’s own words, share or unshare, resolve or reopen.',
    audience: 'staff',
    params,
    body: commentEdit,
    status: 200,
    answer: json(comment),
    problems: ['not-found', 'not-allowed'],
  }),
  deleteComment: route({
    method: 'delete',
    path: '/api/comments/:id',
    summary: 'Take back one’s own comment, as long as nobody has answered it.',
    audience: 'staff',
    params,
    status: 204,
    answer: none,
    problems: ['not-found', 'not-allowed', 'not-as-it-stands'],
  }),
};
