import { codewordsOf, versionFor } from './codewords.ts';
import { penaltyOf } from './penalty.ts';
import { frameOf, MASKS, type Modules, wayThrough } from './symbol.ts';

/**
 * A text as a QR code (ISO/IEC 18004), level M, without its quiet zone of four modules.
 * @throws RangeError above 666 bytes
 */
export const qrModules = (text: string): Modules => {
  const bytes = new TextEncoder().encode(text);
  const version = versionFor(bytes.length);
  const words = codewordsOf(bytes, version);
  const drawn = MASKS.map((turns, mask): Modules => {
    const frame = frameOf(version, mask);
    const way = wayThrough(frame);
    way.forEach(([row, column], n) => {
      const dark = (((words[n >> 3] ?? 0) >> (7 - (n & 7))) & 1) === 1;
      const line = frame[row];
      if (line) line[column] = dark !== turns(row, column);
    });
    return frame.map((row) => row.map((dark) => dark === true));
  });
  const penalties = drawn.map(penaltyOf);
  return drawn[penalties.indexOf(Math.min(...penalties))] ?? [];
};
