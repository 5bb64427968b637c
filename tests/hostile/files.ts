import { mkdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { ffmpeg } from '#tests/fixtures/media/make-clips.ts';
import { disguisesOf } from './disguises.ts';
import { type Base, type HostileFile, woundsOf } from './wounds.ts';

const FRAMES = 12;

/** How the sound clips are made, by the name of the file. */
const BASES: Record<string, readonly string[]> = {
  'web.mp4': ['-c:v', 'libx264', '-preset', 'ultrafast', '-movflags', '+faststart'],
  'recorded.mov': ['-c:v', 'libx264', '-preset', 'ultrafast', '-bf', '2'],
  'pieces.mp4': ['-c:v', 'libx264', '-preset', 'ultrafast', '-movflags', '+frag_keyframe'],
  'browser.webm': ['-c:v', 'libvpx', '-deadline', 'realtime', '-cpu-used', '8'],
};

const makeBase = async (name: string, how: readonly string[], folder: string): Promise<Base> => {
  const path = join(folder, name);
  const picture = `testsrc2=s=128x96:r=30,trim=end_frame=${FRAMES},noise=alls=8:all_seed=3:allf=t`;
  await ffmpeg('-f', 'lavfi', '-i', picture, ...how, '-pix_fmt', 'yuv420p', path);
  return { name, bytes: await readFile(path) };
};

/** Damaged and hostile media files, more than three hundred, the same on every run. */
export async function hostileFiles(folder: string): Promise<HostileFile[]> {
  await mkdir(folder, { recursive: true });
  const bases: Base[] = [];
  for (const [name, how] of Object.entries(BASES)) bases.push(await makeBase(name, how, folder));
  const [web] = bases;
  if (web === undefined) throw new Error('there is no clip to disguise');
  return [...bases.flatMap(woundsOf), ...disguisesOf(web)];
}
