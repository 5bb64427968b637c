/** Chunks that change how the picture looks (PNG, third edition); eXIf, texts, times and private ones go. */
const KEPT = new Set([
  ...['IHDR', 'PLTE', 'IDAT', 'IEND', 'tRNS', 'cHRM', 'gAMA', 'iCCP', 'sBIT', 'sRGB', 'cICP'],
  ...['bKGD', 'pHYs'],
]);

/** The same picture without its metadata. Null where it is not a whole PNG. */
export const cleanPng = (given: Buffer): Buffer | null => {
  const kept: Buffer[] = [given.subarray(0, 8)];
  let at = 8;
  while (at + 12 <= given.length) {
    const end = at + 12 + given.readUInt32BE(at);
    if (end > given.length) return null;
    const type = given.subarray(at + 4, at + 8).toString('latin1');
    if (at === 8 && type !== 'IHDR') return null;
    if (KEPT.has(type)) kept.push(given.subarray(at, end));
    if (type === 'IEND') return Buffer.concat(kept);
    at = end;
  }
  return null;
};
