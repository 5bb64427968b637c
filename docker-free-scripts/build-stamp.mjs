/** Prints one hash over everything the build reads, so that an unchanged checkout is not built again. */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

const SOURCES = [
  'src',
  'server',
  'shared',
  'migrations',
  'public',
  'package.json',
  'package-lock.json',
  'tsconfig.json',
  'docker-free-scripts/build-server.mjs',
];
const AT_THE_ROOT = /^(vite|tailwind|postcss|mikro-orm)\.config\.[a-z]+$|\.html$/;
const TEST = /\.(test|spec)\.tsx?$/;

function* filesUnder(path) {
  if (!existsSync(path)) return;
  if (statSync(path).isFile()) {
    if (!TEST.test(path)) yield path;
    return;
  }
  for (const name of readdirSync(path).sort()) yield* filesUnder(join(path, name));
}

const hash = createHash('sha256');
const roots = [...SOURCES, ...readdirSync('.').filter((name) => AT_THE_ROOT.test(name))];
for (const file of roots.flatMap((root) => [...filesUnder(root)])) {
  hash.update(file).update('\0').update(readFileSync(file)).update('\0');
}
console.log(hash.digest('hex'));
