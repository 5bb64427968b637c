import { existsSync, readFileSync } from 'node:fs';
import { expect, it } from 'vitest';

const root = new URL('../../', import.meta.url);
const table = readFileSync(new URL('docs/security.md', root), 'utf8');

/** What stands in it as a file of this repository: a path with a folder and an ending, or the settings at the root. */
const PATH = /`((?:[\w.-]+\/)+[\w.-]+\.\w+|\.[\w-]+\.cjs)`/g;
const paths = [...table.matchAll(PATH)].map(([, path = '']) => path);

it('every file that the security table names exists', () => {
  expect(paths.length).toBeGreaterThan(80);
  expect([...new Set(paths)].filter((path) => !existsSync(new URL(path, root)))).toEqual([]);
});

it('every line of it says how it stands', () => {
  const lines = table.split('\n').filter((line) => /^\| (?!requirement|-)/.test(line));
  expect(lines.length).toBeGreaterThan(90);
  const states = lines.map((line) => line.split('|')[2]?.trim());
  const known = ['met', 'partly', 'open', 'not applicable', 'for the operator'];
  expect(states.filter((state) => !known.includes(state ?? ''))).toEqual([]);
});

it('what is met or partly met says by what', () => {
  const met = table.split('\n').filter((line) => /^\|[^|]+\| (met|partly)\s*\|/.test(line));
  for (const line of met) expect(line.split('|')[3]?.trim().length, line).toBeGreaterThan(10);
});

it('every test of abuse stands in it', async () => {
  const { readdir } = await import('node:fs/promises');
  const tests = await readdir(new URL('tests/api/abuse/', root));
  expect(tests.filter((name) => !paths.includes(`tests/api/abuse/${name}`))).toEqual([]);
});
