import type { Seconds } from '#shared/timing/units.ts';
import { changeBetween, usualOf } from './compare.ts';
import type { Grid } from './grid.ts';
import type { Movement } from './movement.ts';

/** Indices into the take's pictures. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** From standing still over the highest picture to the feet being where they were. */
export interface Lift {
  /** The still stance since the lift before; null: the take begins in the middle of it, or there was none. */
  readonly before: Span | null;
  readonly top: number;
  /** False: the take ends in the middle of it. */
  readonly whole: boolean;
}

/** The share of the body's cells that may change from picture to picture while it stands still: a blink, a breath. */
const STILL = 0.04;
/** A twitch up to this share, in one picture alone, does not end standing still. */
const TWITCH = 0.12;
/** A pause at 60° or at the top is shorter. */
const LEAST_STAND_S = 0.3;
/** The share of the most changed cells from which on it is another posture than standing. */
const LIFTED = 0.35;
/** A lift raises the foot by at least so much of the body's height; a step or a sway does not. */
const LEAST_RISE = 0.06;
const LEAST_LIFT_S = 0.4;

const stillAt = ({ activity }: Movement, n: number): boolean => {
  const now = activity[n] ?? 0;
  const calm = (k: number): boolean => (activity[k] ?? 0) <= STILL;
  return now <= STILL || (now <= TWITCH && calm(n - 1) && calm(n + 1));
};

const stillSpans = (movement: Movement): Span[] => {
  const spans: Span[] = [];
  let from: number | null = null;
  for (let n = 0; n <= movement.grids.length; n += 1) {
    // the first picture has none before it: it is as still as the second
    const still = n < movement.grids.length && stillAt(movement, Math.max(n, 1));
    if (still) from ??= n;
    else if (from !== null) {
      spans.push({ from, to: n - 1 });
      from = null;
    }
  }
  return spans;
};

/** The row above which nine tenths of what moved since the picture before lie: near the moving foot. */
const lowestMoving = ({ changes, from, body, grids }: Movement, n: number): number | null => {
  const change = changes[n - 1];
  const columns = grids[0]?.columns ?? 1;
  if (!change) return null;
  const rows = new Float64Array(body.bottom + 1);
  let all = 0;
  for (const [cell, grey] of change.entries()) {
    if (body.cells[cell] === 0 || Math.abs(grey) <= from) continue;
    const row = Math.floor(cell / columns);
    // squared: the foot's shadow stays on the floor, but is paler than the foot
    rows[row] = (rows[row] as number) + grey * grey;
    all += grey * grey;
  }
  if (all === 0) return null;
  let sum = 0;
  for (let row = body.bottom; row >= body.top; row -= 1) {
    sum += rows[row] as number;
    if (sum >= 0.1 * all) return row;
  }
  return null;
};

/** The picture in which the foot is highest, and by how many rows it rose; null where none moved. */
const topOf = (movement: Movement, { from, to }: Span): { at: number; rows: number } | null => {
  const heights: { n: number; row: number }[] = [];
  for (let n = from; n <= to; n += 1) {
    const row = (movement.activity[n] ?? 0) > STILL / 4 ? lowestMoving(movement, n) : null;
    if (row !== null) heights.push({ n, row });
  }
  const lowest = Math.max(...heights.map(({ row }) => row));
  // between the last weight shift and the first; there the whole body moves, not the foot
  const [first, last] = [
    heights.findIndex(({ row }) => row >= lowest - 3),
    heights.findLastIndex(({ row }) => row >= lowest - 3),
  ];
  const up = heights.slice(first, last + 1);
  if (up.length === 0) return null;
  const highest = Math.min(...up.map(({ row }) => row));
  const near = up.filter(({ row }) => row <= highest + 1);
  const at = near[near.length >> 1]?.n ?? from;
  return { at, rows: lowest - highest };
};

/** How much of the body stands elsewhere than in the still stance, in cells, picture by picture. */
const awayFrom = (still: Grid['cells'], { grids, body, from }: Movement): number[] =>
  grids.map(({ cells }) =>
    changeBetween(still, cells).reduce(
      (sum, grey, cell) => sum + (body.cells[cell] === 1 && Math.abs(grey) > from ? 1 : 0),
      0,
    ),
  );

export const lasting = ({ from, to }: Span, times: readonly Seconds[]): number =>
  (times[to] ?? 0) - (times[from] ?? 0);

export interface Lifts {
  readonly lifts: readonly Lift[];
  /** The longest time that the athlete stood still. */
  readonly longest: Span;
}

/** Every lift of a take, in order; null where nobody ever stands still, so that nothing can be compared. */
export const liftsOf = (movement: Movement, times: readonly Seconds[]): Lifts | null => {
  const stands = stillSpans(movement).filter((span) => lasting(span, times) >= LEAST_STAND_S);
  const longest = stands.reduce<Span | null>(
    (best, span) => (best && lasting(best, times) >= lasting(span, times) ? best : span),
    null,
  );
  if (!longest) return null;
  const still = usualOf(movement.grids.slice(longest.from, longest.to + 1));
  const away = awayFrom(still, movement);
  const most = Math.max(...away);
  const lifted = (n: number): boolean => (away[n] ?? 0) > LIFTED * most;
  const height = movement.body.bottom - movement.body.top + 1;
  const lifts: Lift[] = [];
  let earlier = -1;
  for (let n = 0; n < away.length; n += 1) {
    if (!lifted(n)) continue;
    let last = n;
    while (last + 1 < away.length && lifted(last + 1)) last += 1;
    const top = topOf(movement, { from: n, to: last });
    const long = lasting({ from: n, to: last }, times) >= LEAST_LIFT_S;
    if (top && top.rows >= LEAST_RISE * height && long)
      lifts.push({
        before: stands.findLast(({ from }) => from < n && from > earlier) ?? null,
        top: top.at,
        whole: last < away.length - 1,
      });
    [n, earlier] = [last, last];
  }
  return { lifts, longest };
};
