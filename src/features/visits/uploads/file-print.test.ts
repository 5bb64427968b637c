import { describe, expect, it } from 'vitest';
import { filePrint } from './file-print.ts';

/** FNV-1a 64 of "foobar" as its authors publish it. */
const FOOBAR = '85944171f73967e8';

describe('filePrint', () => {
  it('is the published hash with the size', async () => {
    expect(await filePrint(new Blob(['foobar']))).toBe(`6-${FOOBAR}`);
  });
  it('does not depend on name or date, but on both ends', async () => {
    const bytes = new Uint8Array(700_000).fill(7);
    const print = (data: Uint8Array<ArrayBuffer>, name: string) =>
      filePrint(new File([data], name, { lastModified: name.length }));
    const first = await print(bytes, 'IMG_1.MOV');
    expect(await print(bytes, 'copy of IMG_1.MOV')).toBe(first);
    const changed = bytes.slice();
    changed[699_999] = 8;
    expect(await print(changed, 'IMG_1.MOV')).not.toBe(first);
  });
});
