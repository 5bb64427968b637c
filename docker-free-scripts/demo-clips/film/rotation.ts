/**
 * Phones store an upright picture lying on its side and say in the track's display matrix how to turn
 * it. The matrix stands in the track header (tkhd) of ISO base media files, ISO/IEC 14496-12, 8.3.2.
 */

/** Fixed-point 16.16 matrix for a quarter turn clockwise, moved back into view by the stored height. */
const quarterTurn = (storedHeight: number): readonly number[] => [
  0,
  0x10000,
  0,
  -0x10000,
  0,
  0,
  storedHeight << 16,
  0,
  0x40000000,
];

/** From the start of a version 0 header's payload to its matrix, bytes. */
const TO_MATRIX = 40;

/** Rewrites the first picture track's matrix so that players turn it 90° clockwise. */
export const turnUpright = (file: Buffer, storedHeight: number): Buffer => {
  const out = Buffer.from(file);
  for (let at = out.indexOf('tkhd'); at >= 0; at = out.indexOf('tkhd', at + 4)) {
    const payload = at + 4;
    if (out[payload] !== 0) throw new Error('only version 0 track headers can be turned');
    const width = out.readUInt32BE(payload + TO_MATRIX + 36);
    if (width === 0) continue; // sound has no size
    for (const [index, value] of quarterTurn(storedHeight).entries())
      out.writeInt32BE(value, payload + TO_MATRIX + 4 * index);
    return out;
  }
  throw new Error('the file holds no picture track');
};
