/**
 * Remembers in dist/ what was built, as one hash over everything the build reads, so that an unchanged checkout is
 * not built again.
 *
 *   node build-stamp.mjs check   exit status 0 if dist/ is made of the present sources, 1 if not
 *   node build-stamp.mjs begin   before a build: until `end`, dist/ counts as not built
 *   node build-stamp.mjs end     after it; what was changed meanwhile counts as not built
 */
import { createHash } from 'node:crypto';
import {
  existsSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
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
  'docker-free-scripts/licences',
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

function hashOfSources() {
  const hash = createHash('sha256');
  const roots = [...SOURCES, ...readdirSync('.').filter((name) => AT_THE_ROOT.test(name))];
  for (const file of roots.flatMap((root) => [...filesUnder(root)])) {
    hash.update(file).update('\0').update(readFileSync(file)).update('\0');
  }
  return hash.digest('hex');
}

const BUILT = 'dist/.built-from';
const BUILDING = 'dist/.building-from';

const commands = {
  check() {
    const built = existsSync('dist/server/main.js') && existsSync(BUILT);
    process.exitCode = built && readFileSync(BUILT, 'utf8') === hashOfSources() ? 0 : 1;
  },
  begin() {
    mkdirSync('dist', { recursive: true });
    rmSync(BUILT, { force: true });
    writeFileSync(BUILDING, hashOfSources());
  },
  end() {
    renameSync(BUILDING, BUILT);
  },
};

const command = commands[process.argv[2]];
if (command === undefined) {
  console.error('usage: node build-stamp.mjs check | begin | end');
  process.exitCode = 64;
} else {
  command();
}
