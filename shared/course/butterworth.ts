/** b0 + b1 z⁻¹ + b2 z⁻² over 1 + a1 z⁻¹ + a2 z⁻². */
export interface SecondOrder {
  readonly b: readonly [number, number, number];
  readonly a: readonly [number, number];
}

/**
 * Two passes damp the cut-off twice: (√2 − 1)^¼ moves each pass so that both together let 0.7071
 * through at the cut-off. Winter, Biomechanics and Motor Control of Human Movement (second-hand).
 */
export const TWO_PASS_CORRECTION = (Math.SQRT2 - 1) ** 0.25;

/** Largest cut-off, as a share of half the sampling rate. */
const HIGHEST_SHARE = 0.4;

/** Coefficients of one pass of a second-order Butterworth low-pass that is run both ways. */
export const butterworth = (cutOffHz: number, sampleHz: number): SecondOrder => {
  const limited = Math.min(cutOffHz, (HIGHEST_SHARE * sampleHz) / 2);
  const w = Math.tan((Math.PI * limited) / sampleHz) / TWO_PASS_CORRECTION;
  const k1 = Math.SQRT2 * w;
  const k2 = w * w;
  const b0 = k2 / (1 + k1 + k2);
  return {
    b: [b0, 2 * b0, b0],
    a: [(2 * (k2 - 1)) / (1 + k1 + k2), (1 - k1 + k2) / (1 + k1 + k2)],
  };
};

/** One pass, started as if the first value had always been there. */
const pass = (values: readonly number[], { b, a }: SecondOrder): number[] => {
  const first = values[0] ?? 0;
  let [x1, x2, y1, y2] = [first, first, first, first];
  return values.map((x) => {
    const y = b[0] * x + b[1] * x1 + b[2] * x2 - a[0] * y1 - a[1] * y2;
    [x2, x1, y2, y1] = [x1, x, y1, y];
    return y;
  });
};

/** Longest edge that is mirrored on, samples. */
const EDGE = 12;

/**
 * Low-pass without delay: forwards and backwards over an even series without gaps. The edges are
 * continued by turning the series about its end points, so that a slope at an end stays one.
 * Fewer than four values come back as they are.
 */
export const smoothBothWays = (
  values: readonly number[],
  cutOffHz: number,
  sampleHz: number,
): readonly number[] => {
  if (values.length < 4) return values;
  const filter = butterworth(cutOffHz, sampleHz);
  const edge = Math.min(EDGE, values.length - 1);
  const first = values[0] ?? 0;
  const last = values.at(-1) ?? 0;
  const before = values.slice(1, edge + 1).reverse();
  const after = values.slice(-edge - 1, -1).reverse();
  const padded = [
    ...before.map((value) => 2 * first - value),
    ...values,
    ...after.map((value) => 2 * last - value),
  ];
  const there = pass(padded, filter).reverse();
  const back = pass(there, filter).reverse();
  return back.slice(edge, edge + values.length);
};
