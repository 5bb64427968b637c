const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';

/** Base 32 without padding (RFC 4648, section 6), as authenticators read it. */
export const base32 = (bytes: Uint8Array): string => {
  let bits = 0;
  let held = 0;
  let text = '';
  for (const byte of bytes) {
    held = (held << 8) | byte;
    bits += 8;
    for (; bits >= 5; bits -= 5) text += ALPHABET[(held >> (bits - 5)) & 31];
    held &= (1 << bits) - 1;
  }
  return bits === 0 ? text : text + ALPHABET[(held << (5 - bits)) & 31];
};
