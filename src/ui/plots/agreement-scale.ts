/** Where a plot of limits of agreement puts its values: CSS px. */
export interface AgreementScale {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly x: (mean: number) => number;
  readonly y: (difference: number) => number;
  readonly xTicks: readonly number[];
  readonly yTicks: readonly number[];
  /** Little room: labels carry figures only. */
  readonly compact: boolean;
}

const STEPS = [0.5, 1, 2, 5, 10, 20, 50];

/** Round ticks inside a span, at most six. */
export const ticksIn = (low: number, high: number): number[] => {
  const step = STEPS.find((each) => (high - low) / each <= 6) ?? 100;
  const first = Math.ceil(low / step);
  const last = Math.floor(high / step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, n) => (first + n) * step);
};

const padded = (low: number, high: number): readonly [number, number] => {
  const room = Math.max(0.5, (high - low) * 0.12);
  return [low - room, high + room];
};

/** @param values what has to fit besides zero; empty: a degree to either side */
export const agreementScale = (
  width: number,
  height: number,
  means: readonly number[],
  differences: readonly number[],
): AgreementScale => {
  const compact = width < 440;
  // beside the lines stands what they are
  const [left, right, top, bottom] = [48, width - (compact ? 56 : 132), 28, height - 48];
  const [lowX, highX] = padded(Math.min(...means), Math.max(...means));
  // zero in the middle, so that a bias is seen as one
  const reach = Math.max(0.5, ...differences.map(Math.abs)) * 1.15;
  const x = (mean: number) => left + ((mean - lowX) / (highX - lowX)) * (right - left);
  const y = (difference: number) =>
    (top + bottom) / 2 - (difference / reach) * ((bottom - top) / 2);
  return {
    width,
    height,
    left,
    right,
    top,
    bottom,
    x,
    y,
    xTicks: ticksIn(lowX, highX),
    yTicks: ticksIn(-reach, reach),
    compact,
  };
};
