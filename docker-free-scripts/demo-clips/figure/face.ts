import type { Look } from './looks.ts';
import { type Colour, colour } from './paints.ts';

const INK = colour('#241b18');

const mixed = (a: Colour, b: Colour, t: number): Colour => [
  a[0] + (b[0] - a[0]) * t,
  a[1] + (b[1] - a[1]) * t,
  a[2] + (b[2] - a[2]) * t,
];

/** Soft step over about a millimetre: 1 inside. */
const inside = (value: number, edge: number): number =>
  Math.min(1, Math.max(0, (edge - value) / 0.12 + 0.5));

/** Front edge of the hair by direction, mm above the chin: 1 is straight ahead, −1 behind. */
const hairEdge = (look: Look, ahead: number): number => {
  const temple = 122;
  if (ahead > 0.5) return look.brow - 5 * (1 - ahead);
  if (ahead > 0.22) return temple + (look.brow - 2.5 - temple) * Math.sqrt((ahead - 0.22) / 0.28);
  return ahead > 0.04 ? Math.max(look.hairDown, 92) : look.hairDown;
};

/**
 * Colour of the head's surface: `u` around (¼ in front), `v` the height above the chin in mm of a
 * head of 222. Eyes, brows and mouth are drawn flat; the nose and ears are shapes of their own.
 */
export const faceColour = (look: Look, u: number, v: number): Colour => {
  const turn = u * 2 * Math.PI;
  const ahead = Math.sin(turn);
  if (v > hairEdge(look, ahead)) return look.hair;
  if (ahead < 0.3) return look.skin;
  const across = Math.cos(turn) * 72;
  const side = Math.abs(across);
  const eye = Math.hypot((side - 29) / 6.2, (v - 107) / 5.6);
  const lid = Math.hypot((side - 29.5) / 9.5, (v - 111.5 + (side - 29) ** 2 / 60) / 2);
  const brow = Math.hypot((side - 29) / 15, (v - 125 - 3 * Math.cos((side - 32) / 12)) / 2.6);
  const mouth = Math.hypot(side / 21, (v - 43 - (across * across) / 130) / 2.9);
  let seen = look.skin;
  seen = mixed(seen, INK, 0.92 * Math.max(inside(eye, 1), inside(lid, 1)));
  seen = mixed(seen, mixed(look.hair, look.skin, 0.25), 0.9 * inside(brow, 1));
  return mixed(seen, look.lips, 0.9 * inside(mouth, 1));
};
