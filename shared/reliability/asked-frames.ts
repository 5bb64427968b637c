import type { FramePhase } from '#shared/course/types.ts';
import type { Gates } from '#shared/protocol/protocol.ts';

/** A frame to be marked again and the landmarks that are asked for on it. */
export interface AskedFrame {
  readonly frame: number;
  readonly landmarks: readonly string[];
}

/** A marked frame of the first marking, with what its course says of it. */
export interface MarkableFrame {
  readonly frame: number;
  readonly phase: FramePhase | null;
  /** Degrees; null where it is unknown. */
  readonly lift: number | null;
}

/**
 * How many frames are asked for where nobody chooses: three of quiet stance and seven of the rise are the fewest
 * from which a reading can be made, so that two markings of them can be read and compared.
 */
export const ASKED_QUIET = 3;
export const ASKED_NEAR_FROM = 4;
export const ASKED_NEAR_TO = 3;
export const ASKED_FRAMES = ASKED_QUIET + ASKED_NEAR_FROM + ASKED_NEAR_TO;

/** Spread over a list, first and last included. */
const spread = <T>(list: readonly T[], count: number): T[] => {
  if (list.length <= count) return [...list];
  const step = (list.length - 1) / Math.max(1, count - 1);
  return Array.from({ length: count }, (_, n) => list[Math.round(n * step)]).flatMap((one) =>
    one === undefined ? [] : [one],
  );
};

const nearest = (
  frames: readonly MarkableFrame[],
  lift: number,
  count: number,
): readonly MarkableFrame[] =>
  [...frames]
    .sort((a, b) => Math.abs((a.lift ?? Infinity) - lift) - Math.abs((b.lift ?? Infinity) - lift))
    .slice(0, count);

/**
 * Which frames of a rep to mark again: of the quiet stance and near either gate of the rise; what is missing there is
 * filled up from the rest, evenly.
 * @returns frame numbers in the order of the clip, at most `ASKED_FRAMES`
 */
export const chooseFrames = (frames: readonly MarkableFrame[], gates: Gates): number[] => {
  const quiet = spread(
    frames.filter(({ phase }) => phase === 'quiet'),
    ASKED_QUIET,
  );
  const rise = frames.filter(({ phase, lift }) => phase === 'rise' && lift !== null);
  const nearFrom = nearest(rise, gates.from, ASKED_NEAR_FROM);
  const nearTo = nearest(
    rise.filter((frame) => !nearFrom.includes(frame)),
    gates.to,
    ASKED_NEAR_TO,
  );
  const chosen = new Set([...quiet, ...nearFrom, ...nearTo]);
  const rest = frames.filter((frame) => !chosen.has(frame));
  for (const frame of spread(rest, ASKED_FRAMES - chosen.size)) chosen.add(frame);
  return [...chosen].map(({ frame }) => frame).sort((a, b) => a - b);
};

/**
 * The same things in an order that says nothing (Fisher and Yates).
 * @param below a random whole number from 0 to below its argument
 */
export const shuffled = <T>(things: readonly T[], below: (limit: number) => number): T[] => {
  const order = [...things];
  for (let last = order.length - 1; last > 0; last -= 1) {
    const other = below(last + 1);
    const [a, b] = [order[last], order[other]];
    if (a === undefined || b === undefined) continue;
    order[last] = b;
    order[other] = a;
  }
  return order;
};
