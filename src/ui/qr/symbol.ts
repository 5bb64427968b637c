import { alignments } from './codewords.ts';

/** Rows of modules; true is dark. */
export type Modules = boolean[][];

/** Whether a mask turns a module over. */
export const MASKS: readonly ((row: number, column: number) => boolean)[] = [
  (row, column) => (row + column) % 2 === 0,
  (row) => row % 2 === 0,
  (_row, column) => column % 3 === 0,
  (row, column) => (row + column) % 3 === 0,
  (row, column) => (Math.floor(row / 2) + Math.floor(column / 3)) % 2 === 0,
  (row, column) => ((row * column) % 2) + ((row * column) % 3) === 0,
  (row, column) => (((row * column) % 2) + ((row * column) % 3)) % 2 === 0,
  (row, column) => (((row + column) % 2) + ((row * column) % 3)) % 2 === 0,
];

/** A number with its check bits: the rest of a division by a polynomial over the field of two. */
const checked = (value: number, checkBits: number, polynomial: number): number => {
  let rest = value << checkBits;
  const top = polynomial.toString(2).length;
  while (rest.toString(2).length >= top && rest !== 0)
    rest ^= polynomial << (rest.toString(2).length - top);
  return (value << checkBits) | rest;
};

/** 15 bits: level M (00) and the mask, so that no symbol is all light there. */
export const formatBits = (mask: number): number => checked(mask, 10, 0b101_0011_0111) ^ 0x5412;
/** 18 bits, from version 7 on. */
export const versionBits = (version: number): number => checked(version, 12, 0b1_1111_0010_0101);

/** Everything that is no codeword, with the format of a mask; null where codewords go. */
export const frameOf = (version: number, mask: number): (boolean | null)[][] => {
  const size = version * 4 + 17;
  const at = Array.from({ length: size }, () => Array<boolean | null>(size).fill(null));
  const put = (row: number, column: number, dark: boolean) => {
    const line = at[row];
    if (line && column >= 0 && column < size) line[column] = dark;
  };
  const rings = (row: number, column: number, reach: number, light: readonly number[]) => {
    for (let down = -reach; down <= reach; down += 1)
      for (let right = -reach; right <= reach; right += 1)
        put(row + down, column + right, !light.includes(Math.max(Math.abs(down), Math.abs(right))));
  };
  for (let n = 0; n < size; n += 1) {
    put(6, n, n % 2 === 0);
    put(n, 6, n % 2 === 0);
  }
  const middles = alignments(version);
  const last = size - 7;
  for (const row of middles)
    for (const column of middles) {
      const inCorner = [row, column].filter((value) => value === 6).length;
      if (inCorner === 2 || (inCorner === 1 && (row === last || column === last))) continue;
      rings(row, column, 2, [1]);
    }
  for (const [row, column] of [
    [3, 3],
    [3, size - 4],
    [size - 4, 3],
  ] as const)
    rings(row, column, 4, [2, 4]);

  const format = formatBits(mask);
  for (let n = 0; n < 15; n += 1) {
    const dark = ((format >> n) & 1) === 1;
    // beside the first finder pattern, and once more beside the two others
    put(n < 6 ? n : n < 8 ? n + 1 : n === 8 ? 8 : 8, n <= 7 ? 8 : n === 8 ? 7 : 14 - n, dark);
    if (n < 8) put(8, size - 1 - n, dark);
    else put(size - 15 + n, 8, dark);
  }
  put(size - 8, 8, true);
  if (version >= 7) {
    const bits = versionBits(version);
    for (let n = 0; n < 18; n += 1) {
      const dark = ((bits >> n) & 1) === 1;
      const [along, across] = [Math.floor(n / 3), size - 11 + (n % 3)];
      put(along, across, dark);
      put(across, along, dark);
    }
  }
  return at;
};

/** The places of the codewords' bits in their order: two columns at a time from the right, up and down by turns. */
export const wayThrough = (frame: readonly (readonly (boolean | null)[])[]): [number, number][] => {
  const size = frame.length;
  const way: [number, number][] = [];
  let up = true;
  for (let right = size - 1; right > 0; right -= 2) {
    // the column of the timing pattern is left out
    if (right === 6) right -= 1;
    for (let n = 0; n < size; n += 1) {
      const row = up ? size - 1 - n : n;
      for (const column of [right, right - 1])
        if (frame[row]?.[column] === null) way.push([row, column]);
    }
    up = !up;
  }
  return way;
};
