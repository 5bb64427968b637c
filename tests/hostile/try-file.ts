import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { prepareClip } from '#server/media/prepare-clip.ts';
import { MediaRefusal } from '#server/media/refusals.ts';
import type { HostileFile } from './wounds.ts';

/** What became of a file: `prepared`, or the sentence by which it was refused. */
export type Outcome =
  { readonly code: 'prepared' } | { readonly code: string; readonly said: string };

/**
 * Prepares a file as the worker does, which keeps it under a name of its own and its given name apart.
 * @throws where it was neither prepared nor refused, or something half made is left
 */
export async function tryFile(file: HostileFile, folder: string): Promise<Outcome> {
  const own = await mkdtemp(join(folder, 'file-'));
  try {
    const original = join(own, 'original');
    await writeFile(original, file.bytes);
    const outDir = join(own, 'copies');
    const outcome = await prepareClip({ original, outDir, originalName: file.name }).then(
      (): Outcome => ({ code: 'prepared' }),
      (error: unknown): Outcome => {
        if (error instanceof MediaRefusal) return { code: error.code, said: error.message };
        throw new Error(`${file.name}: neither prepared nor refused`, { cause: error });
      },
    );
    const left = (await readdir(own)).filter((name) => name !== 'original');
    const expected = outcome.code === 'prepared' ? ['copies'] : [];
    if (left.join() !== expected.join())
      throw new Error(`${file.name}: ${outcome.code}, but ${left.join()} is there`);
    return outcome;
  } finally {
    await rm(own, { recursive: true, force: true });
  }
}
