import type { ClipWithFrames } from '#shared/contracts/clips.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { Size } from '#src/canvas/viewport.ts';
import type { Tracker } from '#src/tracking/types.ts';
import { openTracker } from '#src/tracking/worker/open-tracker.ts';
import { clipSourceOf } from '#src/api/clip-source.ts';

/** Opens the tracker of a clip, when it is first needed. */
export const openTrackerOf =
  (clip: ClipWithFrames, source: Size, copy: Size, times: readonly Milliseconds[]) =>
  (signal: AbortSignal): Promise<Tracker> =>
    openTracker({ clip: clipSourceOf(clip, copy, times), source }, { signal });
