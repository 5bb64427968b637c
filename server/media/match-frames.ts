import { divide } from './rational.ts';
import type { FrameTable } from './types.ts';

/** How the decoded frames of a copy stand against the frames that the original promised. */
export interface FrameMatch {
  /** place in the promised list of the copy's frame 0 */
  readonly first: number;
  /** places in the promised list, after `first`, of frames that the copy lacks */
  readonly lost: readonly number[];
}

/**
 * Compares exact instants, so a copy whose times are a single tick off matches nothing.
 *
 * @param promised ticks of the original, ascending
 * @param copy its first frame stands at 0
 * @returns null where some frame of the copy stands at no instant of the original
 */
export function matchFrames(
  promised: readonly number[],
  timeBase: FrameTable['timeBase'],
  copy: FrameTable,
): FrameMatch | null {
  const { num, den } = divide(copy.timeBase, timeBase);
  const times = copy.ticks.map((tick) => (tick * num) / den);
  if (times.some((time) => !Number.isInteger(time)) || times[0] !== 0) return null;
  // frames may be lost at the very start, where they lean on pictures that were never sent
  for (let first = 0; first + times.length <= promised.length; first += 1) {
    const lost = lostFrom(promised, first, times);
    if (lost) return { first, lost };
  }
  return null;
}

function lostFrom(
  promised: readonly number[],
  first: number,
  times: readonly number[],
): number[] | null {
  const lost: number[] = [];
  let next = 0;
  for (let place = first; place < promised.length; place += 1) {
    const time = (promised[place] ?? NaN) - (promised[first] ?? NaN);
    const wanted = times[next];
    if (time === wanted) next += 1;
    else if (wanted === undefined || time < wanted) lost.push(place);
    else return null;
  }
  return next === times.length ? lost : null;
}
