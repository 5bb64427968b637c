import { readingInputOf, TRIAL_SETS, type TrialSet } from '#shared/evaluate/trial.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import type { EngineVersion } from '#shared/reading/engine.ts';
import type { ReadingCode } from '#shared/reading/types.ts';
import { clipsOf } from './clip.ts';
import { type Plan, planOf } from './plan.ts';

/** What the engine said of one trial with one landmark set. */
export interface Outcome {
  readonly plan: Plan;
  readonly set: TrialSet;
  readonly code: ReadingCode;
  readonly d: number | null;
  readonly uC: number | null;
  readonly uC0: number | null;
  readonly pEarly: number | null;
}

export interface StudyOptions {
  readonly seed: number;
  readonly trials: number;
  readonly engine: EngineVersion;
  /** Monte Carlo runs of each fit. */
  readonly runs: number;
}

/** Every trial of the study with every landmark set, one trial at a time. */
export function* outcomesOf({ seed, trials, engine, runs }: StudyOptions): Generator<Outcome> {
  for (let index = 0; index < trials; index += 1) {
    const { plan, chance } = planOf(seed, index);
    const { side, reps } = clipsOf(plan, chance);
    const trial = { id: String(index), supportSide: side, reps };
    for (const set of TRIAL_SETS) {
      const { code, figures } = deriveReading(readingInputOf(trial, set, engine), runs);
      yield {
        plan,
        set,
        code,
        d: figures?.d ?? null,
        uC: figures?.uC ?? null,
        uC0: figures?.uC0 ?? null,
        pEarly: figures?.pEarly ?? null,
      };
    }
  }
}
