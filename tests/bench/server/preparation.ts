import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { allIntraMaxFrames } from '#server/media/limits.ts';
import { prepareClip } from '#server/media/prepare-clip.ts';
import { ffmpeg } from '#tests/fixtures/media/make-clips.ts';
import type { BenchResult } from '../entry.ts';
import { median } from '../median.ts';

/** Of the original's film. */
const RATE = 60;
const ROUNDS = 5;

/** Computing seconds so far of this process and of the children it has waited for. */
async function cpuSeconds(): Promise<number> {
  const stat = await readFile('/proc/self/stat', 'latin1');
  // proc(5): fields 14–17 are utime, stime, cutime and cstime in hundredths; the name may hold spaces
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  return fields.slice(11, 15).reduce((sum, field) => sum + Number(field), 0) / 100;
}

async function costOf(work: () => Promise<unknown>): Promise<number> {
  const before = await cpuSeconds();
  await work();
  return (await cpuSeconds()) - before;
}

/** As a phone films: 60 frames a second, B-frames, sensor noise. */
const makeOriginal = (size: string, frames: number, to: string) =>
  ffmpeg(
    ...[
      '-f',
      'lavfi',
      '-i',
      `testsrc2=s=${size}:r=${RATE},trim=end_frame=${frames},noise=alls=6:allf=t`,
    ],
    ...['-c:v', 'libx264', '-preset', 'veryfast', '-bf', '2', '-pix_fmt', 'yuv420p', to],
  );

/** The bench copy alone, by the plainest command that makes the same pictures: a long take has fewer key frames. */
const bareEncode = (from: string, frames: number, to: string) =>
  ffmpeg(
    ...['-i', from, '-an', '-c:v', 'libx264', '-threads', '1'],
    ...(frames <= allIntraMaxFrames
      ? ['-preset', 'superfast', '-crf', '23', '-g', '1']
      : ['-preset', 'veryfast', '-crf', '20', '-g', '5', '-bf', '0']),
    to,
  );

/**
 * CPU seconds of all copies, checks included, beside those of one bare encode of the bench copy.
 * @param size of the original, '1920x1080'
 * @param seconds of the original: to start the tools costs a short clip a larger share
 */
export const comparePreparation = async (size: string, seconds: number): Promise<BenchResult> => {
  const frames = seconds * RATE;
  const folder = await mkdtemp(join(tmpdir(), 'bench-preparation-'));
  try {
    const original = join(folder, 'original.mp4');
    await makeOriginal(size, frames, original);
    const prepare = () => prepareClip({ original, outDir: join(folder, 'copies') });
    // asks the tools once per process what they can: a worker does that at its first clip
    await prepare();
    const ours: number[] = [];
    const bare: number[] = [];
    for (let round = 0; round < ROUNDS; round += 1) {
      ours.push(await costOf(prepare));
      bare.push(await costOf(() => bareEncode(original, frames, join(folder, 'bare.mp4'))));
    }
    const [a, b] = [median(ours), median(bare)];
    return { ratio: a / b, a, b, info: { unit: 'CPU s', size, frames, rounds: ROUNDS } };
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
};
