import { cpSync, mkdtempSync, realpathSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const COPIED = ['package.json', 'tsconfig.json', 'vitest.config.ts', 'shared', 'tests'] as const;

/** A copy of what the tests of shared/ need: faults are put into it, never into the work tree. */
export const copyTree = (root: string): { readonly at: string; readonly remove: () => void } => {
  const at = realpathSync(mkdtempSync(join(tmpdir(), 'redshank-mutation-')));
  for (const name of COPIED)
    cpSync(join(root, name), join(at, name), {
      recursive: true,
      filter: (path) => !path.endsWith('.out'),
    });
  symlinkSync(join(root, 'node_modules'), join(at, 'node_modules'));
  return { at, remove: () => rmSync(at, { recursive: true, force: true }) };
};
