import { expect, it } from 'vitest';
import { branchesOf, type FileReport, indexFallbacks } from './branches.ts';

it('finds what only the compiler asks of an index', () => {
  const text = [
    'const a = values[i] ?? NaN;',
    'sum += (weights[i + 1] ?? 0) * 2;',
    "const b = marks['kneecap'] ?? 0;",
    'const c = width ?? NaN;',
    'const d = labels[i] ?? null;',
  ].join('\n');
  expect([...indexFallbacks(text)]).toEqual(['1:10', '2:8']);
});

const place = (line: number, column: number) => ({ start: { line, column } });
const report: FileReport = {
  path: 'made.ts',
  branchMap: {
    0: { type: 'binary-expr', loc: place(1, 10), locations: [place(1, 10), place(1, 23)] },
    1: { type: 'if', loc: place(4, 2), locations: [place(4, 2), place(6, 9)] },
  },
  b: { 0: [7, 0], 1: [3, 0] },
};

it('counts each arm once and names the lines of those not taken', () => {
  expect(branchesOf(report, new Set())).toEqual({ taken: 2, all: 4, missed: [1, 6] });
  expect(branchesOf(report, new Set(['1:10']))).toEqual({ taken: 1, all: 2, missed: [6] });
});
