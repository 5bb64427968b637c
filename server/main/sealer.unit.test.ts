import { expect, it } from 'vitest';
import { sealWith } from './sealer.ts';

const plain = Buffer.from('a secret of twenty b');

it('opens what it sealed, for the same thing alone and with the same key alone', () => {
  const sealer = sealWith('one key');
  const sealed = sealer.seal(plain, 'wren');
  expect(sealed).not.toContain(plain.toString('base64url'));
  expect(sealer.open(sealed, 'wren')).toEqual(plain);
  expect(sealer.seal(plain, 'wren')).not.toBe(sealed);
  expect(() => sealer.open(sealed, 'curlew')).toThrow();
  expect(() => sealWith('another key').open(sealed, 'wren')).toThrow();
  const changed = Buffer.from(sealed, 'base64url');
  changed[changed.length - 1] = (changed.at(-1) ?? 0) ^ 1;
  expect(() => sealer.open(changed.toString('base64url'), 'wren')).toThrow();
});
