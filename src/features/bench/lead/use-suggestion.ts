import { useContext, useMemo } from 'react';
import type { Degrees } from '#shared/geometry/units.ts';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import { BlindContext } from '../blind/blind-context.ts';
import { useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { isDraft } from '../model/draft.ts';
import { firstFrame, type Suggestion } from '../model/first-frames.ts';
import { useReading } from '../reading/use-reading.ts';

export interface NextFrame {
  readonly frame: FrameIndex;
  /** Why, before there is a reading. */
  readonly why: Suggestion['why'] | null;
  /** Lift there, where it is known. */
  readonly lift: Degrees | null;
  /** ± of the reading over all reps, now and with this frame marked. */
  readonly gain: { readonly now: Degrees; readonly then: Degrees } | null;
}

/**
 * The frame worth marking next: what is missing before there is a reading, then the one that would
 * make the reading most certain. Null where another frame would not help.
 */
export function useNextFrame(): NextFrame | null {
  const { times } = useBenchTools();
  const { current, figures } = useBenchModel();
  const { rules } = useBenchDocument().protocol;
  const { offers, result } = useReading();
  const blind = useContext(BlindContext);
  return useMemo(() => {
    if (blind)
      return blind.next === null ? null : { frame: blind.next, why: null, lift: null, gain: null };
    if (!current || current.rep.excluded || isDraft(current)) return null;
    const { startFrame, endFrame } = current.rep;
    const used = result?.reps.some((each) => each.id === current.rep.id && each.used) ?? false;
    const first = used
      ? null
      : firstFrame(
          [frameIndex(startFrame), frameIndex(endFrame)],
          times,
          current.frames,
          current.hill,
          rules,
        );
    if (first) return { frame: first.frame, why: first.why, lift: null, gain: null };
    const offer = offers.find((each) => each.rep === current.rep.id);
    if (!offer) return null;
    const { halfWidthNow: now, halfWidthThen: then } = offer;
    return {
      frame: offer.frame,
      why: null,
      lift: offer.lift,
      // the gain is a figure too: it is not shown before the call by eye
      gain: figures && now !== null && then !== null ? { now, then } : null,
    };
  }, [blind, current, figures, offers, result, rules, times]);
}
