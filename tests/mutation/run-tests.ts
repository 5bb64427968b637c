import { createVitest } from 'vitest/node';

/**
 * Child process in the copied tree: for each list of test files it is sent, nearest first, it
 * answers with the first that fails, or null. One process serves many mutants, so that only what
 * changed is compiled anew; the tests of shared/ are pure, so that files of one run share modules.
 */
const vitest = await createVitest('test', {
  project: ['unit'],
  watch: false,
  pool: 'threads',
  maxWorkers: 1,
  isolate: false,
  bail: 1,
  testTimeout: 300_000,
  reporters: [{}],
});
// a project keeps its own copy of the pool's settings
for (const { config } of vitest.projects)
  Object.assign(config, { isolate: false, maxWorkers: 1, testTimeout: 300_000 });

/** The nearest alone find most faults. */
const NEAREST = 3;

/** Errors outside any test are kept by vitest over all runs. */
let strayBefore = 0;

const failureAmong = async (tests: readonly string[]): Promise<string | null> => {
  const specifications = await vitest.globTestSpecifications([...tests]);
  const { unhandledErrors } = await vitest.runTestSpecifications(specifications);
  const stray = unhandledErrors.length > strayBefore;
  strayBefore = unhandledErrors.length;
  // the answer's own list of modules holds those of earlier runs too
  const failed = specifications.find(({ testModule }) => testModule?.state() === 'failed');
  if (failed) return failed.testModule?.relativeModuleId ?? failed.moduleId;
  if (stray) return 'an error outside any test';
  const all = specifications.every(({ testModule }) => testModule?.state() === 'passed');
  return all && specifications.length >= tests.length ? null : 'tests that did not run';
};

const firstToFail = async (tests: readonly string[]): Promise<string | null> => {
  for (const some of [tests.slice(0, NEAREST), tests.slice(NEAREST)]) {
    const failed = some.length > 0 ? await failureAmong(some) : null;
    if (failed !== null) return failed;
  }
  return null;
};

process.on('message', ({ changed, tests }: { changed: string; tests: readonly string[] }) => {
  vitest.invalidateFile(changed);
  void firstToFail(tests).then((failed) => process.send?.({ failed }));
});
process.on('disconnect', () => process.exit());
process.send?.({ ready: true });
