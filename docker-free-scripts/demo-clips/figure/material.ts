import { faceColour } from './face.ts';
import type { Look } from './looks.ts';
import { type Colour, colour, PAINT } from './paints.ts';

const BELT = colour('#5a6062');
const BUCKLE = colour('#3a3d3e');
const STRAP = colour('#ece8dd');
const STICK = colour('#f1eee6');
const BAND = colour('#2a2d2e');
const BALL = colour('#f6f4ee');

const darker = (base: Colour, share: number): Colour => [
  base[0] * share,
  base[1] * share,
  base[2] * share,
];

/** Upper of a shoe: a tongue with laces across it, ending in the toe cap. */
const shoeColour = (look: Look, u: number, v: number): Colour => {
  const aside = Math.abs(u - 0.25);
  if (v < 0.34 || v > 0.66 || aside > 0.085) return look.shoe;
  const lace = Math.abs((((v - 0.34) * 100) % 8) - 4) < 1.5;
  return lace ? look.sole : darker(look.shoe, 0.7);
};

/** Colour of a surface at its place, see `Surfaces.places`. */
export const colourAt = (look: Look, paint: number, u: number, v: number): Colour => {
  switch (paint) {
    case PAINT.leg:
      return v > 1.86 ? look.sock : look.skin;
    case PAINT.shorts:
      return v > 0.53 && v < 0.57 ? darker(look.shorts, 0.72) : look.shorts;
    case PAINT.shirt:
      return look.shirt;
    case PAINT.shoe:
      return shoeColour(look, u, v);
    case PAINT.sole:
      return look.sole;
    case PAINT.head:
      return faceColour(look, u, v);
    case PAINT.hair:
      return look.hair;
    case PAINT.belt:
      return BELT;
    case PAINT.strap:
      return v < 0.12 || v > 0.88 ? BUCKLE : STRAP;
    case PAINT.stick:
      return Math.floor(v * 6) % 2 === 1 ? BAND : STICK;
    case PAINT.ball:
      return BALL;
    default:
      return look.skin;
  }
};

/** A sticker on a landmark: white with a dark middle, seen at any distance. */
export const DOT_WHITE = colour('#f7f5ef');
export const DOT_DARK = colour('#16191a');
