import * as z from 'zod';
import { clipWithFrames } from './clips.ts';
import { coordinate, frameIndex, id, moment, personRef, side, view } from './primitives.ts';
import { READING_CODES } from '#shared/reading/types.ts';
import { landmarkId, mark, markOutcome } from './reps.ts';
import { protocolRef, readingRules } from './protocol.ts';
import { json, none, route } from './route.ts';

/** A second marking as lists show it; nothing of any mark. */
export const secondMarkingSummary = z
  .object({
    id,
    repId: id,
    marker: personRef,
    askedBy: personRef,
    askedAt: moment,
    openedAt: moment.nullable(),
    finishedAt: moment.nullable(),
    /** Frames asked for, and how many of them are whole. */
    frames: z.int(),
    framesDone: z.int(),
    /** The one who asks may go on with it. */
    mine: z.boolean(),
  })
  .meta({ id: 'SecondMarkingSummary' });
export type SecondMarkingSummary = z.infer<typeof secondMarkingSummary>;

const typical = z.number().nullable();

/** How well marks repeat: typical error √(Σd²/2n) of one coordinate. Null is unknown. */
export const markRepeat = z
  .object({
    frames: z.int(),
    marks: z.int(),
    /** Of anatomical landmarks: px of the source, and mm where the scale is known. */
    px: typical,
    mm: typical,
    /** Every landmark marked twice, the one that repeats worst first. */
    landmarks: z.array(
      z.object({ landmark: landmarkId, marks: z.int(), px: z.number(), mm: typical }),
    ),
  })
  .meta({ id: 'MarkRepeat' });
export type MarkRepeatShape = z.infer<typeof markRepeat>;

/** The agreement of a finished second marking with the first. */
export const secondAgreement = z
  .object({
    repeat: markRepeat,
    /** Whose first marks these were; more than one where hands were mixed. */
    firstBy: z.array(personRef),
    /** Landmarks that one of the two hid and the other placed. */
    hiddenOnce: z.int(),
    /** Readings of these frames alone; null where one of them cannot be made. */
    readings: z.object({ first: z.enum(READING_CODES), second: z.enum(READING_CODES) }).nullable(),
  })
  .meta({ id: 'SecondAgreement' });
export type SecondAgreement = z.infer<typeof secondAgreement>;

/**
 * What the blind page needs. It never holds a first mark, nor anything that follows from one: no course, no
 * boundary, no value.
 */
export const secondMarking = z
  .object({
    summary: secondMarkingSummary,
    athlete: personRef,
    visit: z.object({ id, day: z.iso.date() }),
    clip: clipWithFrames,
    repNumber: z.int(),
    supportSide: side,
    view,
    /** In the order in which they are to be marked. */
    frames: z.array(z.object({ frame: frameIndex, landmarks: z.array(landmarkId) })),
    /** The protocol as it stands, for the lines that are drawn. */
    protocol: protocolRef.extend({ rules: readingRules }),
    /** The second marks so far. */
    marks: z.array(mark),
    /** Null while it is open. */
    agreement: secondAgreement.nullable(),
  })
  .meta({ id: 'SecondMarking' });
export type SecondMarkingDocument = z.infer<typeof secondMarking>;

/** One change of one second mark; works as a marking command does. Only a hand places them. */
export const secondMarkCommand = z
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
        pictureLongEdge: z.int().min(16).max(16_384),
      }),
      z.object({ to: z.literal('hidden') }),
      z.object({ to: z.literal('none') }),
    ]),
  })
  .meta({ id: 'SecondMarkCommand' });
export type SecondMarkCommand = z.infer<typeof secondMarkCommand>;

export const secondMarkingBody = z
  .object({
    /** Who is asked; whoever asks, where it is left out. */
    markerId: id.nullable().default(null),
    /** Marked frames of the rep; chosen by the product where they are left out. */
    frames: z
      .array(frameIndex)
      .min(1, 'Choose at least one frame.')
      .max(60, 'At most 60 frames.')
      .nullable()
      .default(null),
  })
  .meta({ id: 'SecondMarkingBody' });

const params = z.object({ id });

export const secondMarkingRoutes = {
  listSecondMarkings: route({
    method: 'get',
    path: '/api/reps/:id/second-markings',
    summary: 'The second markings of a rep, newest first, and who may be asked for one.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(
      z.object({
        items: z.array(secondMarkingSummary),
        people: z.array(personRef),
        /** Frames with a mark placed by hand, from which one can choose. */
        markedFrames: z.array(frameIndex),
      }),
    ),
    problems: ['not-found'],
  }),
  startSecondMarking: route({
    method: 'post',
    path: '/api/reps/:id/second-markings',
    summary: 'Have frames of a rep marked again, blind, by oneself or by another.',
    audience: 'staff',
    params,
    body: secondMarkingBody,
    status: 201,
    answer: json(secondMarkingSummary),
    problems: [
      'not-found',
      'not-allowed',
      'nothing-to-mark-again',
      'second-marking-open',
      'marker-cannot-see',
    ],
  }),
  secondMarking: route({
    method: 'get',
    path: '/api/second-markings/:id',
    summary: 'A second marking: its frames in their order, without anything of the first marks.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(secondMarking),
    problems: ['not-found', 'not-allowed'],
  }),
  saveSecondMarks: route({
    method: 'post',
    path: '/api/second-markings/:id/marks',
    summary: 'Set, hide or remove second marks. Each command is done or answered with a conflict.',
    audience: 'staff',
    params,
    body: z
      .object({ commands: z.array(secondMarkCommand).min(1).max(1000) })
      .meta({ id: 'SaveSecondMarks' }),
    status: 200,
    answer: json(z.object({ outcomes: z.array(markOutcome), summary: secondMarkingSummary })),
    problems: ['not-found', 'not-allowed', 'not-asked-here', 'second-marking-finished'],
  }),
  finishSecondMarking: route({
    method: 'post',
    path: '/api/second-markings/:id/finish',
    summary: 'Finish a second marking and learn how well the two agree.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(secondMarking),
    problems: ['not-found', 'not-allowed', 'second-marks-missing'],
  }),
  discardSecondMarking: route({
    method: 'delete',
    path: '/api/second-markings/:id',
    summary: 'Give up a second marking that is not finished, with its marks.',
    audience: 'staff',
    params,
    status: 204,
    answer: none,
    problems: ['not-found', 'not-allowed', 'second-marking-finished'],
  }),
};
