import { type ChildProcess, fork } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';

/** What came of the tests: the first that failed, 'endless' where they did not end, null: all passed. */
export type Outcome = string | null;

/** A run that takes this long hangs: the slowest whole set takes about a minute. */
const PATIENCE_MS = 300_000;

export interface Runner {
  readonly run: (changed: string, tests: readonly string[]) => Promise<Outcome>;
  readonly stop: () => void;
}

/** Runs test files in a copied tree, in a child process that is replaced when it hangs. */
export const runnerIn = (tree: string): Runner => {
  let child: ChildProcess | null = null;
  const started = async (): Promise<ChildProcess> => {
    if (child) return child;
    child = fork(join(tree, 'tests/mutation/run-tests.ts'), {
      cwd: tree,
      execArgv: ['--import', 'tsx'],
    });
    await once(child, 'message');
    return child;
  };
  const stop = (): void => {
    child?.kill('SIGKILL');
    child = null;
  };
  return {
    stop,
    run: async (changed, tests) => {
      const process = await started();
      const answer = once(process, 'message', { signal: AbortSignal.timeout(PATIENCE_MS) });
      process.send({ changed: join(tree, changed), tests });
      try {
        const [{ failed }] = (await answer) as [{ failed: string | null }];
        return failed;
      } catch {
        stop();
        return 'endless';
      }
    },
  };
};
