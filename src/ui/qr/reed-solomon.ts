/** x⁸ + x⁴ + x³ + x² + 1, the field's polynomial of ISO/IEC 18004. */
const POLYNOMIAL = 0x11d;

const POWERS: number[] = [];
for (
  let value = 1;
  POWERS.length < 255;
  value = value < 128 ? value << 1 : (value << 1) ^ POLYNOMIAL
)
  POWERS.push(value);
const LOGS = new Map(POWERS.map((value, power) => [value, power]));

/** α to some power. */
export const power = (n: number): number => POWERS[n % 255] ?? 1;

export const times = (a: number, b: number): number =>
  a === 0 || b === 0 ? 0 : power((LOGS.get(a) ?? 0) + (LOGS.get(b) ?? 0));

/** (x − α⁰)(x − α¹) … without its leading 1, highest power first. */
const generatorOf = (degree: number): number[] => {
  let factors = [1];
  for (let n = 0; n < degree; n += 1) {
    const root = power(n);
    factors = [...factors, 0].map((value, at) => value ^ times(factors[at - 1] ?? 0, root));
  }
  return factors.slice(1);
};

/** The codewords that let a reader mend what it misread. */
export const correctionOf = (data: readonly number[], count: number): number[] => {
  const generator = generatorOf(count);
  let rest = Array<number>(count).fill(0);
  for (const value of data) {
    const first = value ^ (rest[0] ?? 0);
    rest = [...rest.slice(1), 0].map((each, at) => each ^ times(generator[at] ?? 0, first));
  }
  return rest;
};
