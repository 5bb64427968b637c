import {
  chmodSync,
  existsSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Client } from 'pg';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { onInstance } from './instance-shell.ts';

const MINUTE = 60_000;

let parent: string;
let data: string;
beforeAll(() => {
  parent = mkdtempSync(join(tmpdir(), 'instance-'));
  // as root, the database's user must be able to pass
  chmodSync(parent, 0o755);
  data = join(parent, 'data');
});
afterAll(() => {
  bash('choose_instance_dir; pg_stop "$instance_dir"');
  rmSync(parent, { recursive: true });
}, MINUTE);

const bash = (line: string) => onInstance(data, line);

const up = () =>
  bash(
    'instance_up redshank; printf "%s\\n" "$DATABASE_URL" "$DATABASE_OWNER_URL" "$DATABASE_JOBS_URL"',
  )
    .trim()
    .split('\n');

async function whoAmI(url: string | undefined): Promise<unknown> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<{ name: string }>('select current_user as name')).rows[0]?.name;
  } finally {
    await client.end();
  }
}

it(
  'makes a database that the three roles can sign in to, on 127.0.0.1 alone',
  async () => {
    const urls = up();
    expect(await Promise.all(urls.map(whoAmI))).toEqual([
      'redshank_app',
      'redshank_owner',
      'redshank_jobs',
    ]);
    expect(new Set(urls.map((url) => new URL(url).hostname))).toEqual(new Set(['127.0.0.1']));
    expect(readFileSync(join(data, 'database/postmaster.pid'), 'utf8').split('\n')[4]).toBe('');
  },
  MINUTE,
);

it('wants the password also on 127.0.0.1', async () => {
  const url = new URL(up()[0] ?? '');
  url.password = 'guessed';
  await expect(whoAmI(url.href)).rejects.toThrow('password authentication failed');
});

it('keeps data folder and passwords to their owner', () => {
  const folder = join(data, 'secrets');
  const modes = readdirSync(folder).map((name) => statSync(join(folder, name)).mode & 0o777);
  expect(new Set(modes)).toEqual(new Set([0o600]));
  expect(statSync(folder).mode & 0o777).toBe(0o700);
  expect(statSync(data).mode & 0o767).toBe(0o700);
});

it(
  'stops, and starts again on the same port with the same passwords',
  () => {
    const before = up();
    bash('choose_instance_dir; pg_stop "$instance_dir"');
    expect(existsSync(join(data, 'database/postmaster.pid'))).toBe(false);
    expect(up()).toEqual(before);
  },
  MINUTE,
);

it(
  'is not misled by a process number that a stranger has now',
  async () => {
    bash('choose_instance_dir; pg_stop "$instance_dir"');
    writeFileSync(join(data, 'database/postmaster.pid'), `${process.pid}\n`);
    expect(await whoAmI(up()[0])).toBe('redshank_app');
  },
  MINUTE,
);
