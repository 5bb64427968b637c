const made = new Map<number, Float32Array>();

/**
 * How much each pixel of a square patch counts: most in the middle, little at the rim, where a
 * limb's patch already shows what is behind it. Nothing in the corners. The values add up to 1.
 */
export const windowOf = (radius: number): Float32Array => {
  const known = made.get(radius);
  if (known) return known;
  const size = 2 * radius + 1;
  const weights = new Float32Array(size * size);
  let sum = 0;
  for (let y = -radius, k = 0; y <= radius; y += 1) {
    for (let x = -radius; x <= radius; x += 1, k += 1) {
      const away = (x * x + y * y) / ((radius + 0.5) * (radius + 0.5));
      const weight = away >= 1 ? 0 : Math.exp(-1.5 * away) * (1 - away * away);
      weights[k] = weight;
      sum += weight;
    }
  }
  for (let k = 0; k < weights.length; k += 1) weights[k] = (weights[k] as number) / sum;
  made.set(radius, weights);
  return weights;
};
