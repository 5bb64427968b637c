import type { BenchDocument } from '#shared/contracts/bench.ts';
import { NO_BOUNDARIES } from '#shared/contracts/reps.ts';
import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';

/**
 * A second marking as the Bench's parts take it: one rep as long as the clip, with nothing but the second marks. No
 * first mark, moment, comment or call comes with it.
 */
export const blindDocument = ({
  summary,
  clip,
  visit,
  athlete,
  repNumber,
  supportSide,
  view,
  marks,
  protocol,
}: SecondMarkingDocument): BenchDocument => ({
  clip,
  visit,
  athlete: { ...athlete, heightMm: null },
  reps: [
    {
      rep: {
        id: summary.id,
        clipId: clip.id,
        number: repNumber,
        supportSide,
        view,
        startFrame: 0,
        endFrame: Math.max(0, (clip.frames?.count ?? 1) - 1),
        boundaries: NO_BOUNDARIES,
        excluded: null,
        excludedNote: '',
        quietFrom: null,
        liftFrom: null,
        clapFrame: null,
        tieFault: null,
        markedFrames: summary.framesDone,
        version: 1,
      },
      marks,
    },
  ],
  comments: [],
  calls: [],
  assumption: [],
  markErrors: [],
  protocol,
  otherReps: [],
  may: { mark: true, comment: false, markAgain: false },
});
