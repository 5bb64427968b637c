import { execFileSync } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { scrubLocation } from './scrub-location.ts';

const PLACE = '+52.5200+013.4050/';
let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'redshank-scrub-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const film = (name: string, ...more: string[]): string => {
  const path = join(folder, name);
  execFileSync('ffmpeg', [
    ...['-v', 'error', '-y', '-f', 'lavfi', '-i', 'testsrc=size=128x96:rate=30:duration=1'],
    ...[
      '-metadata',
      `title=${PLACE}`,
      '-metadata',
      `location=${PLACE}`,
      '-metadata',
      `com.apple.quicktime.location.ISO6709=${PLACE}`,
    ],
    ...['-pix_fmt', 'yuv420p', ...more, path],
  ]);
  return path;
};

const framesOf = (path: string): string =>
  execFileSync('ffmpeg', ['-v', 'error', '-i', path, '-f', 'framemd5', '-']).toString();

describe('taking the location out', () => {
  it.each([
    ['plain.mov', []],
    ['keyed.mov', ['-movflags', 'use_metadata_tags']],
    ['front.mp4', ['-movflags', '+faststart']],
  ] as const)('%s keeps every frame and its time, and forgets the place', async (name, more) => {
    const path = film(name, ...more);
    expect((await readFile(path)).includes(PLACE)).toBe(true);
    const before = framesOf(path);
    expect(await scrubLocation(path)).toBeGreaterThan(0);
    expect((await readFile(path)).includes(PLACE)).toBe(false);
    expect(framesOf(path)).toBe(before);
    expect(await scrubLocation(path)).toBe(0);
  });

  it('leaves what is no MP4 alone, cut files included', async () => {
    const path = join(folder, 'noise.mp4');
    await writeFile(path, 'not a film at all');
    expect(await scrubLocation(path)).toBe(0);
    expect(await readFile(path, 'utf8')).toBe('not a film at all');
    await writeFile(path, Buffer.from([0, 0, 0]));
    expect(await scrubLocation(path)).toBe(0);
  });
});
