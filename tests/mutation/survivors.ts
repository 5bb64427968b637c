import type { Mutant } from './mutants.ts';

/** A mutant no test can or needs to tell from the original, and why. */
export interface Explained {
  readonly file: string;
  /** The line of code without its indent, the change made in it. */
  readonly code: string;
  readonly before: string;
  readonly after: string;
  readonly why: string;
}

const SYMMETRIC =
  'an error is as likely to one side as to the other: the draws have the same spread either way';

const draws = (code: string): Explained => ({
  file: 'shared/measures/lift.ts',
  code,
  before: '+',
  after: '-',
  why: SYMMETRIC,
});

export const EXPLAINED: readonly Explained[] = [
  {
    file: 'shared/measures/hip-centre.ts',
    code: 'return eu >= 0 ? { eu, ev, nu: -ev, nv: eu } : { eu, ev, nu: ev, nv: -eu };',
    before: '>=',
    after: '>',
    why: 'differs for a pelvis that stands exactly upright in the picture: neither side is down',
  },
  draws('{ u: lifted.u + lifted.error * z(0), v: lifted.v + lifted.error * z(1) },'),
  draws('{ u: support.u + support.error * z(2), v: support.v + support.error * z(3) },'),
  draws('const kneeV = knee.v + knee.error * z(4);'),
  {
    file: 'shared/measures/lift.ts',
    code: 'return Math.sqrt(squares / (DRAWS - 1));',
    before: '-',
    after: '+',
    why: '199 or 201 in place of 200 draws: half a percent, while 200 draws know a spread to five',
  },
  {
    file: 'shared/measures/turn.ts',
    code: "if (!Number.isFinite(thighPart + pelvisPart + variance)) return { code: 'marks-coincide' };",
    before: '+',
    after: '-',
    why: 'asks only whether all three are finite: a difference is so where a sum is',
  },
];

export const explanationOf = (mutant: Mutant): string | null =>
  EXPLAINED.find(
    (each) =>
      each.file === mutant.file &&
      each.code === mutant.code &&
      each.before === mutant.before &&
      each.after === mutant.after,
  )?.why ?? null;
