import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { alignments, layoutOf } from './codewords.ts';
import { qrModules } from './qr-modules.ts';
import { correctionOf, power, times } from './reed-solomon.ts';
import { formatBits, frameOf, MASKS, type Modules, versionBits, wayThrough } from './symbol.ts';

/** Of level M by mask, as ISO/IEC 18004 lists them in annex C. */
const FORMATS = [
  '101010000010010',
  '101000100100101',
  '101111001111100',
  '101101101001011',
  '100010111111001',
  '100000011001110',
  '100111110010111',
  '100101010100000',
];

/** Reads a symbol as a camera's program does, without mending: every block must be whole. */
const read = (modules: Modules): string => {
  const version = (modules.length - 17) / 4;
  const format = Array.from({ length: 15 }, (_, n) => {
    const [row, column] = n < 8 ? [8, n < 6 ? n : n + 1] : [n === 8 ? 7 : 14 - n, 8];
    return modules[row]?.[column] ? '1' : '0';
  }).join('');
  const mask = FORMATS.indexOf(format);
  const turns = MASKS[mask];
  if (!turns) throw new Error(`no such format: ${format}`);
  const bits = wayThrough(frameOf(version, mask))
    .map(([row, column]) => (modules[row]?.[column] !== turns(row, column) ? '1' : '0'))
    .join('');
  const words = (bits.match(/.{8}/g) ?? []).map((word) => Number.parseInt(word, 2));
  const { lengths, correction } = layoutOf(version);
  const blocks = lengths.map((): number[] => []);
  for (let n = 0; n < Math.max(...lengths); n += 1)
    lengths.forEach((length, block) => {
      if (n < length) blocks[block]?.push(words.shift() ?? -1);
    });
  const data = blocks.map((block) => [...block]);
  for (let n = 0; n < correction; n += 1)
    for (const block of blocks) block.push(words.shift() ?? -1);
  for (const block of blocks)
    for (let n = 0; n < correction; n += 1)
      if (block.reduce((sum, word) => times(sum, power(n)) ^ word, 0) !== 0)
        throw new Error('a block is not whole');
  const text = data
    .flat()
    .map((word) => word.toString(2).padStart(8, '0'))
    .join('');
  const head = version < 10 ? 12 : 20;
  const count = Number.parseInt(text.slice(4, head), 2);
  const bytes = (text.slice(head, head + 8 * count).match(/.{8}/g) ?? []).map((byte) =>
    Number.parseInt(byte, 2),
  );
  return new TextDecoder().decode(Uint8Array.from(bytes));
};

describe('a QR code', () => {
  it('has the correction that the standard’s example has (annex I, version 1-M)', () => {
    const data = [0x10, 0x20, 0x0c, 0x56, 0x61, 0x80, ...[0xec, 0x11, 0xec, 0x11, 0xec], 0x11];
    expect(correctionOf([...data, 0xec, 0x11, 0xec, 0x11], 10)).toEqual([
      0xa5, 0x24, 0xd4, 0xc1, 0xed, 0x36, 0xc7, 0x87, 0x2c, 0x55,
    ]);
  });

  it('has the standard’s format and version', () => {
    expect(MASKS.map((_, mask) => formatBits(mask).toString(2))).toEqual(FORMATS);
    expect(versionBits(7).toString(2).padStart(18, '0')).toBe('000111110010010100');
    expect(alignments(7)).toEqual([6, 22, 38]);
    expect(alignments(15)).toEqual([6, 26, 48, 70]);
    expect(layoutOf(5)).toEqual({ data: 86, correction: 24, lengths: [43, 43] });
    expect(layoutOf(10)).toEqual({ data: 216, correction: 26, lengths: [43, 43, 43, 43, 44] });
  });

  it('says any text that it is made of', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 150 }), (text) => {
        expect(read(qrModules(text))).toBe(
          new TextDecoder().decode(new TextEncoder().encode(text)),
        );
      }),
      { numRuns: 40, seed: 20261202 },
    );
    for (const length of [14, 15, 62, 63, 106, 107, 213, 214, 512, 666])
      expect(read(qrModules('a'.repeat(length)))).toHaveLength(length);
    expect(() => qrModules('a'.repeat(667))).toThrow(RangeError);
  });
});
