import * as z from 'zod';
import { landmarkId } from './reps.ts';
import { frameTable } from './clips.ts';
import { frameIndex, view } from './primitives.ts';

/** Marks to draw, by frame: only where they stand, not who placed them. Hidden landmarks are left out. */
export const overlayMarks = z
  .array(
    z.object({
      frame: frameIndex,
      marks: z.array(
        z.object({ landmark: landmarkId, u: z.number(), v: z.number(), looked: z.boolean() }),
      ),
      /** Degrees; null where it cannot be told. Each has its ± (95 %) beside it. */
      lift: z.number().nullable(),
      liftPlusMinus: z.number().nullable(),
      turn: z.number().nullable(),
      turnPlusMinus: z.number().nullable(),
    }),
  )
  .meta({ id: 'OverlayMarks' });
export type OverlayMarks = z.infer<typeof overlayMarks>;

/** The course of the rep that is played: turn against lift, degrees, in the order of the frames. */
export const replayCourse = z
  .object({
    frames: z.array(frameIndex),
    lift: z.array(z.number().nullable()),
    turn: z.array(z.number().nullable()),
  })
  .meta({ id: 'ReplayCourse' });

/** Frames to stop at; null where the rep has no such moment. */
export const replayMoments = z
  .object({
    quiet: frameIndex.nullable(),
    /** Where the thigh passes either gate. */
    from: frameIndex.nullable(),
    to: frameIndex.nullable(),
    top: frameIndex.nullable(),
  })
  .meta({ id: 'ReplayMoments' });

/** While a film is being prepared, or where that failed, there is no picture at all. */
export const publicHead = z
  .enum(['shown', 'hidden', 'being-prepared', 'failed'])
  .meta({ id: 'PublicHead' });

/** Moments of two lifts at which the thigh is as high in both, to one frame's step: first rising, then lowering. */
export const matchedFrames = z
  .object({
    before: z.array(frameIndex),
    now: z.array(frameIndex),
    /** Degrees; null where the link tells no angle. */
    lift: z.array(z.number().nullable()),
    /** How many of them belong to the rise. */
    rising: z.int(),
  })
  .meta({ id: 'MatchedFrames' });
export type MatchedFrames = z.infer<typeof matchedFrames>;

/** An earlier lift of the same side. */
export const earlierLift = z
  .object({
    visitDay: z.iso.date(),
    view,
    /** Size of the upright source frame, px. */
    width: z.int(),
    height: z.int(),
    frames: frameTable,
    head: publicHead,
    moments: replayMoments,
    overlay: overlayMarks,
    matched: matchedFrames,
  })
  .meta({ id: 'EarlierLift' });
export type EarlierLift = z.infer<typeof earlierLift>;
