import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { hostileFiles } from './files.ts';
import { tryFile } from './try-file.ts';
import type { HostileFile } from './wounds.ts';

vi.setConfig({ testTimeout: 300_000, hookTimeout: 120_000 });

/** `npm run hostile` tries them all. */
const EVERY = 25;

let folder: string;
let files: HostileFile[];
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'hostile-'));
  files = await hostileFiles(join(folder, 'sound'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

it('there are more than three hundred, no two alike', () => {
  expect(files.length).toBeGreaterThan(300);
  expect(new Set(files.map(({ name }) => name)).size).toBe(files.length);
});

it('a damaged or hostile file is prepared, or refused in a sentence, and leaves nothing behind', async () => {
  const tried = files.filter((_, n) => n % EVERY === 0);
  const codes = new Set<string>();
  for (const file of tried) {
    const outcome = await tryFile(file, folder);
    codes.add(outcome.code);
    if ('said' in outcome) expect(outcome.said, file.name).toMatch(/^[A-Z].*[.]$/);
  }
  // a test that refuses all, or takes all, would show nothing
  expect(codes).toContain('prepared');
  expect(codes.size).toBeGreaterThan(4);
  expect(await readdir(folder)).toEqual(['sound']);
});
