import * as z from 'zod';
import { landmarkId } from './reps.ts';
import { frameIndex } from './primitives.ts';

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
