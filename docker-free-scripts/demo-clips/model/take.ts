import { bodyOf, type ClipPlan } from '../clips.ts';
import { frameTimes } from '../film/timing.ts';
import { planTake, type RepPlan, takeSeconds } from './script.ts';
import { poseSkeleton, type Skeleton } from './skeleton.ts';
import { type Stance, stanceOver } from './stance.ts';
import { TURN_SHAPES } from './turn-shapes.ts';

/** A whole clip's movement: the posture at any moment, and when the pictures are taken. */
export interface Take {
  readonly clip: ClipPlan;
  readonly reps: readonly RepPlan[];
  readonly timesMs: readonly number[];
  readonly stanceAt: (seconds: number) => Stance;
  readonly skeletonAt: (seconds: number) => Skeleton;
}

export const makeTake = (clip: ClipPlan): Take => {
  const reps = planTake(clip.script);
  const shapes = { left: TURN_SHAPES[clip.shapes.left], right: TURN_SHAPES[clip.shapes.right] };
  const stanceAt = stanceOver(reps, shapes, clip.habits, clip.script.seed);
  const body = bodyOf(clip);
  return {
    clip,
    reps,
    timesMs: frameTimes(clip, takeSeconds(reps)),
    stanceAt,
    skeletonAt: (seconds) => poseSkeleton(body, stanceAt(seconds)),
  };
};
