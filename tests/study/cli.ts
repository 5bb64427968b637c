import { TRIAL_SETS } from '#shared/evaluate/trial.ts';
import { helpOf, helpWords } from './followed.ts';
import { studyOptions, USAGE } from './options.ts';
import { outcomesOf } from './outcome.ts';
import { tablesOf } from './tables.ts';
import { wordsOf } from './words.ts';

/**
 * The synthetic study: people, cameras, marks and slipping skin of known truth, read by the engine.
 * Prints per landmark set how often it errs, what it finds and whether its probabilities are true.
 */
const options = studyOptions(process.argv.slice(2));
if (options) {
  const { seed, trials, engine, runs } = options;
  console.log(
    `Engine ${engine}, ${trials} trials, seed ${seed}, ${runs} Monte Carlo runs a fit.\n`,
  );
  const outcomes = [...outcomesOf(options)];
  for (const set of TRIAL_SETS) console.log(`${wordsOf(tablesOf(outcomes, set))}\n`);
  console.log(helpWords(helpOf(options)));
} else {
  console.error(`Usage: ${USAGE}`);
  process.exitCode = 2;
}
