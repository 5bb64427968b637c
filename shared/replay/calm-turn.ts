import type { OverlayMarks } from '#shared/contracts/replay-parts.ts';
import { localLinear } from '#shared/course/local-linear.ts';
import type { Milliseconds } from '#shared/timing/units.ts';

/** The line breaks where marked frames lie further apart. */
const BREAK_MS = 500;

/**
 * The same marked frames with the turn smoothed over its neighbours, as courses are drawn: one frame alone
 * is uncertain by several degrees, and numbers that jump would say otherwise. Its ± stays that of one frame,
 * which is more than the smoothed one's.
 * @param overlay by rising frame
 */
export const calmTurn = (overlay: OverlayMarks, times: readonly Milliseconds[]): OverlayMarks => {
  const runs: { index: number; time: number; turn: number }[][] = [];
  for (const [index, { frame, turn }] of overlay.entries()) {
    const time = times[frame];
    if (turn === null || time === undefined) continue;
    const last = runs.at(-1)?.at(-1);
    if (last && time - last.time <= BREAK_MS) runs.at(-1)?.push({ index, time, turn });
    else runs.push([{ index, time, turn }]);
  }
  const calm = new Map(
    runs.flatMap((run) => {
      const smooth = localLinear(
        run.map(({ time }) => time),
        run.map(({ turn }) => turn),
      );
      return run.map(({ index, turn }, n) => [index, smooth[n] ?? turn] as const);
    }),
  );
  return overlay.map((each, index) => ({ ...each, turn: calm.get(index) ?? null }));
};
