import { createHash } from 'node:crypto';
import { expect, it } from 'vitest';
import { canonicalText } from './canonical.ts';
import { sha256Hex, sha256Words } from './sha256.ts';

it('hashes the standard’s own examples (FIPS 180-4)', () => {
  expect(sha256Hex('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  expect(sha256Hex('')).toBe('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855');
  expect(sha256Words('abc')[0]).toBe(0xba7816bf);
});

it('hashes like the platform at every padding', () => {
  for (const length of [1, 54, 55, 56, 57, 63, 64, 65, 119, 120, 128, 4096]) {
    const text = 'é'.repeat(length >> 1) + 'x'.repeat(length & 1);
    expect(sha256Hex(text)).toBe(createHash('sha256').update(text).digest('hex'));
  }
});

it('writes one text for one value', () => {
  expect(canonicalText({ b: 1, a: [2, null, 'x'] })).toBe('{"a":[2,null,"x"],"b":1}');
  expect(canonicalText({ a: [2, null, 'x'], c: undefined, b: 1 })).toBe(
    canonicalText({ b: 1, a: [2, null, 'x'] }),
  );
  expect(canonicalText(-0)).toBe('0');
  expect(canonicalText(0.1 + 0.2)).toBe('0.30000000000000004');
});

it('tells unknown from not a number', () => {
  expect(canonicalText({ a: null })).not.toBe(canonicalText({ a: NaN }));
  expect(canonicalText(Infinity)).not.toBe(canonicalText(-Infinity));
});
