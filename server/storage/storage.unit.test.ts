import { spawnSync } from 'node:child_process';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  rmSync,
  utimesSync,
  writeFileSync,
} from 'node:fs';
import { open as openFile, readFile } from 'node:fs/promises';
import { hostname, tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startBucket } from '#tests/support/bucket.ts';
import { LocalStorage } from './local-storage.ts';
import { MissingFile, type Storage } from './storage.ts';

const folder = mkdtempSync(join(tmpdir(), 'redshank-storage-'));
let s3: Awaited<ReturnType<typeof startBucket>>;
beforeAll(async () => {
  s3 = await startBucket(folder);
});
afterAll(async () => {
  await s3.close();
  rmSync(folder, { recursive: true, force: true });
});

/** 300 kB that are not all alike: more than one chunk of a stream. */
const CONTENT = Buffer.from(Array.from({ length: 300_000 }, (_, i) => (i * 7 + (i >> 8)) % 256));

const localFile = (): string => {
  const path = join(mkdtempSync(join(folder, 'given-')), 'clip.mp4');
  writeFileSync(path, CONTENT);
  return path;
};

const kinds: [string, () => Promise<Storage>][] = [
  ['a folder', () => LocalStorage.open(join(folder, 'local'))],
  ['a bucket', () => s3.open()],
];

describe.each(kinds)('storage in %s', (_kind, open) => {
  let storage: Storage;
  beforeAll(async () => {
    storage = await open();
  });

  it('takes a finished file in and leaves nothing behind', async () => {
    const path = localFile();
    await storage.putFile('p/clips/1/bench.mp4', path, 'video/mp4');
    expect(existsSync(path)).toBe(false);
    expect((await storage.stat('p/clips/1/bench.mp4')).bytes).toBe(CONTENT.length);
    expect(CONTENT.equals(await buffer(await storage.read('p/clips/1/bench.mp4')))).toBe(true);
  });

  it('takes a stream in, byte by byte the same', async () => {
    await storage.putStream('p/clips/2/original', Readable.from([CONTENT]), 'video/mp4');
    expect(CONTENT.equals(await buffer(await storage.read('p/clips/2/original')))).toBe(true);
  });

  it('leaves nothing under the key when a stream breaks', async () => {
    const broken = Readable.from(
      (function* () {
        yield CONTENT.subarray(0, 1000);
        throw new Error('the phone left the room');
      })(),
    );
    await expect(storage.putStream('p/clips/3/original', broken, 'video/mp4')).rejects.toThrow(
      'the phone left the room',
    );
    expect(await storage.exists('p/clips/3/original')).toBe(false);
  });

  it('reads a range, both ends included', async () => {
    const part = await storage.read('p/clips/2/original', { start: 100, end: 199 });
    expect(await buffer(part)).toEqual(CONTENT.subarray(100, 200));
  });

  it('says by type that a file is missing', async () => {
    await expect(storage.read('p/clips/9/none')).rejects.toBeInstanceOf(MissingFile);
    await expect(storage.stat('p/clips/9/none')).rejects.toBeInstanceOf(MissingFile);
    expect(await storage.exists('p/clips/9/none')).toBe(false);
    await storage.delete('p/clips/9/none');
  });

  it('lends a file to programs that seek', async () => {
    const bytes = await storage.withLocalFile('p/clips/2/original', (path) => readFile(path));
    expect(CONTENT.equals(bytes)).toBe(true);
  });

  it('keeps what a program changed in a file it was lent, once that is put back', async () => {
    await storage.putStream('p/clips/4/original', Readable.from([CONTENT]), 'video/mp4');
    const changed = await storage.withLocalFile('p/clips/4/original', async (path, putBack) => {
      const handle = await openFile(path, 'r+');
      await handle.write('gone', 1000);
      await handle.close();
      await putBack();
      return readFile(path);
    });
    expect(changed.subarray(1000, 1004).toString()).toBe('gone');
    expect(changed.equals(await buffer(await storage.read('p/clips/4/original')))).toBe(true);
  });

  it('deletes one, and all below a prefix, and not its neighbours', async () => {
    for (const key of ['q/a/1', 'q/a/2', 'q/ab/1']) {
      await storage.putStream(key, Readable.from([Buffer.from('x')]), 'text/plain');
    }
    await storage.delete('q/a/1');
    expect(await storage.exists('q/a/1')).toBe(false);
    await storage.deleteAll('q/a');
    expect(await storage.exists('q/a/2')).toBe(false);
    expect(await storage.exists('q/ab/1')).toBe(true);
    await storage.deleteAll('q/none');
  });

  it('clears its working folder also when the work fails', async () => {
    let kept = '';
    await expect(
      storage.withTempDir((path) => {
        kept = path;
        writeFileSync(join(path, 'half'), 'x');
        return Promise.reject(new Error('stopped'));
      }),
    ).rejects.toThrow('stopped');
    expect(existsSync(kept)).toBe(false);
    expect(readdirSync(join(kept, '..'))).toEqual([]);
  });

  it.each(['../x', '/etc/passwd', 'a//b', 'a/../b', '.hidden', ''])(
    'takes no key %j',
    async (key) => {
      await expect(async () => storage.read(key)).rejects.toThrow('plain path segments');
    },
  );

  it('says that it is well', async () => {
    expect(await storage.healthy()).toBe(true);
  });
});

describe('what killed processes left behind', () => {
  it('is cleared at the next start; what lives and what is not known stays', async () => {
    const parent = join(folder, 'left', 'temp');
    const machine = hostname().replaceAll(/[^A-Za-z0-9]/g, '') || 'here';
    const dead = `${machine}-${spawnSync('true').pid}-abc`;
    const names = [dead, `${machine}-${process.pid}-abc`, 'elsewhere-1-new', 'elsewhere-1-old'];
    for (const name of names) mkdirSync(join(parent, name), { recursive: true });
    const twoDaysAgo = Date.now() / 1000 - 2 * 86_400;
    utimesSync(join(parent, 'elsewhere-1-old'), twoDaysAgo, twoDaysAgo);
    await LocalStorage.open(join(folder, 'left'));
    expect(readdirSync(parent).sort()).toEqual(
      [`${machine}-${process.pid}-abc`, 'elsewhere-1-new'].sort(),
    );
  });
});

describe('storage that is out of reach', () => {
  it('says so', async () => {
    const nowhere = await s3.open('other');
    expect(await nowhere.healthy()).toBe(false);
  });
});
