/** What a surface is made of; the look of a person gives each its colour. */
export const PAINT = {
  leg: 0,
  arm: 1,
  shorts: 2,
  shirt: 3,
  shoe: 4,
  sole: 5,
  head: 6,
  skin: 7,
  belt: 8,
  strap: 9,
  stick: 10,
  ball: 11,
  hair: 12,
  neck: 13,
} as const;

/** Limbs that do not shade themselves but shade each other. */
export const PART = {
  trunk: 0,
  supportLeg: 1,
  liftedLeg: 2,
  supportArm: 3,
  liftedArm: 4,
  head: 5,
  kit: 6,
} as const;

/** A colour as light reflected, 0 to 1 a channel, linear. */
export type Colour = readonly [number, number, number];

/** `#rrggbb` as linear light. */
export const colour = (hex: string): Colour => {
  const channel = (from: number): number => {
    const value = Number.parseInt(hex.slice(from, from + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
};
