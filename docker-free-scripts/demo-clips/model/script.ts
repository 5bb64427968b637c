import { between, seededRandom } from './random.ts';
import { ease } from './vec.ts';

export type Side = 'left' | 'right';

/** What a take holds, as the coach asked for it. */
export interface Script {
  readonly seed: number;
  /** the support side of each rep, in order */
  readonly reps: readonly Side[];
  /** highest lift, degrees */
  readonly top: number;
  readonly firstQuietS: number;
  readonly quietBetweenS: number;
  /** stretches the whole lift: 1 takes about two seconds from foot off to the top */
  readonly slowness: number;
}

/** One lift: times in seconds from the start of the take. */
export interface RepPlan {
  readonly support: Side;
  readonly start: number;
  /** the weight begins to move over the support leg: quiet stance ends */
  readonly shift: number;
  readonly lowered: number;
  readonly end: number;
  /** [time, lift] where the thigh rests for a moment; between them it moves without a jerk */
  readonly knots: readonly (readonly [number, number])[];
  /** size of this rep's turn against the shape's own */
  readonly turnScale: number;
}

export const SHIFT_S = 0.42;
/** The foot leaves while the last of the weight is still moving. */
const EARLY_RISE_S = 0.1;
const SETTLE_S = 0.4;
const TAIL_S = 0.25;

const planRep = (
  script: Script,
  support: Side,
  start: number,
  quietS: number,
  random: () => number,
): RepPlan => {
  const pace = script.slowness * between(random, 0.95, 1.05);
  const shift = start + quietS;
  const top = script.top + between(random, -1.5, 1.5);
  let time = shift + SHIFT_S - EARLY_RISE_S;
  const knots: [number, number][] = [[time, 0]];
  const rest = (moveS: number, lift: number, holdS: number): void => {
    knots.push([(time += moveS * pace), lift], [(time += holdS), lift + 0.8]);
  };
  rest(0.72, 60 + between(random, -0.8, 0.4), 0.2);
  if (top > 92) rest(0.42, 90 + between(random, -0.8, 0.4), 0.2);
  rest(0.4, top, 0.22);
  knots.push([(time += 0.85 * pace), 0]);
  return {
    support,
    start,
    shift,
    lowered: time,
    end: time + SETTLE_S,
    knots,
    turnScale: between(random, 0.93, 1.07),
  };
};

export const planTake = (script: Script): readonly RepPlan[] => {
  const random = seededRandom(script.seed);
  const reps: RepPlan[] = [];
  let start = 0;
  for (const [index, support] of script.reps.entries()) {
    const quietS = index === 0 ? script.firstQuietS : script.quietBetweenS;
    const rep = planRep(script, support, start, quietS, random);
    reps.push(rep);
    start = rep.end;
  }
  return reps;
};

export const takeSeconds = (reps: readonly RepPlan[]): number => (reps.at(-1)?.end ?? 0) + TAIL_S;

/** The rep a moment belongs to, and its place in the take. */
export const repAt = (reps: readonly RepPlan[], time: number): number => {
  const found = reps.findIndex((rep) => time < rep.end);
  return found < 0 ? reps.length - 1 : found;
};

/** Lift asked for at a moment, degrees. */
export const scriptedLift = (rep: RepPlan, time: number): number => {
  const next = rep.knots.findIndex(([at]) => at > time);
  if (next <= 0) return 0;
  const [t0, lift0] = rep.knots[next - 1] ?? [0, 0];
  const [t1, lift1] = rep.knots[next] ?? [1, 0];
  return lift0 + (lift1 - lift0) * ease((time - t0) / (t1 - t0));
};

/** How far the weight has moved over the support leg: 0 on both feet, 1 on one. */
export const scriptedShift = (rep: RepPlan, time: number): number =>
  ease((time - rep.shift) / SHIFT_S) * (1 - ease((time - rep.lowered + 0.06) / SETTLE_S));
