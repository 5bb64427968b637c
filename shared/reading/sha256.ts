/** First 32 bits of the fractional parts of the roots of the first primes, as the standard asks. */
const rootBits = (count: number, power: number): Uint32Array => {
  const bits = new Uint32Array(count);
  let found = 0;
  for (let n = 2; found < count; n += 1) {
    let prime = true;
    for (let q = 2; q * q <= n; q += 1) if (n % q === 0) prime = false;
    if (!prime) continue;
    const root = n ** power;
    bits[found] = (root - Math.floor(root)) * 2 ** 32;
    found += 1;
  }
  return bits;
};

const START = rootBits(8, 1 / 2);
const ROUND = rootBits(64, 1 / 3);

const rotate = (x: number, by: number): number => (x >>> by) | (x << (32 - by));

/** Message, a one bit, zeros, and the length in bits as the last eight bytes. */
const padded = (text: string): DataView => {
  const message = new TextEncoder().encode(text);
  const blocks = Math.ceil((message.length + 9) / 64);
  const bytes = new Uint8Array(blocks * 64);
  bytes.set(message);
  bytes[message.length] = 0x80;
  const view = new DataView(bytes.buffer);
  const bits = message.length * 8;
  view.setUint32(bytes.length - 8, Math.floor(bits / 2 ** 32));
  view.setUint32(bytes.length - 4, bits >>> 0);
  return view;
};

/** SHA-256 (FIPS 180-4) of a text in UTF-8, as eight 32-bit words. Synchronous, everywhere. */
export const sha256Words = (text: string): Uint32Array => {
  const view = padded(text);
  const state = Uint32Array.from(START);
  const w = new Int32Array(64);
  for (let block = 0; block < view.byteLength; block += 64) {
    for (let i = 0; i < 16; i += 1) w[i] = view.getInt32(block + i * 4);
    for (let i = 16; i < 64; i += 1) {
      const a = w[i - 15] ?? 0;
      const b = w[i - 2] ?? 0;
      const s0 = rotate(a, 7) ^ rotate(a, 18) ^ (a >>> 3);
      const s1 = rotate(b, 17) ^ rotate(b, 19) ^ (b >>> 10);
      w[i] = ((w[i - 16] ?? 0) + s0 + (w[i - 7] ?? 0) + s1) | 0;
    }
    let [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0] = state;
    for (let i = 0; i < 64; i += 1) {
      const s1 = rotate(e, 6) ^ rotate(e, 11) ^ rotate(e, 25);
      const t1 = (h + s1 + ((e & f) ^ (~e & g)) + (ROUND[i] ?? 0) + (w[i] ?? 0)) | 0;
      const s0 = rotate(a, 2) ^ rotate(a, 13) ^ rotate(a, 22);
      const t2 = (s0 + ((a & b) ^ (a & c) ^ (b & c))) | 0;
      h = g;
      g = f;
      f = e;
      e = (d + t1) | 0;
      d = c;
      c = b;
      b = a;
      a = (t1 + t2) | 0;
    }
    for (const [i, value] of [a, b, c, d, e, f, g, h].entries()) state[i] = (state[i] ?? 0) + value;
  }
  return state;
};

/** Words as 64 hexadecimal digits. */
export const hexOf = (words: Uint32Array): string =>
  Array.from(words, (word) => word.toString(16).padStart(8, '0')).join('');

export const sha256Hex = (text: string): string => hexOf(sha256Words(text));
