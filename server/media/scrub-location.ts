import { type FileHandle, open } from 'node:fs/promises';
import { isMatroska, scrubMatroska } from './scrub-matroska.ts';
import { zeroFill } from './zero-fill.ts';

/**
 * Boxes that describe an MP4 or MOV to people: where it was filmed, with which phone, by whom. None of them carries
 * timing or pictures, so they can be taken out without moving a byte of anything else.
 * (ISO/IEC 14496-12, 8.10.1 `udta`, 8.11.1 `meta`; QuickTime File Format, 'User data atoms' and 'Metadata'; memory)
 */
const DESCRIBING = new Set(['udta', 'meta', 'uuid']);
/** Boxes that may hold the above. */
const HOLDING = new Set(['moov', 'trak', 'mdia', 'moof', 'traf']);
/** Free space: readers pass over it (ISO/IEC 14496-12, 8.1.2). */
const FREE = Buffer.from('free', 'latin1');

interface Box {
  readonly type: string;
  readonly start: number;
  readonly body: number;
  readonly end: number;
}

const boxAt = async (file: FileHandle, start: number, limit: number): Promise<Box | null> => {
  const head = Buffer.alloc(16);
  const { bytesRead } = await file.read(head, 0, 16, start);
  if (bytesRead < 8) return null;
  const short = head.readUInt32BE(0);
  const type = head.toString('latin1', 4, 8);
  const long = short === 1 && bytesRead === 16;
  const size = short === 0 ? limit - start : long ? Number(head.readBigUInt64BE(8)) : short;
  const body = start + (long ? 16 : 8);
  const end = start + size;
  return size >= body - start && end <= limit ? { type, start, body, end } : null;
};

const blank = async (file: FileHandle, { start, body, end }: Box): Promise<void> => {
  await zeroFill(file, body, end);
  await file.write(FREE, 0, 4, start + 4);
};

const scrubBoxes = async (file: FileHandle, from: number, to: number): Promise<number> => {
  let scrubbed = 0;
  for (let at = from; at < to;) {
    const box = await boxAt(file, at, to);
    if (!box) break;
    if (DESCRIBING.has(box.type)) {
      await blank(file, box);
      scrubbed += 1;
    } else if (HOLDING.has(box.type)) scrubbed += await scrubBoxes(file, box.body, box.end);
    at = box.end;
  }
  return scrubbed;
};

/**
 * Takes the descriptions out of an MP4, MOV, Matroska or WebM in place, location included; frames and their times
 * stay to the byte. Other files are left alone. Running it again changes nothing.
 * @returns how many boxes or elements were blanked
 */
export const scrubLocation = async (path: string): Promise<number> => {
  const file = await open(path, 'r+');
  try {
    const { size } = await file.stat();
    const start = Buffer.alloc(4);
    const { bytesRead } = await file.read(start, 0, 4, 0);
    if (isMatroska(start.subarray(0, bytesRead))) return await scrubMatroska(file, size);
    const first = await boxAt(file, 0, size);
    const isMp4 = first !== null && ['ftyp', 'moov', 'wide', 'mdat', 'free'].includes(first.type);
    return isMp4 ? await scrubBoxes(file, 0, size) : 0;
  } finally {
    await file.close();
  }
};
