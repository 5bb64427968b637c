import { copyFile, mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import {
  type BadInput,
  makeBadInput,
  makeClipWithHiddenPlaylist,
} from '#tests/fixtures/media/make-bad-input.ts';
import { makeClip, makeTooLongClip } from '#tests/fixtures/media/make-clips.ts';
import { seconds } from '#shared/timing/units.ts';
import { prepareClip } from './prepare-clip.ts';
import { MediaRefusal, type MediaRefusalCode } from './refusals.ts';
import type { PrepareOptions } from './types.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'bad-input-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const outDir = () => join(folder, 'copies');
const prepare = (original: string, options: PrepareOptions = {}) =>
  prepareClip({ original, outDir: outDir(), ...options });

async function refusalOf(original: string, options: PrepareOptions = {}): Promise<MediaRefusal> {
  const error: unknown = await prepare(original, options).catch((reason: unknown) => reason);
  if (!(error instanceof MediaRefusal)) throw new Error(`not a refusal: ${String(error)}`);
  const left = (await readdir(folder)).filter((name) => name.startsWith('copies'));
  expect(left, 'nothing half made stays').toEqual([]);
  return error;
}

type Row = [kind: BadInput, name: string, code: MediaRefusalCode, says: RegExp];
const rows: Row[] = [
  ['empty', 'a.mp4', 'empty', /empty.*send it once more/],
  ['text', 'a.mp4', 'not-a-video', /not a video/],
  ['noise', 'a.mov', 'not-a-video', /not a video/],
  [
    'headerCutOff',
    'a.mov',
    'header-missing',
    /cut while sending or while recording; send it again/,
  ],
  ['cutShort', 'a.mp4', 'truncated', /stops after 1\.\d s of 2\.0 s: .*use the part that is there/],
  ['cutShortMatroska', 'a.mkv', 'truncated', /stops after 1\.\d s of 2\.0 s/],
  ['cutAfterHeader', 'a.mp4', 'only-header', /Only the beginning.*send it again/],
  ['damagedMiddle', 'a.mp4', 'damaged', /damaged from [01]\.\d s on: \d+ frames? cannot be read/],
  ['soundOnly', 'a.mp4', 'sound-only', /sound but no picture/],
  ['coverOnly', 'a.mp4', 'cover-only', /cover picture/],
  ['oneFrame', 'a.mp4', 'one-frame', /single frame/],
  ['tooWide', 'a.mov', 'absurd-size', /16000 × 64/],
  ['tooSmall', 'a.mp4', 'absurd-size', /32 × 32 pixels, too small/],
  ['strangeCodec', 'a.mkv', 'unsupported-codec', /ffv1.*H\.264 or HEVC/],
  ['avi', 'a.avi', 'unsupported-container', /AVI.*MP4, MOV or WebM/],
  ['transportStream', 'a.ts', 'unsupported-container', /transport stream/],
  ['gif', 'a.gif', 'still-image', /GIF/],
  ['png', 'a.mp4', 'still-image', /PNG/],
  ['pdf', 'a.mp4', 'wrong-extension', /ends in \.mp4, but the file holds a PDF/],
  ['pdf', 'a.pdf', 'not-a-video', /not a video/],
  ['hls', 'a.mp4', 'playlist', /HLS.*points to other files/],
  ['dash', 'a.mp4', 'playlist', /DASH/],
  ['concat', 'a.mp4', 'playlist', /concat/],
  ['concatBare', 'a.mp4', 'playlist', /concat/],
  ['sdp', 'a.mp4', 'playlist', /SDP/],
  ['playlistThenClip', 'a.mp4', 'playlist', /HLS/],
  ['pictureThenClip', 'a.mp4', 'still-image', /JPEG/],
];

describe('a file that is no sound clip is refused with what to do', () => {
  it.each(rows)('%s named %s: %s', async (kind, originalName, code, says) => {
    // an upload has no ending of its own: content decides
    const original = join(
      folder,
      `${kind}-${originalName.split('.').at(-1) ?? ''}`.replace('.', '-'),
    );
    const withEnding = `${original}.${originalName.split('.').at(-1) ?? 'bin'}`;
    await makeBadInput(kind, withEnding);
    await copyFile(withEnding, original);
    const refusal = await refusalOf(original, { originalName });
    expect(refusal.code).toBe(code);
    expect(refusal.sentence).toMatch(says);
    expect(refusal.sentence).not.toContain(folder);
  });
});

describe('what can be used is offered and taken', () => {
  it.each(['cutShort', 'damagedMiddle', 'cutShortMatroska'] as const)('%s', async (kind) => {
    const original = join(folder, `${kind}-remains.${kind === 'cutShortMatroska' ? 'mkv' : 'mp4'}`);
    await makeBadInput(kind, original);
    const { usableSeconds } = await refusalOf(original);
    const clip = await prepare(original, { acceptRemains: true });
    const length = clip.frames.ticks.length;
    expect(length).toBeLessThan(60);
    expect(length).toBeGreaterThan(20);
    // the last packet of a cut file may be a part of a frame
    expect(Math.abs((usableSeconds ?? 0) - length / 30)).toBeLessThan(2 / 30);
    expect(clip.strip.frames.at(-1)).toBeLessThan(length);
    await rm(outDir(), { recursive: true });
  });

  it('a clip of too many frames says how much may be taken, and a part of it is exact', async () => {
    const original = join(folder, 'long.mp4');
    await makeTooLongClip(original);
    const refusal = await refusalOf(original);
    expect(refusal.code).toBe('too-long');
    expect(refusal.sentence).toMatch(/7440 frames.*choose the part that matters, at most 30\.0 s/);

    const part = { from: seconds(20.25), to: seconds(20.35) };
    const clip = await prepare(original, { part });
    expect(clip.frames.ticks.length).toBe(24);
    const { ticks, timeBase } = clip.origin;
    expect((ticks * timeBase.num) / timeBase.den).toBe(20.25);
    expect(clip.frames.us.slice(0, 3)).toEqual([0, 4167, 8333]);
    expect(clip.part).toEqual(part);
    await rm(outDir(), { recursive: true });

    const outside = await refusalOf(original, { part: { from: seconds(40), to: seconds(41) } });
    expect(outside.code).toBe('part-outside');
  });
});

describe('content decides, not the name', () => {
  it('takes a sound clip under another ending', async () => {
    const original = join(folder, 'really-webm.mp4');
    const webm = join(folder, 'source.webm');
    await makeClip('webm.webm', webm);
    await copyFile(webm, original);
    const clip = await prepare(original, { originalName: 'clip.mp4' });
    expect(clip.facts.container).toBe('webm');
    await rm(outDir(), { recursive: true });
  });

  it('takes a clip that carries a playlist in its padding, and leaves that out', async () => {
    const original = join(folder, 'hidden.mp4');
    await makeClipWithHiddenPlaylist(original);
    const clip = await prepare(original);
    expect(clip.frames.ticks.length).toBe(60);
    await rm(outDir(), { recursive: true });
  });
});
