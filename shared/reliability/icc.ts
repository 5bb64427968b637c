import { fisherQuantile } from './fisher.ts';
import type { MeanSquares } from './variance.ts';

/** An intraclass correlation with its 95 % interval. */
export interface Icc {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

const finite = (icc: Icc): Icc | null =>
  Number.isFinite(icc.value + icc.low + icc.high) ? icc : null;

const SHARE = 0.975;

/** Shared by the one-way and the fixed-judges form: F against its two limits. */
const fromF = (f: number, n: number, k: number, errorFreedom: number): Icc | null => {
  const low = f / fisherQuantile(SHARE, n - 1, errorFreedom);
  const high = f * fisherQuantile(SHARE, errorFreedom, n - 1);
  const icc = (x: number): number => (x - 1) / (x + k - 1);
  return finite({ value: icc(f), low: icc(low), high: icc(high) });
};

/** ICC(1,1): each target rated by other judges. Shrout & Fleiss 1979. Null without variance. */
export const iccOneWay = ({ targets: n, judges: k, between, within }: MeanSquares): Icc | null =>
  fromF(between / within, n, k, n * (k - 1));

/** ICC(3,1): these judges and no others; a constant difference between them does not count. */
export const iccFixed = ({ targets: n, judges: k, between, error }: MeanSquares): Icc | null =>
  fromF(between / error, n, k, (n - 1) * (k - 1));

/** ICC(2,1): judges drawn from many; a constant difference between them counts as error. */
export const iccRandom = (squares: MeanSquares): Icc | null => {
  const { targets: n, judges: k, between, judge, error } = squares;
  const value = (between - error) / (between + (k - 1) * error + (k * (judge - error)) / n);
  const f = judge / error;
  const rest = n * (1 + (k - 1) * value) - k * value;
  const freedom =
    ((k - 1) * (n - 1) * (k * value * f + rest) ** 2) /
    ((n - 1) * k * k * value * value * f * f + rest * rest);
  const f1 = fisherQuantile(SHARE, n - 1, freedom);
  const f2 = fisherQuantile(SHARE, freedom, n - 1);
  const spread = k * judge + (k * n - k - n) * error;
  return finite({
    value,
    low: (n * (between - f1 * error)) / (f1 * spread + n * between),
    high: (n * (f2 * between - error)) / (spread + n * f2 * between),
  });
};

/** Reliability of the mean of all k judges: (1,k), (2,k), (3,k). Null without variance. */
export const iccOfMeans = (
  squares: MeanSquares,
): { readonly oneWay: number; readonly random: number; readonly fixed: number } | null => {
  const { targets: n, between, within, judge, error } = squares;
  if (!(between > 0)) return null;
  return {
    oneWay: (between - within) / between,
    random: (between - error) / (between + (judge - error) / n),
    fixed: (between - error) / between,
  };
};
