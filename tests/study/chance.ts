import { normalBelow } from '#shared/course/normal.ts';
import { normalDraws } from '#shared/measures/draws.ts';

/** Repeatable chance of one trial. */
export interface Chance {
  readonly normal: (mean: number, sd: number) => number;
  readonly between: (low: number, high: number) => number;
  readonly pick: <T>(choices: readonly [T, ...T[]]) => T;
}

/** The same seed gives the same trial everywhere. */
export const chanceOf = (seed: number): Chance => {
  const next = normalDraws(seed);
  const between = (low: number, high: number): number => low + (high - low) * normalBelow(next());
  return {
    normal: (mean, sd) => mean + sd * next(),
    between,
    pick: (choices) => choices[Math.floor(between(0, choices.length))] ?? choices[0],
  };
};
