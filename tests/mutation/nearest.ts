import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join, normalize } from 'node:path';
import ts from 'typescript';

/** Our files under a folder whose names end so, by path from the root, in order. */
export const filesUnder = (root: string, folder: string, ending: string): readonly string[] =>
  readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith(ending))
    .map((name) => join(folder, name))
    .toSorted();

/** Whole readings: they run only where no test of a formula has found the fault. */
const LATE = ['shared/evaluate/golden.test.ts', 'shared/reading/derive.test.ts'];

/** Tests that take many seconds: they run last, or not at all. */
const SLOW = [
  'shared/reading/properties.test.ts',
  'shared/evaluate/evaluate.test.ts',
  'shared/evaluate/engine-two.test.ts',
];

/** The files that a file of ours imports, by path from the root. */
const importsOf = (root: string, file: string): readonly string[] =>
  ts
    .preProcessFile(readFileSync(join(root, file), 'utf8'))
    .importedFiles.flatMap(({ fileName }) => {
      if (fileName.startsWith('#')) return [fileName.slice(1)];
      return fileName.startsWith('.') ? [normalize(join(dirname(file), fileName))] : [];
    })
    .filter((path) => path.endsWith('.ts') && existsSync(join(root, path)));

/** How many imports lie between each test and each file it reaches. */
export type Distances = ReadonlyMap<string, ReadonlyMap<string, number>>;

export const distancesIn = (root: string, quick: boolean): Distances => {
  const known = new Map<string, readonly string[]>();
  const direct = (file: string): readonly string[] => {
    const imports = known.get(file) ?? importsOf(root, file);
    known.set(file, imports);
    return imports;
  };
  const reach = (test: string): ReadonlyMap<string, number> => {
    const far = new Map([[test, 0]]);
    for (const [file, steps] of far)
      for (const next of direct(file)) if (!far.has(next)) far.set(next, steps + 1);
    return far;
  };
  const tests = ['shared', 'tests/reference']
    .flatMap((at) => filesUnder(root, at, '.test.ts'))
    .filter((test) => !quick || !SLOW.includes(test));
  return new Map(tests.map((test) => [test, reach(test)]));
};

/** Every test that reaches a file, the nearest first and whole readings last. */
export const nearestTests = (distances: Distances, file: string): readonly string[] =>
  [...distances]
    .flatMap(([test, reached]) => {
      const steps = reached.get(file);
      return steps === undefined ? [] : [{ test, steps, late: [...LATE, ...SLOW].indexOf(test) }];
    })
    .toSorted((a, b) => a.late - b.late || a.steps - b.steps)
    .map(({ test }) => test);
