import { createVitest } from 'vitest/node';

/**
 * Child process in the copied tree: for each list of test files it is sent, it runs them one after
 * another and answers with the first that fails, or null. One process serves many mutants, so that
 * only what changed is compiled anew.
 */
const vitest = await createVitest('test', {
  project: ['unit'],
  watch: false,
  pool: 'threads',
  maxWorkers: 1,
  bail: 1,
  reporters: [{}],
});

/** Errors outside any test are kept by vitest over all runs. */
let strayBefore = 0;

const firstToFail = async (tests: readonly string[]): Promise<string | null> => {
  for (const test of tests) {
    const specifications = await vitest.globTestSpecifications([test]);
    const { unhandledErrors } = await vitest.runTestSpecifications(specifications);
    const stray = unhandledErrors.length - strayBefore;
    strayBefore = unhandledErrors.length;
    // the answer's own list of modules holds those of earlier runs too
    const sound = specifications.every(({ testModule }) => testModule?.ok() === true);
    if (specifications.length === 0 || !sound || stray > 0) return test;
  }
  return null;
};

process.on('message', ({ changed, tests }: { changed: string; tests: readonly string[] }) => {
  vitest.invalidateFile(changed);
  void firstToFail(tests).then((failed) => process.send?.({ failed }));
});
process.on('disconnect', () => process.exit());
process.send?.({ ready: true });
