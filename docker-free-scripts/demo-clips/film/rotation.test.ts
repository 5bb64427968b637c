import { describe, expect, it } from 'vitest';
import { turnUpright } from './rotation.ts';

/** A version 0 track header: payload of 84 bytes after its name, width and height last. */
const header = (width: number, version = 0): Buffer => {
  const box = Buffer.alloc(92);
  box.writeUInt32BE(92, 0);
  box.write('tkhd', 4);
  box[8] = version;
  box.writeUInt32BE(width << 16, 8 + 76);
  return box;
};
const matrix = (file: Buffer, at: number): number[] =>
  Array.from({ length: 9 }, (_, i) => file.readInt32BE(at + 8 + 40 + 4 * i));

describe('turnUpright', () => {
  it('writes a quarter turn into the picture track and leaves the sound track alone', () => {
    const turned = turnUpright(Buffer.concat([header(0), header(1920)]), 1080);
    expect(matrix(turned, 0)).toEqual([0, 0, 0, 0, 0, 0, 0, 0, 0]);
    expect(matrix(turned, 92)).toEqual([0, 65536, 0, -65536, 0, 0, 1080 * 65536, 0, 0x40000000]);
  });

  it('says so where no picture track is found or the header is of another version', () => {
    expect(() => turnUpright(header(0), 1080)).toThrow('no picture track');
    expect(() => turnUpright(header(1920, 1), 1080)).toThrow('version 0');
  });
});
