import { execFileSync, spawnSync } from 'node:child_process';
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { migrate } from '#server/db/migrate.ts';
import { onInstance } from './postgres/instance-shell.ts';

vi.setConfig({ testTimeout: 180_000, hookTimeout: 180_000 });

const scripts = fileURLToPath(new URL('.', import.meta.url));
const TEXT = 'Ångström, “quoted”, and a\nsecond line';

let parent: string;
const of = (name: string) => join(parent, name);

const up = (data: string): string[] =>
  onInstance(
    data,
    'instance_up redshank; printf "%s\\n" "$DATABASE_OWNER_URL" "$(secret_of database-admin)"',
  )
    .trim()
    .split('\n');
const down = (data: string) => onInstance(data, 'choose_instance_dir; pg_stop "$instance_dir"');

const run = (script: string, data: string, file: string) =>
  spawnSync('bash', [join(scripts, script), file], {
    encoding: 'utf8',
    env: { ...process.env, REDSHANK_DATA: data, NO_COLOR: '1' },
  });

const asAdmin = async <T>(data: string, work: (client: Client) => Promise<T>): Promise<T> => {
  const [owner = '', password = ''] = up(data);
  const url = new URL(owner);
  url.username = 'redshank_admin';
  url.password = password;
  const client = new Client({ connectionString: url.href });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
};

/** A fingerprint of the rows of every table, and of what tables, triggers and walls there are. */
const everything = (data: string) =>
  asAdmin(data, async (client) => {
    const { rows: tables } = await client.query<{ name: string }>(
      `select format('%I.%I', schemaname, tablename) as name from pg_tables
       where schemaname in ('public', 'pgboss') order by 1`,
    );
    const prints: Record<string, unknown> = {};
    for (const { name } of tables) {
      const { rows } = await client.query(
        `select count(*), md5(coalesce(string_agg(t::text, '|' order by t::text), '')) from ${name} t`,
      );
      prints[name] = rows[0];
    }
    for (const [name, sql] of Object.entries({
      walls:
        'select polname, polrelid::regclass::text, pg_get_expr(polqual, polrelid) from pg_policy',
      triggers: 'select tgname, tgrelid::regclass::text from pg_trigger where not tgisinternal',
      owners: `select tablename, tableowner, rowsecurity from pg_tables where schemaname = 'public'`,
    }))
      prints[name] = (await client.query(`${sql} order by 1, 2`)).rows;
    return prints;
  });

beforeAll(async () => {
  parent = mkdtempSync(join(tmpdir(), 'back-up-'));
  chmodSync(parent, 0o755);
  const [owner = ''] = up(of('old'));
  await migrate(owner);
  await asAdmin(of('old'), (client) =>
    client.query(
      `insert into practice (id, name, created_at) values (gen_random_uuid(), $1, now())`,
      [TEXT],
    ),
  );
  writeFileSync(join(of('old'), 'secrets/session-key'), 'a key\n', { mode: 0o600 });
  mkdirSync(join(of('old'), 'uploads/files/p/clips'), { recursive: true });
  writeFileSync(join(of('old'), 'uploads/files/p/clips/a.mp4'), Buffer.from([0, 1, 2, 255]));
  mkdirSync(join(of('old'), 'uploads/temp'));
  writeFileSync(join(of('old'), 'uploads/temp/half'), 'half made');
});
afterAll(() => {
  for (const name of ['old', 'new']) if (existsSync(of(name))) down(of(name));
  rmSync(parent, { recursive: true });
});

describe('a back-up', () => {
  it('is taken while the instance runs, and only its owner can read it', () => {
    const { status, stderr } = run('back-up.sh', of('old'), of('a.tar'));
    expect(stderr).toContain('keep it locked away');
    expect(status).toBe(0);
    expect(statSync(of('a.tar')).mode & 0o777).toBe(0o600);
    expect(readdirSync(of('old')).filter((name) => name.includes('making'))).toEqual([]);
    // the passwords of the old database are of no use elsewhere
    const inside = execFileSync('tar', ['-tf', of('a.tar')], { encoding: 'utf8' });
    expect(inside).toContain('secrets/session-key');
    expect(inside).not.toMatch(/secrets\/database|temp\/half/);
  });

  it('never replaces another one', () => {
    const { status, stderr } = run('back-up.sh', of('old'), of('a.tar'));
    expect(status).toBe(1);
    expect(stderr).toContain('is there already');
  });

  it('comes to life elsewhere, row by row and byte by byte', async () => {
    const { status, stderr } = run('restore.sh', of('new'), of('a.tar'));
    expect(stderr).toContain('Erasures of athletes after that moment are undone');
    expect(status).toBe(0);
    const before = await everything(of('old'));
    expect(before['public.practice']).toMatchObject({ count: '1' });
    expect(await everything(of('new'))).toEqual(before);
    expect(readFileSync(join(of('new'), 'uploads/files/p/clips/a.mp4'))).toEqual(
      Buffer.from([0, 1, 2, 255]),
    );
    expect(readFileSync(join(of('new'), 'secrets/session-key'), 'utf8')).toBe('a key\n');
    const passwords = ['old', 'new'].map((name) =>
      readFileSync(join(of(name), 'secrets/database-app'), 'utf8'),
    );
    expect(new Set(passwords).size).toBe(2);
    // what the next start does finds nothing left to do
    await migrate(up(of('new'))[0] ?? '');
    expect(await everything(of('new'))).toEqual(before);
  });

  it('is not restored over something that is there', () => {
    const { status, stderr } = run('restore.sh', of('new'), of('a.tar'));
    expect(status).toBe(1);
    expect(stderr).toContain('left as it is');
  });

  it('that is damaged or cut short is refused, and leaves nothing behind', () => {
    const bytes = readFileSync(of('a.tar'));
    const damaged = Buffer.from(bytes);
    const at = damaged.indexOf('PGDMP') + 2000;
    damaged[at] = (damaged[at] ?? 0) ^ 255;
    for (const [name, content, says] of [
      ['damaged.tar', damaged, 'is damaged'],
      ['short.tar', bytes.subarray(0, 700), 'no back-up of Redshank'],
      ['text.tar', Buffer.from('words'), 'no back-up of Redshank'],
    ] as const) {
      writeFileSync(of(name), content);
      const { status, stderr } = run('restore.sh', of('third'), of(name));
      expect(stderr, name).toContain(says);
      expect(status, name).toBe(1);
      expect(readdirSync(of('third')), name).toEqual([]);
    }
  });

  it('of no instance says which one is meant', () => {
    const { status, stderr } = run('back-up.sh', of('nowhere'), of('b.tar'));
    expect(status).toBe(1);
    expect(stderr).toContain('There is no instance');
    expect(existsSync(of('b.tar'))).toBe(false);
  });
});
