import { readFileSync, writeFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import { normalDraws } from '#shared/measures/draws.ts';
import { applied, type Mutant, mutantsOf } from './mutants.ts';
import { distancesIn, filesUnder, nearestTests } from './nearest.ts';
import { type MutationOptions, mutationOptions, USAGE } from './options.ts';
import { runnerIn } from './runner.ts';
import { changeOf, tally, type Tried, unexplained } from './tally.ts';
import { copyTree } from './tree.ts';

/**
 * Puts small faults into the formulas, one at a time, in a copy of the work tree, and runs the tests
 * that reach them: a changed sign, side, unit of angle or count that no test notices is listed.
 * The exit status is 1 where such a fault is not explained in survivors.ts.
 */
const chosen = (root: string, { rooms, files, sample, seed }: MutationOptions): Mutant[] => {
  const all = rooms
    .flatMap((room) => filesUnder(root, `shared/${room}`, '.ts'))
    .filter((file) => !file.endsWith('.test.ts'))
    .filter((file) => files.length === 0 || files.includes(basename(file, '.ts')))
    .flatMap((file) => mutantsOf(file, readFileSync(join(root, file), 'utf8')));
  if (sample === null || sample >= all.length) return all;
  const draw = normalDraws(seed);
  return all
    .map((mutant) => ({ mutant, key: draw() }))
    .toSorted((a, b) => a.key - b.key)
    .slice(0, sample)
    .map(({ mutant }) => mutant);
};

const tryEach = async (
  tree: string,
  mutants: readonly Mutant[],
  { quick }: MutationOptions,
): Promise<readonly Tried[]> => {
  const distances = distancesIn(tree, quick);
  const runner = runnerIn(tree);
  const tried: Tried[] = [];
  const healthy = await runner.run('', [...distances.keys()]);
  if (healthy !== null) throw new Error(`${healthy} fails without any fault: mend it first.`);
  for (const mutant of mutants) {
    const path = join(tree, mutant.file);
    const text = readFileSync(path, 'utf8');
    writeFileSync(path, applied(text, mutant));
    const by = await runner.run(mutant.file, nearestTests(distances, mutant.file));
    writeFileSync(path, text);
    await runner.run(mutant.file, []);
    tried.push({ mutant, by });
    console.log(`${tried.length}/${mutants.length} ${by ?? 'SURVIVED'}  ${changeOf(mutant)}`);
  }
  runner.stop();
  return tried;
};

const options = mutationOptions(process.argv.slice(2));
if (options) {
  const root = process.cwd();
  const mutants = chosen(root, options);
  const tree = copyTree(root);
  process.on('exit', tree.remove);
  process.on('SIGINT', () => process.exit(130));
  process.on('SIGTERM', () => process.exit(143));
  const tried = await tryEach(tree.at, mutants, options);
  console.log(`\n${tally(tried)}`);
  process.exitCode = unexplained(tried).length > 0 ? 1 : 0;
} else {
  console.error(`Usage: ${USAGE}`);
  process.exitCode = 2;
}
