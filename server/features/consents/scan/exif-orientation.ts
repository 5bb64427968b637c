/** Exif 2.32: which way up a picture stands, 1 to 8, in the first directory of the TIFF header. */
const ORIENTATION = 0x0112;
const SHORT = 3;
const HEADER = 'Exif\0\0';

/** @param body of an APP1 segment, behind its length; null where it says nothing of it */
export const orientationOf = (body: Buffer): number | null => {
  if (body.subarray(0, 6).toString('latin1') !== HEADER) return null;
  const tiff = body.subarray(6);
  if (tiff.length < 8) return null;
  const order = tiff.subarray(0, 2).toString('latin1');
  if (order !== 'II' && order !== 'MM') return null;
  const short = (at: number) => (order === 'II' ? tiff.readUInt16LE(at) : tiff.readUInt16BE(at));
  const first = order === 'II' ? tiff.readUInt32LE(4) : tiff.readUInt32BE(4);
  if (first + 2 > tiff.length) return null;
  for (let n = 0; n < short(first); n += 1) {
    const entry = first + 2 + n * 12;
    if (entry + 12 > tiff.length) return null;
    if (short(entry) !== ORIENTATION || short(entry + 2) !== SHORT) continue;
    const value = short(entry + 8);
    return value >= 1 && value <= 8 ? value : null;
  }
  return null;
};

/** A whole APP1 segment that says this and nothing else. */
export const orientationSegment = (value: number): Buffer => {
  const tiff = Buffer.alloc(26);
  tiff.write('MM', 0, 'latin1');
  tiff.writeUInt16BE(42, 2);
  tiff.writeUInt32BE(8, 4);
  tiff.writeUInt16BE(1, 8);
  tiff.writeUInt16BE(ORIENTATION, 10);
  tiff.writeUInt16BE(SHORT, 12);
  tiff.writeUInt32BE(1, 14);
  tiff.writeUInt16BE(value, 18);
  const body = Buffer.concat([Buffer.from(HEADER, 'latin1'), tiff]);
  const head = Buffer.from([0xff, 0xe1, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([head, body]);
};
