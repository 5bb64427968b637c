import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runTool } from '#tests/fixtures/video/run-tool.ts';
import { filmSource, type SourceKind } from '#tests/fixtures/video/source-clips.ts';
import { lookAtFile, type LocalLook } from './look-at-file.ts';

/** Real files, made here by ffmpeg; whether a browser decodes them is tested in a browser. */
let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'look-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const lookAt = async (path: string, bytes?: number): Promise<LocalLook> =>
  lookAtFile(new Blob([(await readFile(path)).subarray(0, bytes)]));

const film = async (kind: SourceKind): Promise<LocalLook> =>
  lookAt((await filmSource(kind, folder)).path);

const make = async (name: string, args: readonly string[]): Promise<string> => {
  const path = join(folder, name);
  await runTool('ffmpeg', ['-nostdin', '-y', '-v', 'error', ...args, path]);
  return path;
};

const TEST_PICTURE = ['-f', 'lavfi', '-i', 'testsrc2=s=320x180:r=60:d=2'];
const TEST_SOUND = ['-f', 'lavfi', '-i', 'sine=d=2'];

describe('lookAtFile', { timeout: 60_000 }, () => {
  it('measures a constant rate from the packets, also with B-frames', async () => {
    expect(await film('b-frames')).toMatchObject({
      outcome: 'clip',
      container: 'mp4',
      codec: 'avc',
      width: 640,
      height: 360,
      rotation: 0,
      length: expect.closeTo(3, 2) as number,
      frames: 90,
      frameRate: { kind: 'constant', fps: expect.closeTo(30, 3) as number, gaps: 0 },
      hdr: false,
    });
  });

  it('says that a rate is variable', async () => {
    const look = await film('variable');
    expect(look).toMatchObject({ outcome: 'clip', frameRate: { kind: 'variable' } });
  });

  it('gives the size as displayed, after rotation', async () => {
    expect(await film('rotated')).toMatchObject({
      ...{ outcome: 'clip', container: 'mov', width: 360, height: 640, rotation: 90 },
    });
  });

  it('tells high dynamic range', async () => {
    expect(await film('hdr')).toMatchObject({ outcome: 'clip', codec: 'hevc', hdr: true });
  });

  it('reads WebM, whose times are whole milliseconds', async () => {
    const path = await make('a.webm', [...TEST_PICTURE, '-c:v', 'libvpx-vp9', '-cpu-used', '8']);
    expect(await lookAt(path)).toMatchObject({
      ...{ outcome: 'clip', container: 'webm', codec: 'vp9', width: 320, height: 180 },
      frameRate: { kind: 'constant', fps: expect.closeTo(60, 0) as number },
      length: expect.closeTo(2, 1) as number,
    });
  });

  it('has no picture where there is sound only', async () => {
    const look = await lookAt(await make('a.m4a', TEST_SOUND));
    expect(look).toMatchObject({ outcome: 'no-picture' });
  });

  it('has no index where the file was cut before it', async () => {
    const path = await make('late-index.mp4', [...TEST_PICTURE, '-c:v', 'libx264']);
    expect(await lookAt(path, 20_000)).toMatchObject({ outcome: 'no-index' });
  });

  it('knows a file that was cut after its index', async () => {
    const args = [...TEST_PICTURE, '-c:v', 'libx264', '-movflags', '+faststart'];
    const path = await make('early-index.mp4', args);
    expect(await lookAt(path)).toMatchObject({ outcome: 'clip', cutShort: false });
    expect(await lookAt(path, 20_000)).toMatchObject({ outcome: 'clip', cutShort: true });
  });

  it.each([
    ['empty', new Blob([])],
    ['not-a-video', new Blob(['#EXTM3U\nhttp://example.org/a.ts\n'])],
    ['not-a-video', new Blob([Uint8Array.from({ length: 9000 }, (_, n) => (n * 37) % 256)])],
  ])('is %s', async (outcome, blob) => {
    const look = await lookAtFile(blob);
    expect(look).toMatchObject({ outcome });
    expect('advice' in look && look.advice).toMatch(/\.$/);
  });

  it('stops when it is no longer wanted', async () => {
    const look = lookAtFile(new Blob(['x']), AbortSignal.abort());
    await expect(look).rejects.toMatchObject({ name: 'AbortError' });
  });
});
