/** Seeded uniform numbers in [0, 1): the same seed renders the same clip everywhere (mulberry32). */
export const seededRandom = (seed: number): (() => number) => {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
};

/** One draw between `low` and `high`. */
export const between = (random: () => number, low: number, high: number): number =>
  low + (high - low) * random();
