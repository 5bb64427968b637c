import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdir, mkdtemp, readdir, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { makeClip, makeLongClip } from '#tests/fixtures/media/make-clips.ts';
import { confinement } from './confinement.ts';
import { MediaFailure } from './failures.ts';
import { prepareClip } from './prepare-clip.ts';
import type { PreparationProgress } from './types.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let folder: string;
let long: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'interrupted-'));
  long = join(folder, 'long.mp4');
  await makeLongClip(long);
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const beside = async (name: string) =>
  (await readdir(folder)).filter((entry) => entry.startsWith(name));

/** Command lines of running processes that name this folder. */
async function running(): Promise<string[]> {
  const ids = (await readdir('/proc')).filter((name) => /^\d+$/.test(name));
  const lines = await Promise.all(
    ids.map((id) => readFile(`/proc/${id}/cmdline`, 'latin1').catch(() => '')),
  );
  return lines.filter((line) => line.includes(folder) && line.includes('ffmpeg'));
}

it('a worker killed mid-way leaves no process, no copies, and the next run sweeps up', async () => {
  const outDir = join(folder, 'killed');
  const script = new URL('../../tests/fixtures/media/prepare-worker.ts', import.meta.url).pathname;
  const worker = spawn(process.execPath, ['--import', 'tsx', script, long, outDir], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const gone = once(worker, 'exit');
  for await (const line of createInterface(worker.stdout))
    if (line.startsWith('copying') && Number(line.split(' ')[1]) > 4) break;
  expect((await beside('killed')).length, 'work is under way').toBe(1);
  worker.kill('SIGKILL');
  await gone;
  if ((await confinement()).diesWithParent) await expect.poll(running).toEqual([]);
  expect(await beside('killed')).toEqual([expect.stringMatching(/^killed\.part-/)]);

  const short = join(folder, 'short.mp4');
  await makeClip('constant.mp4', short);
  const clip = await prepareClip({ original: short, outDir });
  expect(clip.frames.ticks.length).toBe(30);
  expect(await beside('killed')).toEqual(['killed']);
});

it('a cancelled run stops its tool and leaves nothing', async () => {
  const stop = new AbortController();
  const run = prepareClip({
    original: long,
    outDir: join(folder, 'cancelled'),
    signal: stop.signal,
    onProgress: ({ stage, percent }) => {
      if (stage === 'copying' && percent > 4) stop.abort();
    },
  });
  await expect(run).rejects.toMatchObject({ name: 'MediaFailure', code: 'cancelled' });
  expect(await beside('cancelled')).toEqual([]);
  expect(await running()).toEqual([]);
});

it('a signal that was raised before is honoured at once', async () => {
  const run = prepareClip({
    original: long,
    outDir: join(folder, 'never'),
    signal: AbortSignal.abort(),
  });
  await expect(run).rejects.toBeInstanceOf(MediaFailure);
  expect(await beside('never')).toEqual([]);
});

it('runs again over finished copies, and tells its progress without falling back', async () => {
  const original = join(folder, 'again.mp4');
  const outDir = join(folder, 'again-copies');
  await makeClip('constant.mp4', original);
  await mkdir(outDir);
  await writeFile(join(outDir, 'from-before.txt'), 'old');
  const told: PreparationProgress[] = [];
  const clip = await prepareClip({ original, outDir, onProgress: (step) => told.push(step) });
  expect((await readdir(outDir)).sort()).toEqual([
    'bench.mp4',
    'poster.jpg',
    'replay.mp4',
    'strip.jpg',
  ]);
  expect((await stat(clip.bench.path)).size).toBe(clip.bench.bytes);
  expect(told[0]).toMatchObject({ stage: 'checking', percent: 0 });
  expect(told.at(-1)).toEqual({ stage: 'finishing', percent: 100, secondsLeft: 0 });
  const percents = told.map((step) => step.percent);
  expect(percents).toEqual([...percents].sort((a, b) => a - b));
});

it('a missing original is the file system’s error, and leaves nothing', async () => {
  const run = prepareClip({ original: join(folder, 'nowhere.mp4'), outDir: join(folder, 'none') });
  await expect(run).rejects.toMatchObject({ code: 'ENOENT' });
  expect(await beside('none')).toEqual([]);
});
