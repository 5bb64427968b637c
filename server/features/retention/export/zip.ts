import { crc32 } from 'node:zlib';

/** A file of the archive. What clips hold is compressed already, so nothing is compressed once more. */
export interface ZipEntry {
  /** Path inside the archive, with slashes. */
  readonly name: string;
  readonly modified: Date;
  readonly content: () => Promise<AsyncIterable<Uint8Array>>;
}

/** Bytes; a larger file would take another form of entry, and no clip is as large. */
const LARGEST = 0xffff_ffff;
/** Bit 3: size and checksum follow the content. Bit 11: the name is UTF-8. */
const FLAGS = 0x0808;
const VERSION = 45;

/** MS-DOS date and time, in UTC; it counts from 1980 and in steps of two seconds. */
const dosTime = (at: Date): readonly [time: number, day: number] => [
  (at.getUTCHours() << 11) | (at.getUTCMinutes() << 5) | (at.getUTCSeconds() >> 1),
  ((Math.max(1980, at.getUTCFullYear()) - 1980) << 9) |
    ((at.getUTCMonth() + 1) << 5) |
    at.getUTCDate(),
];

interface Written {
  readonly name: Buffer;
  readonly modified: Date;
  readonly offset: number;
  readonly bytes: number;
  readonly checksum: number;
}

const local = (name: Buffer, modified: Date): Buffer => {
  const head = Buffer.alloc(30);
  const [time, day] = dosTime(modified);
  head.writeUInt32LE(0x04034b50, 0);
  head.writeUInt16LE(VERSION, 4);
  head.writeUInt16LE(FLAGS, 6);
  head.writeUInt16LE(time, 10);
  head.writeUInt16LE(day, 12);
  head.writeUInt16LE(name.length, 26);
  return Buffer.concat([head, name]);
};

const behind = ({ checksum, bytes }: Pick<Written, 'checksum' | 'bytes'>): Buffer => {
  const tail = Buffer.alloc(16);
  tail.writeUInt32LE(0x08074b50, 0);
  tail.writeUInt32LE(checksum, 4);
  tail.writeUInt32LE(bytes, 8);
  tail.writeUInt32LE(bytes, 12);
  return tail;
};

/** Offsets always in the long form: archives of many clips pass 4 GB. */
const listed = ({ name, modified, offset, bytes, checksum }: Written): Buffer => {
  const head = Buffer.alloc(46);
  const [time, day] = dosTime(modified);
  head.writeUInt32LE(0x02014b50, 0);
  head.writeUInt16LE(VERSION, 4);
  head.writeUInt16LE(VERSION, 6);
  head.writeUInt16LE(FLAGS, 8);
  head.writeUInt16LE(time, 12);
  head.writeUInt16LE(day, 14);
  head.writeUInt32LE(checksum, 16);
  head.writeUInt32LE(bytes, 20);
  head.writeUInt32LE(bytes, 24);
  head.writeUInt16LE(name.length, 28);
  head.writeUInt16LE(12, 30);
  head.writeUInt32LE(0xffff_ffff, 42);
  const long = Buffer.alloc(12);
  long.writeUInt16LE(1, 0);
  long.writeUInt16LE(8, 2);
  long.writeBigUInt64LE(BigInt(offset), 4);
  return Buffer.concat([head, name, long]);
};

const ending = (count: number, start: number, length: number): Buffer => {
  const long = Buffer.alloc(56 + 20);
  long.writeUInt32LE(0x06064b50, 0);
  long.writeBigUInt64LE(44n, 4);
  long.writeUInt16LE(VERSION, 12);
  long.writeUInt16LE(VERSION, 14);
  long.writeBigUInt64LE(BigInt(count), 24);
  long.writeBigUInt64LE(BigInt(count), 32);
  long.writeBigUInt64LE(BigInt(length), 40);
  long.writeBigUInt64LE(BigInt(start), 48);
  long.writeUInt32LE(0x07064b50, 56);
  long.writeBigUInt64LE(BigInt(start + length), 64);
  long.writeUInt32LE(1, 72);
  const short = Buffer.alloc(22, 0xff);
  short.writeUInt32LE(0x06054b50, 0);
  short.writeUInt32LE(0, 4);
  short.writeUInt16LE(0, 20);
  return Buffer.concat([long, short]);
};

/** An archive as it is read, file by file, holding none of them in memory (PKWARE APPNOTE 6.3.10, stored, ZIP64). */
export async function* zip(entries: readonly ZipEntry[]): AsyncGenerator<Uint8Array> {
  const written: Written[] = [];
  let at = 0;
  const put = (part: Uint8Array): Uint8Array => {
    at += part.length;
    return part;
  };
  for (const entry of entries) {
    const name = Buffer.from(entry.name, 'utf8');
    const offset = at;
    yield put(local(name, entry.modified));
    let checksum = 0;
    let bytes = 0;
    for await (const part of await entry.content()) {
      checksum = crc32(part, checksum);
      bytes += part.length;
      if (bytes > LARGEST) throw new Error('A file is too large for this archive.');
      yield put(part);
    }
    yield put(behind({ checksum, bytes }));
    written.push({ name, modified: entry.modified, offset, bytes, checksum });
  }
  const start = at;
  for (const each of written) yield put(listed(each));
  yield put(ending(written.length, start, at - start));
}
