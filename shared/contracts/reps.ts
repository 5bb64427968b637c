import * as z from 'zod';
import { SHARED_EVENTS } from '#shared/timing/shared-events.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import {
  coordinate,
  frameIndex,
  id,
  moment,
  personRef,
  quantity,
  readonlyList,
  side,
  text,
  version,
  view,
} from './primitives.ts';
import { json, none, route } from './route.ts';

export const exclusion = z
  .enum([
    'touched-support',
    'hopped',
    'foot-pivoted',
    'lost-balance',
    'pain',
    'another-drill',
    'other',
  ])
  .meta({ id: 'Exclusion', description: 'Why a rep does not count; it stays visible.' });
export type Exclusion = z.infer<typeof exclusion>;

/** A moment of a rep: found from the marks, or moved by hand. Null where it is not known yet. */
export const boundary = z
  .object({ frame: frameIndex, by: z.enum(['found', 'hand']) })
  .nullable()
  .meta({ id: 'Boundary' });
export const boundaries = z
  .object({
    /** First and last quiet frame, both inclusive. */
    quietStart: boundary,
    quietEnd: boundary,
    footOff: boundary,
    top: boundary,
    /** Last frame of the plateau at the top, inclusive; the rise ends here. */
    topEnd: boundary,
    footDown: boundary,
  })
  .meta({ id: 'Boundaries' });
export type Boundaries = z.infer<typeof boundaries>;
/** Of a rep of which nothing is known yet. */
export const NO_BOUNDARIES: Boundaries = {
  quietStart: null,
  quietEnd: null,
  footOff: null,
  top: null,
  topEnd: null,
  footDown: null,
};

const sharedEvent = z.enum(SHARED_EVENTS);
const twoEvents = z.tuple([sharedEvent, sharedEvent]).readonly();
const time = quantity<Milliseconds>('Milliseconds.');

/** Why two clips are not taken as showing the same moment. */
export const tieFault = z
  .discriminatedUnion('code', [
    z.object({ code: z.literal('few-shared-events'), have: readonlyList(sharedEvent) }),
    z.object({ code: z.literal('events-out-of-order'), events: twoEvents }),
    z.object({
      code: z.literal('durations-differ'),
      events: twoEvents,
      own: time,
      other: time,
      allowed: time,
    }),
    z.object({ code: z.literal('not-a-pair') }),
  ])
  .meta({ id: 'TieFault' });

export const rep = z
  .object({
    id,
    clipId: id,
    /** Counts from 1 in the order of the clip. */
    number: z.int(),
    supportSide: side,
    /** From the clip's camera and this rep's support side. */
    view,
    /** Bounds in the clip, both inclusive. */
    startFrame: frameIndex,
    endFrame: frameIndex,
    boundaries,
    excluded: exclusion.nullable(),
    excludedNote: z.string(),
    markedFrames: z.int(),
    /** The rep of this clip and side whose quiet stance this one takes (marching); null: its own. */
    quietFrom: id.nullable(),
    /** The rep of a side clip of this visit, filmed at the same time, whose lift this front rep takes. */
    liftFrom: id.nullable(),
    /** A clap that another clip shows too. */
    clapFrame: frameIndex.nullable(),
    /** Why the lift of `liftFrom` is not taken. */
    tieFault: tieFault.nullable(),
    version,
  })
  .meta({ id: 'Rep' });
export type Rep = z.infer<typeof rep>;

export const repBody = z
  .object({ supportSide: side, startFrame: frameIndex, endFrame: frameIndex })
  .refine((value) => value.endFrame > value.startFrame, {
    path: ['endFrame'],
    message: 'A rep ends after it starts.',
  })
  .meta({ id: 'RepBody' });

/** In an edit, a moment that is named is set by hand; null gives it back to what the marks say. */
const handBoundary = frameIndex.nullable().optional();
export const repEdit = z
  .object({
    supportSide: side.optional(),
    startFrame: frameIndex.optional(),
    endFrame: frameIndex.optional(),
    boundaries: z
      .object({
        quietStart: handBoundary,
        quietEnd: handBoundary,
        footOff: handBoundary,
        top: handBoundary,
        topEnd: handBoundary,
        footDown: handBoundary,
      })
      .optional(),
    excluded: exclusion.nullable().optional(),
    excludedNote: text(300, 0).optional(),
    quietFrom: id.nullable().optional(),
    liftFrom: id.nullable().optional(),
    clapFrame: frameIndex.nullable().optional(),
    version,
  })
  .meta({ id: 'RepEdit' });

export const landmarkId = z
  .string()
  .regex(/^[a-z]+(-[a-z]+)*$/)
  .max(40)
  .meta({ id: 'LandmarkId', description: 'One of the landmarks listed on the method page.' });

/** One landmark on one frame. `u` and `v` are null where it is marked hidden. */
export const mark = z
  .object({
    frame: frameIndex,
    landmark: landmarkId,
    u: z.number().nullable(),
    v: z.number().nullable(),
    hidden: z.boolean(),
    source: z.enum(['hand', 'tracked']),
    /** True for a hand mark and for a tracked one that a person has looked at. */
    looked: z.boolean(),
    /** 0–1 for a tracked mark, null for a hand mark. */
    confidence: z.number().nullable(),
    /** Long edge, px, of the picture on which it was placed; coarser pictures cost certainty. */
    pictureLongEdge: z.int(),
    /** Counts changes of this landmark on this frame, from 1. */
    revision: z.int(),
    by: personRef,
    at: moment,
  })
  .meta({ id: 'Mark' });
export type Mark = z.infer<typeof mark>;

/**
 * One change of one mark. `id` is made by the client: sending the same command again does nothing.
 * `baseRevision` is the revision that the hand saw (0: none). Where the stored one is newer, the command is
 * answered with `conflict` and the stored mark, and nothing changes.
 */
export const markCommand = z
  .object({
    id,
    frame: frameIndex,
    landmark: landmarkId,
    baseRevision: z.int().min(0),
    set: z.discriminatedUnion('to', [
      z.object({
        to: z.literal('point'),
        u: coordinate,
        v: coordinate,
        source: z.enum(['hand', 'tracked']).default('hand'),
        looked: z.boolean().default(true),
        confidence: z.number().min(0).max(1).nullable().default(null),
        pictureLongEdge: z.int().min(16).max(16_384),
      }),
      z.object({ to: z.literal('hidden') }),
      z.object({ to: z.literal('none') }),
    ]),
  })
  .meta({ id: 'MarkCommand' });
export type MarkCommand = z.infer<typeof markCommand>;

export const markOutcome = z
  .object({
    id,
    outcome: z.enum(['applied', 'already-applied', 'conflict']),
    /** What is stored now; null where nothing is. */
    mark: mark.nullable(),
    revision: z.int(),
  })
  .meta({ id: 'MarkOutcome' });
export type MarkOutcome = z.infer<typeof markOutcome>;

const params = z.object({ id });

export const repRoutes = {
  listReps: route({
    method: 'get',
    path: '/api/clips/:id/reps',
    summary: 'The reps of a clip, in order.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(rep) })),
    problems: ['not-found'],
  }),
  addRep: route({
    method: 'post',
    path: '/api/clips/:id/reps',
    summary: 'Name a span of the clip as a rep, with the leg stood on.',
    audience: 'staff',
    params,
    body: repBody,
    status: 201,
    answer: json(rep),
    problems: ['not-found', 'not-allowed', 'clip-not-ready', 'clip-refused', 'frame-out-of-range'],
  }),
  editRep: route({
    method: 'patch',
    path: '/api/reps/:id',
    summary: 'Move a moment, change the side, leave the rep out with a reason or take it in again.',
    audience: 'staff',
    params,
    body: repEdit,
    status: 200,
    answer: json(rep),
    problems: [
      'not-found',
      'not-allowed',
      'edited-meanwhile',
      'boundaries-out-of-order',
      'frame-out-of-range',
    ],
  }),
  deleteRep: route({
    method: 'delete',
    path: '/api/reps/:id',
    summary: 'Delete a rep with its marks.',
    audience: 'staff',
    params,
    status: 204,
    answer: none,
    problems: ['not-found', 'not-allowed'],
  }),
  listMarks: route({
    method: 'get',
    path: '/api/reps/:id/marks',
    summary: 'Every mark of a rep, by frame.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(mark) })),
    problems: ['not-found'],
  }),
  saveMarks: route({
    method: 'post',
    path: '/api/reps/:id/marks',
    summary:
      'Set, hide or remove marks, many at once. Each command is done or answered with a conflict.',
    audience: 'staff',
    params,
    body: z.object({ commands: z.array(markCommand).min(1).max(5000) }).meta({ id: 'SaveMarks' }),
    status: 200,
    answer: json(z.object({ outcomes: z.array(markOutcome), rep })),
    problems: ['not-found', 'not-allowed', 'landmark-not-in-view', 'frame-out-of-range'],
  }),
};
