import { copyFile, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { ClipStory } from './story.ts';
import { type DemoTruth, demoFile, readTruth } from './truth.ts';

const renderedOf = ({ source }: ClipStory): string | null => {
  if ('rendered' in source) return source.rendered;
  return 'cut' in source ? source.cut : null;
};

/** The truth of a rendered clip; null for a file that is refused. */
export const truthOf = async ({ source }: ClipStory): Promise<DemoTruth | null> =>
  'rendered' in source ? readTruth(source.rendered) : null;

/** Lays the file of a clip into a folder, as an upload would, and gives its path. */
export const layFile = async (clip: ClipStory, folder: string): Promise<string> => {
  const path = join(folder, 'upload');
  const rendered = renderedOf(clip);
  if (rendered === null) {
    await writeFile(path, 'text' in clip.source ? clip.source.text : '');
    return path;
  }
  const file = demoFile((await readTruth(rendered)).file);
  if ('cut' in clip.source) {
    const whole = await readFile(file);
    await writeFile(path, whole.subarray(0, Math.floor(whole.length * clip.source.share)));
  } else {
    await copyFile(file, path);
  }
  return path;
};
