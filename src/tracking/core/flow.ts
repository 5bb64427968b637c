import { align } from './align.ts';
import { type Level, type Pyramid, toLevelX, toLevelY } from './pyramid.ts';
import { makeTemplate } from './template.ts';
import { atPlace } from './warp.ts';

export interface Place {
  readonly x: number;
  readonly y: number;
}

/** How far one level may correct the guess of the coarser one, pixels of that level. */
const REACH = 8;

const stepOn = (from: Level, to: Level, at: Place, guess: Place, radius: number): Place | null => {
  const template = makeTemplate(
    from.plane,
    atPlace(toLevelX(from, at.x), toLevelY(from, at.y)),
    radius,
    'move',
  );
  const start = atPlace(toLevelX(to, guess.x), toLevelY(to, guess.y));
  const found = align(to.plane, template, start, REACH, 8);
  if (!found) return null;
  return {
    x: guess.x + (found.warp.tx - start.tx) * to.scale,
    y: guess.y + (found.warp.ty - start.ty) * to.scale,
  };
};

/**
 * Where the surroundings of a place went from one picture to the next, from coarse to fine, from a
 * guess on. A level that cannot tell is passed over; null where the finest cannot.
 */
export const flow = (
  before: Pyramid,
  after: Pyramid,
  at: Place,
  guess: Place,
  radius: number,
  coarsest = before.length - 1,
): Place | null => {
  let place = guess;
  for (let n = coarsest; n >= 0; n -= 1) {
    const from = before[n];
    const to = after[n];
    if (!from || !to) continue;
    const found = stepOn(from, to, at, place, radius);
    if (found) place = found;
    else if (n === 0) return null;
  }
  return place;
};
