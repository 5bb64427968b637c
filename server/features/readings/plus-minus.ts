/** 95 % of true values lie within this many standard uncertainties. */
const COVERAGE = 1.96;

/** ± (95 %) of a standard uncertainty, in its unit; null where that is not known. */
export const plusMinus = (u: number | null | undefined): number | null =>
  u === null || u === undefined ? null : COVERAGE * u;
