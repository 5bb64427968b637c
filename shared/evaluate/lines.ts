import { deriveReading } from '#shared/reading/derive.ts';
import { CURRENT_ENGINE, type EngineVersion } from '#shared/reading/engine.ts';
import type { ReadingCode } from '#shared/reading/types.ts';
import { type ReadingRules, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { TrialError } from './trial-error.ts';
import { readingInputOf, TRIAL_SETS, trialOf, type TrialSet } from './trial.ts';

/** One printed line: a trial read with one landmark set. Null where there is no usable rep. */
export interface EvaluatedLine {
  readonly id: string;
  readonly set: TrialSet;
  readonly reading: ReadingCode;
  /** Change of turn from the lower gate to the upper, its total standard uncertainty, P(early), MDT90: degrees. */
  readonly d: number | null;
  readonly u: number | null;
  readonly pEarly: number | null;
  readonly mdt90: number | null;
}

const parse = (line: string): unknown => {
  try {
    return JSON.parse(line) as unknown;
  } catch {
    throw new TrialError('is not JSON; put one whole trial on each line');
  }
};

/** Everything a line of trials gives: its results, or what is wrong with it. */
export const linesOf = (
  line: string,
  engine: EngineVersion = CURRENT_ENGINE,
  rules: ReadingRules = STANDARD_RULES,
): { readonly lines: readonly EvaluatedLine[]; readonly error: string | null } => {
  try {
    const trial = trialOf(parse(line));
    const lines = TRIAL_SETS.map((set): EvaluatedLine => {
      const { code, figures } = deriveReading(readingInputOf(trial, set, engine, rules));
      return {
        id: trial.id,
        set,
        reading: code,
        d: figures?.d ?? null,
        u: figures?.uC ?? null,
        pEarly: figures?.pEarly ?? null,
        mdt90: figures?.mdt90 ?? null,
      };
    });
    return { lines, error: null };
  } catch (error) {
    if (error instanceof TrialError) return { lines: [], error: error.message };
    throw error;
  }
};
