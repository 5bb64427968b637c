import { execFileSync } from 'node:child_process';
import { mkdtemp, readFile, rm, stat, truncate, writeFile } from 'node:fs/promises';
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
    ['plain.webm', ['-c:v', 'libvpx']],
    ['plain.mkv', ['-c:v', 'libx264', '-metadata:s:v', `location=${PLACE}`]],
    // as a browser records: no length of the whole nor of its parts is known
    ['live.webm', ['-c:v', 'libvpx', '-live', '1', '-cluster_time_limit', '200']],
  ] as const)('%s keeps every frame and its time, and forgets the place', async (name, more) => {
    const path = film(name, ...more);
    expect((await readFile(path)).includes(PLACE)).toBe(true);
    const before = framesOf(path);
    expect(await scrubLocation(path)).toBeGreaterThan(0);
    expect((await readFile(path)).includes(PLACE)).toBe(false);
    expect(framesOf(path)).toBe(before);
    expect(await scrubLocation(path)).toBe(0);
  });

  it.each([
    ['sound.webm', ['-c:v', 'libvpx']],
    ['sound.mkv', ['-c:v', 'libx264']],
  ] as const)('%s is still sound to a strict reader, and jumps to a moment', async (name, more) => {
    const path = film(name, ...more);
    const readStrictly = (): string =>
      execFileSync('ffmpeg', [
        ...['-v', 'warning', '-err_detect', 'crccheck+bitstream+buffer+explode', '-ss', '0.5'],
        ...['-i', path, '-f', 'framemd5', '-'],
      ]).toString();
    const before = readStrictly();
    const { size } = await stat(path);
    await scrubLocation(path);
    expect((await stat(path)).size).toBe(size);
    expect(readStrictly()).toBe(before);
    const told = execFileSync('ffprobe', [
      ...['-v', 'warning', '-show_entries', 'format_tags:stream_tags', '-of', 'json', path],
    ]).toString();
    expect(told.toLowerCase()).not.toMatch(/location|title/);
    // a figure about the pictures stays
    expect(told).toContain('"DURATION": "00:00:01.000000000"');
  });

  it('forgets the place in what is left of a WebM that was cut', async () => {
    const path = film('cut.webm', '-c:v', 'libvpx');
    const whole = await readFile(path);
    const place = whole.lastIndexOf(PLACE);
    await truncate(path, place + PLACE.length);
    expect(await scrubLocation(path)).toBeGreaterThan(0);
    expect((await readFile(path)).includes(PLACE)).toBe(false);
    expect((await stat(path)).size).toBe(place + PLACE.length);
  });

  it('leaves what is no film alone, cut files included', async () => {
    const path = join(folder, 'noise.mp4');
    await writeFile(path, 'not a film at all');
    expect(await scrubLocation(path)).toBe(0);
    expect(await readFile(path, 'utf8')).toBe('not a film at all');
    await writeFile(path, Buffer.from([0, 0, 0]));
    expect(await scrubLocation(path)).toBe(0);
  });
});
