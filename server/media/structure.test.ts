import { mkdtemp, open, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Demuxer } from './sniff.ts';
import { readStructure } from './structure.ts';

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'structure-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

async function structure(bytes: Buffer, demuxer: Demuxer) {
  const path = join(folder, 'file');
  await writeFile(path, bytes);
  const file = await open(path);
  try {
    return await readStructure(file, bytes.length, demuxer);
  } finally {
    await file.close();
  }
}
const box = (type: string, body: number, declared = body + 8) => {
  const bytes = Buffer.alloc(8 + body);
  bytes.writeUInt32BE(declared);
  bytes.write(type, 4, 'latin1');
  return bytes;
};
const wide = (type: string, body: number, declared: number) => {
  const bytes = Buffer.concat([box(type, 0, 1), Buffer.alloc(8 + body)]);
  bytes.writeBigUInt64BE(BigInt(declared), 8);
  return bytes;
};
const ebml = (...bytes: number[]) =>
  Buffer.from([0x1a, 0x45, 0xdf, 0xa3, 0x82, 0, 0, 0x18, 0x53, 0x80, 0x67, ...bytes]);

describe('the outermost lengths', () => {
  it.each([
    ['whole', [box('ftyp', 16), box('moov', 40), box('mdat', 90)], true, false],
    ['whole, index last', [box('ftyp', 16), box('mdat', 90), box('moov', 40)], true, false],
    ['length in 64 bits', [box('moov', 8), wide('mdat', 20, 36)], true, false],
    ['to the end of the file', [box('moov', 8), box('mdat', 90, 0)], true, false],
    ['something strange at the end', [box('moov', 8), Buffer.alloc(12)], true, false],
    ['cut in the pictures', [box('moov', 8), box('mdat', 90, 400)], true, true],
    ['cut in 64 bits', [box('moov', 8), wide('mdat', 20, 5e9)], true, true],
    ['cut in the index', [box('ftyp', 16), box('moov', 8, 400)], false, true],
    ['cut before the index', [box('ftyp', 16), box('mdat', 90, 400)], false, true],
    ['cut inside a length', [box('moov', 8), Buffer.from([0, 0, 1])], true, true],
  ])('of boxes: %s', async (_, parts, hasIndex, cut) => {
    expect(await structure(Buffer.concat(parts), 'mov')).toEqual({ hasIndex, cut });
  });

  it.each([
    ['whole', ebml(0x83, 1, 2, 3), true, false],
    ['of unknown length, as a browser records', ebml(0xff, 1, 2, 3), true, false],
    ['in eight bytes', ebml(0x01, 0, 0, 0, 0, 0, 0, 3, 1, 2, 3), true, false],
    ['cut', ebml(0x85, 1, 2, 3), true, true],
    ['cut inside the length', ebml(0x01, 0, 0), false, true],
    ['cut inside the header', ebml().subarray(0, 6), false, true],
  ])('of a segment: %s', async (_, bytes, hasIndex, cut) => {
    expect(await structure(bytes, 'matroska')).toEqual({ hasIndex, cut });
  });
});
