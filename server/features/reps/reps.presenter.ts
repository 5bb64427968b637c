import type { FrameTable } from '#shared/contracts/clips.ts';
import type { Rep as RepShape } from '#shared/contracts/reps.ts';
import type { RepInput } from '#shared/course/types.ts';
import type { FrameInput } from '#shared/measures/inputs.ts';
import type { TiedLift } from '#shared/measures/tied-lift.ts';
import type { RepTieFault } from '#shared/records/tied-lifts.ts';
import { type MeasuredClip, repInputOf, timesOf } from '#shared/records/engine-input.ts';
import { mmPerPxOf } from '#shared/records/scale.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import { viewOf } from '#shared/records/views.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { type MarkRow, presentMark } from '../marks/mark-store.ts';
import { boundariesOf, byHand } from './found-boundaries.ts';
import type { Rep } from './rep.entity.ts';

/** What the engine needs to know of a stored clip. */
export const measuredClip = (clip: Clip): MeasuredClip => ({
  width: clip.width ?? null,
  height: clip.height ?? null,
  geometry: clip.geometry,
  mmPerPx: mmPerPxOf(clip.geometry.scale),
  frameRate: clip.frameRate ?? null,
  mirrored: clip.mirrored,
  cameraStood: clip.cameraStood,
});

/** A rep, its clip, its marks and the person's height. */
export interface StoredRep {
  readonly rep: Rep;
  readonly clip: Clip;
  readonly marks: readonly MarkRow[];
  readonly bodyHeightMm: number | null;
  /** Quiet stance taken from another rep of the clip; none where left out. */
  readonly sharedQuiet?: readonly FrameInput[] | null;
  /** Lift taken from the rep of a side clip, or why it is not; none where left out. */
  readonly liftFrom?: TiedLift | undefined;
  readonly tieFault?: RepTieFault | null;
}

/** The clip's exact times; empty until it is prepared. */
export const timesOfClip = (clip: Clip): Milliseconds[] => {
  const table: FrameTable | null = clip.frames.unwrap() ?? null;
  return table ? timesOf(table) : [];
};

/** A stored rep as the engine takes it; null until the clip is prepared. */
export const repInput = (stored: StoredRep, times: readonly Milliseconds[]): RepInput | null => {
  const { rep, clip, marks, bodyHeightMm, sharedQuiet = null, liftFrom } = stored;
  const input = repInputOf({
    rep: {
      id: rep.id,
      supportSide: rep.supportSide,
      view: viewOf(clip.cameraStood, rep.supportSide),
      boundaries: byHand(rep.handBoundaries),
      excluded: rep.excluded ?? null,
    },
    clip: measuredClip(clip),
    times,
    marks: marksWith(marks.map(presentMark), []),
    bodyHeightMm,
  });
  return input && { ...input, sharedQuiet, ...(liftFrom && { liftFrom }) };
};

/** @param number its place in the clip, from 1 */
export const presentRep = (stored: StoredRep, number: number): RepShape => {
  const { rep, clip, marks } = stored;
  const times = timesOfClip(clip);
  return {
    id: rep.id,
    clipId: clip.id,
    number,
    supportSide: rep.supportSide,
    view: viewOf(clip.cameraStood, rep.supportSide),
    startFrame: rep.startFrame,
    endFrame: rep.endFrame,
    boundaries: boundariesOf(repInput(stored, times), times, rep.handBoundaries),
    excluded: rep.excluded ?? null,
    excludedNote: rep.excludedNote,
    quietFrom: rep.quietFrom ?? null,
    liftFrom: rep.liftFrom ?? null,
    clapFrame: rep.clapFrame ?? null,
    tieFault: stored.tieFault ?? null,
    markedFrames: new Set(marks.map(({ frame }) => frame)).size,
    version: rep.version,
  };
};
