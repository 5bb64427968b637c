import type { Modules } from './symbol.ts';

/** A finder pattern's proportions with four light modules to one side. */
const LIKE_FINDER = ['10111010000', '00001011101'];

const linesOf = (modules: Modules): string[] => {
  const text = (line: readonly boolean[]) => line.map((dark) => (dark ? '1' : '0')).join('');
  const columns = modules.map((_, at) => modules.map((row) => row[at] ?? false));
  return [...modules, ...columns].map(text);
};

const countOf = (line: string, pattern: string): number => {
  let count = 0;
  for (let at = line.indexOf(pattern); at !== -1; at = line.indexOf(pattern, at + 1)) count += 1;
  return count;
};

/** How hard a symbol is to read: long runs, blocks, what looks like a finder, too much of one kind (ISO/IEC 18004). */
export const penaltyOf = (modules: Modules): number => {
  let penalty = 0;
  for (const line of linesOf(modules)) {
    for (const { length } of line.match(/0{5,}|1{5,}/g) ?? []) penalty += length - 2;
    for (const pattern of LIKE_FINDER) penalty += 40 * countOf(line, pattern);
  }
  modules.forEach((row, at) => {
    const below = modules[at + 1];
    for (let n = 0; below && n + 1 < row.length; n += 1)
      if (row[n] === row[n + 1] && row[n] === below[n] && row[n] === below[n + 1]) penalty += 3;
  });
  const dark = modules.flat().filter(Boolean).length / modules.length ** 2;
  return penalty + 10 * Math.floor(Math.abs(dark - 0.5) * 20);
};
