import type { OverlayMarks } from '#shared/contracts/replay-parts.ts';
import type { Milliseconds } from '#shared/timing/units.ts';

type MarkedFrame = OverlayMarks[number];

/** Longer gaps between marked frames stay empty: nothing is known of what the body did there. */
const LONGEST_GAP_MS = { moving: 250, still: 500 } as const;
/** No mark moves further than this share of the body's marked height: the body stands still. */
const STILL = 0.04;

const mix = (a: number, b: number, share: number): number => a + share * (b - a);
const mixKnown = (a: number | null, b: number | null, share: number): number | null =>
  a === null || b === null ? null : mix(a, b, share);

const isStill = (a: MarkedFrame, b: MarkedFrame): boolean => {
  const heights = a.marks.map(({ v }) => v);
  const reach = STILL * (Math.max(...heights) - Math.min(...heights));
  return a.marks.every(({ landmark, u, v }) => {
    const there = b.marks.find((mark) => mark.landmark === landmark);
    return !there || Math.hypot(there.u - u, there.v - v) <= reach;
  });
};

/**
 * Marks and angles to draw on a frame: its own, or on a straight line between the marked frames around
 * it. For the eye only; nothing is computed from it. Null where no mark is near.
 * @param overlay by rising frame
 */
export const frameBetween = (
  overlay: OverlayMarks,
  times: readonly Milliseconds[],
  frame: number,
): MarkedFrame | null => {
  const next = overlay.findIndex((each) => each.frame >= frame);
  const after = next < 0 ? undefined : overlay[next];
  if (after?.frame === frame) return after;
  const before = next < 0 ? undefined : overlay[next - 1];
  if (!before || !after) return null;
  const [from, to, now] = [times[before.frame], times[after.frame], times[frame]];
  if (from === undefined || to === undefined || now === undefined) return null;
  if (to - from > LONGEST_GAP_MS[isStill(before, after) ? 'still' : 'moving']) return null;
  const share = (now - from) / (to - from);
  return {
    frame,
    marks: before.marks.flatMap((mark) => {
      const there = after.marks.find(({ landmark }) => landmark === mark.landmark);
      return there
        ? [
            {
              landmark: mark.landmark,
              u: mix(mark.u, there.u, share),
              v: mix(mark.v, there.v, share),
              looked: mark.looked && there.looked,
            },
          ]
        : [];
    }),
    lift: mixKnown(before.lift, after.lift, share),
    liftPlusMinus: mixKnown(before.liftPlusMinus, after.liftPlusMinus, share),
    turn: mixKnown(before.turn, after.turn, share),
    turnPlusMinus: mixKnown(before.turnPlusMinus, after.turnPlusMinus, share),
  };
};
