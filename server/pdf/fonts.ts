import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { repoRoot } from '../main/root.ts';

/** Source Sans 3 comes in a file per script; the first that has a letter is used for it. */
const SCRIPTS = [
  'latin',
  'latin-ext',
  'cyrillic',
  'cyrillic-ext',
  'greek',
  'greek-ext',
  'vietnamese',
] as const;
export type Script = (typeof SCRIPTS)[number];

export const WEIGHTS = { plain: 400, strong: 600 } as const;
export type Weight = keyof typeof WEIGHTS;

export interface FontFile {
  readonly script: Script;
  readonly weight: Weight;
  readonly bytes: Buffer;
}

const FOLDER = 'node_modules/@fontsource/source-sans-3/files';

const readAll = (): Promise<readonly FontFile[]> =>
  Promise.all(
    SCRIPTS.flatMap((script) =>
      (Object.keys(WEIGHTS) as Weight[]).map(async (weight) => ({
        script,
        weight,
        bytes: await readFile(
          join(repoRoot(), FOLDER, `source-sans-3-${script}-${WEIGHTS[weight]}-normal.woff`),
        ),
      })),
    ),
  );

let read: Promise<readonly FontFile[]> | undefined;

/** Every font file that a document may need; read once, and again after a failure. */
export const fontFiles = (): Promise<readonly FontFile[]> => {
  read ??= readAll().catch((error: unknown) => {
    read = undefined;
    throw error;
  });
  return read;
};
