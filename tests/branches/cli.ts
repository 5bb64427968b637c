import { readFileSync } from 'node:fs';
import { relative } from 'node:path';
import { type BranchCount, branchesOf, type FileReport, indexFallbacks } from './branches.ts';

/**
 * Reads the report of `npm run coverage` and fails under 95 % of the branches of shared/. Counted
 * without the fallbacks of an index (see `indexFallbacks`); the figure with them is printed too.
 */
const LEAST = 0.95;
const NONE: BranchCount = { taken: 0, all: 0, missed: [] };

const report = JSON.parse(readFileSync('coverage/coverage-final.json', 'utf8')) as Readonly<
  Record<string, FileReport>
>;
const files = Object.values(report).map((file) => {
  const fallbacks = indexFallbacks(readFileSync(file.path, 'utf8'));
  return {
    name: relative(process.cwd(), file.path),
    own: branchesOf(file, fallbacks),
    every: branchesOf(file, new Set()),
  };
});
const sum = (counts: readonly BranchCount[]): BranchCount =>
  counts.reduce(
    (total, { taken, all }) => ({ ...total, taken: total.taken + taken, all: total.all + all }),
    NONE,
  );
const share = ({ taken, all }: BranchCount): number => taken / all;
const words = (count: BranchCount): string =>
  `${(100 * share(count)).toFixed(2)} % (${count.taken} of ${count.all})`;

for (const { name, own } of files)
  if (own.missed.length > 0)
    console.log(`${String(own.all - own.taken).padStart(4)}  ${name}: ${own.missed.join(' ')}`);
const own = sum(files.map((file) => file.own));
console.log(`\nBranches of shared/ taken by its tests: ${words(own)}`);
console.log(`With the fallbacks of indices: ${words(sum(files.map((file) => file.every)))}`);
if (!(share(own) >= LEAST)) {
  console.error(`That is under ${100 * LEAST} %: test what the lines above do.`);
  process.exitCode = 1;
}
