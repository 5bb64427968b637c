import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import type { FrameTable } from '#shared/contracts/clips.ts';
import type { MarkCommand } from '#shared/contracts/reps.ts';
import { trialOf, type Trial } from '#shared/evaluate/trial.ts';
import type { ClipGeometry } from '#server/features/clips/clip.entity.ts';

/** From the femur's axis to the skin, mm: what the product adds to a thigh pointer's length. */
const AXIS_TO_SKIN_MM = 55;

/** A trial of known truth as a coach would have entered it. */
export interface GoldenClip {
  readonly trial: Trial;
  readonly width: number;
  readonly height: number;
  readonly geometry: ClipGeometry;
  readonly frames: FrameTable;
  readonly reps: readonly {
    readonly startFrame: number;
    readonly endFrame: number;
    readonly commands: readonly MarkCommand[];
  }[];
}

/** Frame n of the trial files is shown at n / 60 s; their marked times are that, rounded. */
const TICKS_PER_SECOND = 60;

/** @param name of a file in tests/fixtures/golden, without its ending */
export const goldenClip = (name: string): GoldenClip => {
  const file = new URL(`../fixtures/golden/${name}.json`, import.meta.url);
  const trial = trialOf(JSON.parse(readFileSync(file, 'utf8')));
  const camera = trial.reps[0]?.camera;
  if (!camera?.mmPerPx) throw new Error(`${name} has no camera.`);
  const { width, height, thighPointerMm } = camera;
  const last = Math.max(...trial.reps.flatMap((rep) => rep.frames.map(({ frame }) => frame)));
  return {
    trial,
    width,
    height,
    geometry: {
      scale: { from: 'typed', mmPerPx: camera.mmPerPx },
      distanceMm: camera.distanceMm,
      lensHeightMm: camera.lensHeightMm,
      beltPointerMm: camera.beltPointerMm,
      thighPointerMm: thighPointerMm === null ? null : thighPointerMm - AXIS_TO_SKIN_MM,
      plumb: null,
      floorLine: null,
      shutter: null,
    },
    frames: {
      count: last + 1,
      timeBase: { num: 1, den: TICKS_PER_SECOND },
      ticks: Array.from({ length: last + 1 }, (_, index) => index),
    },
    reps: trial.reps.map(({ frames }) => ({
      startFrame: frames[0]?.frame ?? 0,
      endFrame: frames.at(-1)?.frame ?? 0,
      commands: frames.flatMap(({ frame, marks }) =>
        Object.entries(marks).map(([landmark, mark]) => ({
          id: randomUUID(),
          frame,
          landmark,
          baseRevision: 0,
          set: mark.hidden
            ? { to: 'hidden' as const }
            : {
                to: 'point' as const,
                ...mark.point,
                source: 'hand' as const,
                looked: true,
                confidence: null,
                pictureLongEdge: Math.max(width, height),
              },
        })),
      ),
    })),
  };
};
