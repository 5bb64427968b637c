import { type Colour, colour } from '../figure/paints.ts';

const OAK = colour('#86684c');
const WIDE = 138;
const LONG = 1650;
const GAP = 2.2;

/** A number in [0, 1) that belongs to a board or a place, always the same. */
const chance = (a: number, b: number): number => {
  const mixed = Math.sin(a * 127.1 + b * 311.7) * 43758.5453;
  return mixed - Math.floor(mixed);
};

const smoothChance = (x: number, y: number): number => {
  const [i, j] = [Math.floor(x), Math.floor(y)];
  const [fx, fy] = [x - i, y - j];
  const [sx, sy] = [fx * fx * (3 - 2 * fx), fy * fy * (3 - 2 * fy)];
  const low = chance(i, j) + (chance(i + 1, j) - chance(i, j)) * sx;
  const high = chance(i, j + 1) + (chance(i + 1, j + 1) - chance(i, j + 1)) * sx;
  return low + (high - low) * sy;
};

/** Floor boards laid towards the lens: their tone, their grain and the gaps between them. */
export const boardColour = (x: number, y: number): Colour => {
  const row = Math.floor(y / WIDE);
  const shifted = x + chance(row, 7) * LONG;
  const board = Math.floor(shifted / LONG);
  const [inY, inX] = [y - row * WIDE, shifted - board * LONG];
  const edge = Math.min(inY, WIDE - inY, inX, LONG - inX);
  const tone = 0.9 + 0.2 * chance(row, board);
  const grain =
    0.93 +
    0.09 * smoothChance(x / 210, y / 7 + 40 * chance(board, row)) +
    0.05 * smoothChance(x / 60, y / 2.5);
  const gap = edge < GAP ? 0.45 : 1;
  const light = tone * grain * gap;
  return [OAK[0] * light, OAK[1] * light, OAK[2] * light];
};
