/**
 * Repeatable normal deviates. xoshiro128** (Blackman and Vigna, public domain) seeded through
 * a 32-bit mixer, and Marsaglia's polar method. Two calls with one seed give the same numbers
 * everywhere.
 */
export const normalDraws = (seed: number): (() => number) => {
  let mixer = seed >>> 0;
  const mix = (): number => {
    mixer = (mixer + 0x9e3779b9) | 0;
    let x = mixer;
    x = Math.imul(x ^ (x >>> 16), 0x21f0aaad);
    x = Math.imul(x ^ (x >>> 15), 0x735a2d97);
    return x ^ (x >>> 15);
  };
  let a = mix();
  let b = mix();
  let c = mix();
  let d = mix();
  const bits = (): number => {
    const scrambled = Math.imul(b, 5);
    const result = Math.imul((scrambled << 7) | (scrambled >>> 25), 9);
    const carried = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= carried;
    d = (d << 11) | (d >>> 21);
    return result;
  };
  const symmetric = (): number => bits() / 0x80000000;
  let spare = 0;
  let hasSpare = false;
  return () => {
    if (hasSpare) {
      hasSpare = false;
      return spare;
    }
    for (;;) {
      const x = symmetric();
      const y = symmetric();
      const r = x * x + y * y;
      if (r >= 1 || r === 0) continue;
      const scale = Math.sqrt((-2 * Math.log(r)) / r);
      spare = y * scale;
      hasSpare = true;
      return x * scale;
    }
  };
};
