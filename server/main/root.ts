import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** The folder that holds package.json: above this file in the sources, above the bundle once built. */
export const repoRoot = (): string => {
  let folder = import.meta.dirname;
  while (!existsSync(join(folder, 'package.json'))) {
    const above = dirname(folder);
    if (above === folder) throw new Error('package.json was not found above the server.');
    folder = above;
  }
  return folder;
};
