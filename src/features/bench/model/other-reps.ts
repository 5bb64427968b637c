import type { BenchDocument } from '#shared/contracts/bench.ts';
import { repInputOf } from '#shared/records/engine-input.ts';
import { withSharedQuiet } from '#shared/records/shared-quiet.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import type { Tying } from '#shared/records/tied-lifts.ts';
import { type Milliseconds, milliseconds } from '#shared/timing/units.ts';

/** Reps of the visit's other clips, as the document brings them. */
export const otherReps = ({ otherReps: others, athlete }: BenchDocument): Tying[] =>
  withSharedQuiet(
    others.map(({ clip, rep, marks, times }) => {
      const byFrame: Milliseconds[] = [];
      for (const { frame, milliseconds: at } of times) byFrame[frame] = milliseconds(at);
      const input = repInputOf({
        rep,
        clip,
        times: byFrame,
        marks: marksWith(marks, []),
        bodyHeightMm: athlete.heightMm,
      });
      const clap = rep.clapFrame === null ? null : (byFrame[rep.clapFrame] ?? null);
      const { quietFrom, liftFrom } = rep;
      return { input, clipId: clip.id, quietFrom, liftFrom, clap };
    }),
  );
