import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { prepareClip } from '#server/media/prepare-clip.ts';
import { ffmpeg } from '#tests/fixtures/media/make-clips.ts';
import type { BenchEntry } from '../entry.ts';

const frames = 300;
const rounds = 3;

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

const median = (values: readonly number[]) =>
  [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;

/** As a phone films: 1080p, 60 frames a second, B-frames, sensor noise. */
const makeOriginal = (to: string) =>
  ffmpeg(
    ...[
      '-f',
      'lavfi',
      '-i',
      `testsrc2=s=1920x1080:r=60,trim=end_frame=${frames},noise=alls=6:allf=t`,
    ],
    ...['-c:v', 'libx264', '-preset', 'veryfast', '-bf', '2', '-pix_fmt', 'yuv420p', to],
  );

/** The bench copy alone, by the plainest command that makes the same pictures. */
const bareEncode = (from: string, to: string) =>
  ffmpeg(
    ...['-i', from, '-an', '-c:v', 'libx264', '-threads', '1'],
    ...['-preset', 'superfast', '-crf', '23', '-g', '1', to],
  );

/** What the same clip costs at ffmpeg's usual fast setting, to see the copy's own settings in proportion. */
const usualEncode = (from: string, to: string) =>
  ffmpeg('-i', from, '-an', '-c:v', 'libx264', '-threads', '1', '-preset', 'veryfast', to);

const entry: BenchEntry = {
  name: 'preparing all copies, CPU seconds, against one bare encode of the bench copy',
  target: 1.6,
  async run() {
    const folder = await mkdtemp(join(tmpdir(), 'bench-preparation-'));
    try {
      const original = join(folder, 'original.mp4');
      await makeOriginal(original);
      const [ours, bare, usual]: [number[], number[], number[]] = [[], [], []];
      for (let round = 0; round < rounds; round += 1) {
        ours.push(await costOf(() => prepareClip({ original, outDir: join(folder, 'copies') })));
        bare.push(await costOf(() => bareEncode(original, join(folder, 'bare.mp4'))));
        usual.push(await costOf(() => usualEncode(original, join(folder, 'usual.mp4'))));
      }
      const [a, b] = [median(ours), median(bare)];
      const info = { frames, size: '1920 × 1080', rounds, ratioToVeryfast: a / median(usual) };
      return { ratio: a / b, a, b, info };
    } finally {
      await rm(folder, { recursive: true, force: true });
    }
  },
};

export default entry;
