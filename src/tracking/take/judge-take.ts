import { FILMING_LIMITS as LIMITS } from '#shared/measures/filming-limits.ts';
import { type Seconds, seconds } from '#shared/timing/units.ts';
import { lasting, type Lift, liftsOf } from './lifts.ts';
import { type Movement, movementOf } from './movement.ts';
import { type Answer, cannotTell, type TakePicture, type Unanswered } from './types.ts';

/** What the coarse pictures of a take say of it. */
export interface TakeJudged {
  /** Above the head and below the feet, as shares of the picture's height. */
  readonly head: Answer<{ readonly room: number }>;
  readonly feet: Answer<{ readonly room: number }>;
  /** Standing still right before the first lift. */
  readonly still: Answer<{ readonly seconds: Seconds }>;
  /** The quickest rise, from the first movement to the top, and how many lifts were seen whole. */
  readonly rise: Answer<{ readonly seconds: Seconds; readonly lifts: number }>;
}

/** A body takes up at least so much of the picture's height; legs alone, or somebody far off, do not. */
const LEAST_HEIGHT = 0.4;
/** The rows at the border count as touched from so many cells on, changed so many times the least. */
const TOUCHING_CELLS = 2;
const TOUCHING_CHANGE = 2;

const allUnanswered = (why: Unanswered): TakeJudged => ({
  head: cannotTell(why),
  feet: cannotTell(why),
  still: cannotTell(why),
  rise: cannotTell(why),
});

/** A pale shadow that runs out of the picture is no foot: at the border only clear changes count. */
const touches = ({ grids, changes, from, body }: Movement, row: number): boolean => {
  const columns = grids[0]?.columns ?? 0;
  const cells = Array.from({ length: columns }, (_, column) => row * columns + column);
  const clear = cells.filter(
    (cell) =>
      body.cells[cell] === 1 &&
      changes.some((change) => Math.abs(change[cell] ?? 0) > TOUCHING_CHANGE * from),
  );
  return clear.length >= TOUCHING_CELLS;
};

/**
 * Taking a foot off the floor moves the weight over the other one, and the whole body with it: what moved
 * reaches from the crown to where the lifted foot stood.
 */
const bordersOf = (movement: Movement): Pick<TakeJudged, 'head' | 'feet'> => {
  const { body, grids } = movement;
  const rows = grids[0]?.rows ?? 1;
  const small = (body.bottom - body.top + 1) / rows < LEAST_HEIGHT;
  const answer = (room: number, border: number): TakeJudged['head'] => {
    if (room === 0 && touches(movement, border)) return { told: 'no', room: 0 };
    return small ? cannotTell('too-small') : { told: 'yes', room: room / rows };
  };
  return { head: answer(body.top, 0), feet: answer(rows - 1 - body.bottom, rows - 1) };
};

const stillBefore = ({ before }: Lift, times: readonly Seconds[]): TakeJudged['still'] => {
  const stood = before ? lasting(before, times) : 0;
  return {
    told: stood >= LIMITS.leastStillSeconds.value ? 'yes' : 'no',
    seconds: seconds(stood),
  };
};

/** The picture before the first moved one and the top itself each lie up to one picture off. */
const riseOf = (lifts: readonly Lift[], times: readonly Seconds[]): TakeJudged['rise'] => {
  const rises = lifts.flatMap(({ before, top, whole }) =>
    before && whole ? [lasting({ from: before.to, to: top }, times)] : [],
  );
  if (rises.length === 0) return cannotTell('no-lift');
  const quickest = Math.min(...rises);
  return {
    told: quickest >= LIMITS.leastRiseSeconds.value ? 'yes' : 'no',
    seconds: seconds(quickest),
    lifts: rises.length,
  };
};

export interface TakeSeen {
  readonly judged: TakeJudged;
  /** Null where nobody was found in it. */
  readonly movement: Movement | null;
  /** A picture of standing still, by its place among the pictures; null where there is none. */
  readonly stillPicture: number | null;
}

/** Eight to twelve upright pictures a second, in the order of their times. */
export const seeTake = (pictures: readonly TakePicture[]): TakeSeen => {
  const movement = movementOf(pictures);
  if ('told' in movement)
    return { judged: allUnanswered(movement.why), movement: null, stillPicture: null };
  const times = pictures.map(({ at }) => at);
  const found = liftsOf(movement, times);
  const [first] = found?.lifts ?? [];
  if (!found || !first)
    return {
      judged: allUnanswered(found ? 'no-lift' : 'never-still'),
      movement,
      stillPicture: null,
    };
  const { lifts, longest } = found;
  return {
    judged: {
      ...bordersOf(movement),
      still: stillBefore(first, times),
      rise: riseOf(lifts, times),
    },
    movement,
    stillPicture: (longest.from + longest.to) >> 1,
  };
};
