import { correctionOf } from './reed-solomon.ts';

/** Per version from 1, level M (about 15 % may be misread), ISO/IEC 18004: correction codewords of a block. */
const CORRECTION = [10, 16, 26, 18, 24, 16, 18, 22, 22, 26, 30, 22, 22, 24, 24, 28, 28, 26, 26, 26];
/** How many blocks. */
const BLOCKS = [1, 1, 1, 2, 2, 4, 4, 4, 5, 5, 5, 8, 9, 9, 10, 10, 11, 13, 14, 16];
const BYTE_MODE = 0b0100;
const PADS = [0xec, 0x11];

/** Rows and columns at which alignment patterns have their middles. */
export const alignments = (version: number): number[] => {
  if (version === 1) return [];
  const last = version * 4 + 10;
  const gaps = Math.floor(version / 7) + 1;
  const step = Math.ceil((last - 6) / gaps / 2) * 2;
  return [6, ...Array.from({ length: gaps }, (_, n) => last - step * (gaps - 1 - n))];
};

/** All codewords of a symbol: what finder, timing, alignment, format and version leave of its square. */
const room = (version: number): number => {
  const size = version * 4 + 17;
  const count = alignments(version).length;
  const aligned = count === 0 ? 0 : 25 * (count ** 2 - 3) - 10 * (count - 2);
  const fixed = 3 * 64 + 2 * (size - 16) + 31 + aligned + (version < 7 ? 0 : 36);
  return Math.floor((size ** 2 - fixed) / 8);
};

/** How the codewords of a version are dealt out. */
export const layoutOf = (version: number) => {
  const blocks = BLOCKS[version - 1] ?? 0;
  const correction = CORRECTION[version - 1] ?? 0;
  const all = room(version);
  const data = all - blocks * correction;
  const short = Math.floor(data / blocks);
  /** Data codewords of each block: the later ones may have one more. */
  const lengths = Array.from({ length: blocks }, (_, n) =>
    n < blocks - (data % blocks) ? short : short + 1,
  );
  return { data, correction, lengths };
};

const countBits = (version: number): number => (version < 10 ? 8 : 16);

/**
 * The smallest version that holds so many bytes.
 * @throws RangeError where none does
 */
export const versionFor = (bytes: number): number => {
  for (let version = 1; version <= BLOCKS.length; version += 1)
    if (4 + countBits(version) + 8 * bytes <= 8 * layoutOf(version).data) return version;
  throw new RangeError(`${bytes} bytes are more than a code holds`);
};

/** The codewords of a text in the order in which they are drawn. */
export const codewordsOf = (bytes: Uint8Array, version: number): number[] => {
  const { data, correction, lengths } = layoutOf(version);
  const width = countBits(version);
  const bits =
    BYTE_MODE.toString(2).padStart(4, '0') +
    bytes.length.toString(2).padStart(width, '0') +
    [...bytes].map((byte) => byte.toString(2).padStart(8, '0')).join('') +
    '0000';
  const words = (bits.slice(0, data * 8).match(/.{1,8}/g) ?? []).map((word) =>
    Number.parseInt(word.padEnd(8, '0'), 2),
  );
  for (let n = 0; words.length < data; n += 1) words.push(PADS[n % 2] ?? 0);
  let from = 0;
  const blocks = lengths.map((length) => words.slice(from, (from += length)));
  return [...dealt(blocks), ...dealt(blocks.map((block) => correctionOf(block, correction)))];
};

/** The first of each, then the second of each, … */
const dealt = (lists: readonly number[][]): number[] =>
  Array.from({ length: Math.max(...lists.map((list) => list.length)) }, (_, n) =>
    lists.flatMap((list) => list.slice(n, n + 1)),
  ).flat();
