import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

const SOURCE = /\.(tsx?|css)$/;
const TEST = /\.test\.tsx?$/;
/** Packages by name: neither our own rooms (#…), nor files, nor what Node brings (node:…). */
const IMPORTED = /(?:from|import)\s*\(?\s*['"]((?:@[\w.-]+\/)?[a-z][\w.-]*)(?:\/[^'"]*)?['"]/g;

/** The packages that the pages name, in scripts and in style sheets; what only a type is taken from counts too. */
export const browserImports = (root: string): Set<string> => {
  const names = new Set<string>();
  for (const room of ['src', 'shared'])
    for (const file of readdirSync(join(root, room), { recursive: true, encoding: 'utf8' })) {
      if (!SOURCE.test(file) || TEST.test(file)) continue;
      const text = readFileSync(join(root, room, file), 'utf8');
      for (const [, name] of text.matchAll(IMPORTED)) if (name !== undefined) names.add(name);
    }
  return names;
};
