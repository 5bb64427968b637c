import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import {
  type ClipKind,
  clipKinds,
  ffmpeg,
  ffprobe,
  makeClip,
  makePhoneClip,
} from '#tests/fixtures/media/make-clips.ts';
import { prepareClip } from './prepare-clip.ts';
import type { PreparedClip, Timestamp } from './types.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'prepare-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

/** Instants of the decoded frames as 'seconds × 10⁹' from the first one: another way than ours to count. */
async function decodedTimes(path: string): Promise<bigint[]> {
  const lines = await ffprobe(
    ...['-select_streams', 'V:0', '-show_entries', 'frame=best_effort_timestamp'],
    ...['-show_entries', 'stream=time_base', '-of', 'csv=p=0', path],
  );
  const rows = lines.trim().split('\n');
  const [, num = '1', den = '1'] = rows.map((row) => /^(\d+)\/(\d+)/.exec(row)).find(Boolean) ?? [];
  const ticks = rows.flatMap((row) =>
    /^-?\d+(,|$)/.test(row) ? [BigInt(row.split(',')[0] ?? '')] : [],
  );
  return ticks.map((tick) => ((tick - (ticks[0] ?? 0n)) * BigInt(num) * 10n ** 9n) / BigInt(den));
}
const nanoseconds = (frames: PreparedClip['frames']) =>
  frames.ticks.map(
    (tick) =>
      (BigInt(tick) * BigInt(frames.timeBase.num) * 10n ** 9n) / BigInt(frames.timeBase.den),
  );

/** Likeness of two clips frame by frame, dB, of the worst frame; 30 and more is the same picture. */
async function worstLikeness(copy: string, original: string, size: string): Promise<number> {
  const { stdout } = await ffmpeg(
    ...['-i', copy, '-i', original, '-filter_complex'],
    `[0:v]settb=1/1,setpts=N[a];[1:v]settb=1/1,setpts=N,scale=${size},format=yuv420p[b];[a][b]psnr=stats_file=-[x]`,
    ...['-map', '[x]', '-f', 'null', '-'],
  );
  const each = [...stdout.matchAll(/psnr_avg:(\S+)/g)].map((match) => Number(match[1]));
  expect(each.length).toBeGreaterThan(0);
  return Math.min(...each);
}

interface Prepared {
  readonly original: string;
  readonly clip: PreparedClip;
}
const made = new Map<ClipKind, Promise<Prepared>>();

/** Each kind is made and prepared once for all tests of this file. */
function prepared(kind: ClipKind): Promise<Prepared> {
  const known = made.get(kind) ?? prepare(kind);
  made.set(kind, known);
  return known;
}
async function prepare(kind: ClipKind): Promise<Prepared> {
  const original = join(folder, kind);
  await makeClip(kind, original);
  const clip = await prepareClip({ original, outDir: join(folder, `${kind}-copies`) });
  return { original, clip };
}

describe('a sound clip', () => {
  it.each(clipKinds)('%s: every frame keeps its exact instant and its picture', async (kind) => {
    const { original, clip } = await prepared(kind);
    const times = await decodedTimes(original);
    expect(times.length).toBeGreaterThan(10);
    expect(nanoseconds(clip.frames)).toEqual(times);
    expect(await decodedTimes(clip.bench.path)).toEqual(times);
    expect(await decodedTimes(clip.replay.path)).toEqual(times);
    expect(clip.frames.ticks[0]).toBe(0);
    expect(clip.lostFrames).toBe(0);
    expect(clip.strip.frames.at(-1)).toBeLessThan(times.length);
    if (clip.facts.dynamicRange === 'standard' && kind !== 'full-range.mp4') {
      const size = `${clip.bench.width}:${clip.bench.height}`;
      expect(await worstLikeness(clip.bench.path, original, size)).toBeGreaterThan(30);
    }
  });

  it('has copies that any browser plays: H.264, 8 bit, no B-frames, index first', async () => {
    const { clip } = await prepared('b-frames.mp4');
    for (const { path } of [clip.bench, clip.replay]) {
      const facts = await ffprobe(
        ...['-show_entries', 'stream=codec_name,pix_fmt,has_b_frames,sample_aspect_ratio'],
        ...['-of', 'csv=p=0', path],
      );
      expect(facts.trim()).toBe('h264,0,1:1,yuv420p');
      const head = (await readFile(path)).toString('latin1');
      expect(head.indexOf('moov')).toBeLessThan(head.indexOf('mdat'));
    }
    const keys = await ffprobe('-show_entries', 'packet=flags', '-of', 'csv=p=0', clip.bench.path);
    expect(
      keys
        .trim()
        .split('\n')
        .every((flags) => flags.startsWith('K')),
    ).toBe(true);
  });
});

describe('facts', () => {
  it('measures constant rates as exact fractions and varying ones as such', async () => {
    const rate = async (kind: ClipKind) => (await prepared(kind)).clip.facts.frameRate;
    expect(await rate('b-frames.mp4')).toEqual({
      kind: 'constant',
      rate: { numerator: 30000, denominator: 1001 },
    });
    expect(await rate('slow-motion.mp4')).toEqual({
      kind: 'constant',
      rate: { numerator: 240, denominator: 1 },
    });
    const varying = await rate('variable.mp4');
    expect(varying.kind).toBe('variable');
    if (varying.kind !== 'variable') return;
    expect(varying.min).toBeLessThan(varying.median);
    expect(varying.median).toBeLessThan(varying.max);
  });

  it('widens pixels that are not square and keeps odd sizes in the facts', async () => {
    const { clip } = await prepared('odd.webm');
    expect(clip.facts.coded).toEqual({ width: 191, height: 107 });
    // 191 × 4/3, as a player shows it
    expect(clip.facts.upright).toEqual({ width: 255, height: 107 });
    expect(clip.bench).toMatchObject({ width: 254, height: 106 });
  });

  it('knows high dynamic range and brings it back to what a browser shows', async () => {
    const { clip } = await prepared('hlg.mov');
    expect(clip.facts).toMatchObject({ dynamicRange: 'hlg', codec: 'hevc' });
    const tags = await ffprobe(
      ...['-show_entries', 'stream=color_transfer,color_primaries,color_space,pix_fmt'],
      ...['-of', 'csv=p=0', clip.bench.path],
    );
    expect(tags.trim()).toBe('yuv420p,bt709,bt709,bt709');
  });

  it('keeps white white where a phone used the full range', async () => {
    const { clip } = await prepared('full-range.mp4');
    const { stdout } = await ffmpeg(
      ...['-i', clip.bench.path, '-vf', 'signalstats,metadata=print:file=-', '-frames:v', '1'],
      ...['-f', 'null', '-'],
    );
    expect(Number(/YAVG=(\S+)/.exec(stdout)?.[1])).toBeCloseTo(235, 0);
  });

  it('keeps the offset of a clip that starts late', async () => {
    const { clip } = await prepared('late-start.mp4');
    const seconds = ({ ticks, timeBase }: Timestamp) => (ticks * timeBase.num) / timeBase.den;
    expect(seconds(clip.facts.startOffset)).toBeCloseTo(1.7, 3);
    expect(clip.origin).toEqual(clip.facts.startOffset);
  });
});

describe('a clip as an upright phone writes it', () => {
  it('is turned, kept to the tick, and stripped of its place', async () => {
    const original = join(folder, 'phone.mov');
    const { place } = await makePhoneClip(original);
    expect((await readFile(original)).includes(place)).toBe(true);
    const outDir = join(folder, 'phone-copies');
    const clip = await prepareClip({ original, outDir });
    expect(clip.facts).toMatchObject({
      container: 'mov',
      codec: 'hevc',
      rotation: 90,
      coded: { width: 192, height: 108 },
      upright: { width: 108, height: 192 },
      hasSound: true,
    });
    expect(clip.facts.frameRate.kind).toBe('variable');
    expect(clip.bench).toMatchObject({ width: 108, height: 192 });
    expect(nanoseconds(clip.frames)).toEqual(await decodedTimes(original));
    expect(await worstLikeness(clip.bench.path, original, '108:192')).toBeGreaterThan(30);
    const files = await readdir(outDir);
    expect(files.sort()).toEqual(['bench.mp4', 'poster.jpg', 'replay.mp4', 'strip.jpg']);
    for (const file of files) {
      const bytes = await readFile(join(outDir, file));
      for (const trace of [place, '+48.', 'ISO6709', 'location'])
        expect(bytes.includes(trace), `${file} holds ${trace}`).toBe(false);
    }
    const copy = await ffprobe(
      '-show_entries',
      'stream=codec_type:stream_side_data',
      clip.bench.path,
    );
    expect(copy).not.toMatch(/audio|rotation/);
  });
});
