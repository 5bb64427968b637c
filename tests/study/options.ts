import { CURRENT_ENGINE, engineOf } from '#shared/reading/engine.ts';
import type { StudyOptions } from './outcome.ts';

export const STUDY: StudyOptions = {
  seed: 1,
  trials: 2000,
  engine: CURRENT_ENGINE,
  // the covariance of the straight-line answer is exact; the runs only add its small remainder
  runs: 100,
};

export const USAGE = 'npm run study -- [--trials N] [--engine N] [--seed N] [--runs N]';

/** Options of the command line; null where one is unknown or not a whole number that it can take. */
export const studyOptions = (args: readonly string[]): StudyOptions | null => {
  let options = STUDY;
  for (let i = 0; i < args.length; i += 2) {
    const number = Number(args[i + 1]);
    if (!Number.isInteger(number) || number < 1) return null;
    switch (args[i]) {
      case '--trials':
        options = { ...options, trials: number };
        break;
      case '--seed':
        options = { ...options, seed: number };
        break;
      case '--runs':
        options = { ...options, runs: Math.max(2, number) };
        break;
      case '--engine': {
        const engine = engineOf(args[i + 1]);
        if (engine === null) return null;
        options = { ...options, engine };
        break;
      }
      default:
        return null;
    }
  }
  return options;
};
