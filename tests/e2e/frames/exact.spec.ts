import { expect, test } from '@playwright/test';
import { type Gop, prepareCopy } from '../../fixtures/video/prepare-copy.ts';
import { filmSource, type SourceKind } from '../../fixtures/video/source-clips.ts';
import { type ClipServer, randomJumps, startClipServer, upTo } from './clip-server.ts';

const KINDS: readonly SourceKind[] = [
  'constant-30',
  'constant-60',
  'constant-240',
  'variable',
  'rotated',
  'b-frames',
  'hevc',
  'hdr',
  'four-k',
];
const GOPS: readonly Gop[] = [1, 5];

// a trace films the page, which takes more time than the decoding
test.use({ trace: 'off' });

let server: ClipServer;
test.beforeAll(async () => {
  server = await startClipServer();
});
test.afterAll(() => server.close());

for (const kind of KINDS) {
  test(`every frame of a ${kind} original is the one asked for`, async ({ page }) => {
    test.setTimeout(180_000);
    const original = await filmSource(kind, server.folder);
    await page.goto(server.origin);
    for (const gop of GOPS) {
      const copy = await prepareCopy(original, gop);
      expect(copy.ticks).toHaveLength(original.frames);
      const all = upTo(original.frames);

      const request = server.request(copy);
      expect(await page.evaluate((r) => window.harness.open(r), request)).toBe('decoder');
      const forwards = await page.evaluate((n) => window.harness.walk(n, 'step'), all);
      expect(forwards, `forwards, key frame every ${gop}`).toEqual([]);
      const backwards = await page.evaluate(
        (n) => window.harness.walk(n, 'step'),
        all.toReversed(),
      );
      expect(backwards, `backwards, key frame every ${gop}`).toEqual([]);

      const cold = { ...request, cacheBytes: 1 };
      expect(await page.evaluate((r) => window.harness.open(r), cold)).toBe('decoder');
      const jumps = await page.evaluate(
        (n) => window.harness.walk(n),
        randomJumps(original.frames),
      );
      expect(jumps, `jumps with nothing cached, key frame every ${gop}`).toEqual([]);
    }
  });
}
