import { describe, expect, it } from 'vitest';
import { CopyBytes } from './copy-bytes.ts';
import type { Transport } from './fetch-range.ts';

const file = Uint8Array.from({ length: 3_000_000 }, (_, n) => (n * 7919) % 251);

/** Compared as buffers: element by element takes seconds for megabytes. */
const isPart = (bytes: Uint8Array, start: number, end?: number): boolean =>
  Buffer.compare(bytes, file.subarray(start, end)) === 0;

/** A server of one file; `answer` may replace what it says to the n-th request. */
const serve = (answer: (n: number) => Response | Error | null = () => null, ranges = true) => {
  const asked: string[] = [];
  const waited: number[] = [];
  const transport: Transport = {
    fetch: (_, init) => {
      const range = new Headers(init?.headers).get('range') ?? '';
      const other = answer(asked.push(range) - 1);
      if (other instanceof Error) return Promise.reject(other);
      if (other) return Promise.resolve(other);
      if (!ranges) return Promise.resolve(new Response(file, { headers: { etag: 'a' } }));
      const [from = 0, to = 0] = range.replace('bytes=', '').split('-').map(Number);
      const end = Math.min(to + 1, file.length);
      const headers = { etag: 'a', 'content-range': `bytes ${from}-${end - 1}/${file.length}` };
      return Promise.resolve(new Response(file.slice(from, end), { status: 206, headers }));
    },
    wait: (ms) => {
      waited.push(ms);
      return Promise.resolve();
    },
  };
  return { bytes: new CopyBytes('/copy.mp4', transport), asked, waited };
};

describe('CopyBytes', () => {
  it('knows the size after its first block', async () => {
    const { bytes, asked } = serve();
    expect(await bytes.size()).toBe(3_000_000);
    expect(asked).toEqual(['bytes=0-524287']);
  });

  it('reads across blocks and asks for each block once', async () => {
    const { bytes, asked } = serve();
    expect(isPart(await bytes.read(524_000, 1_100_000), 524_000, 1_100_000)).toBe(true);
    expect(isPart(await bytes.read(600_000, 600_010), 600_000, 600_010)).toBe(true);
    expect(asked).toEqual(['bytes=0-1572863']);
  });

  it('reads the short last block', async () => {
    const { bytes } = serve();
    expect(isPart(await bytes.read(2_999_990, 3_000_000), 2_999_990)).toBe(true);
  });

  it('shares one request between readers of the same block', async () => {
    const { bytes, asked } = serve();
    await Promise.all([bytes.read(0, 10), bytes.read(20, 30)]);
    expect(asked).toHaveLength(1);
  });

  it('fills the rest from where it was read, and tells the progress', async () => {
    const { bytes, asked } = serve();
    const shares: number[] = [];
    bytes.onProgress(({ share }) => shares.push(share));
    await bytes.size();
    await bytes.read(1_600_000, 1_600_001);
    await bytes.fill();
    expect(shares.at(0)).toBe(0);
    expect(shares.at(-1)).toBe(1);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    const requests = asked.length;
    expect(isPart(await bytes.read(0, 3_000_000), 0)).toBe(true);
    expect(asked).toHaveLength(requests);
  });

  it('takes a whole file from a server without ranges', async () => {
    const { bytes, asked } = serve(undefined, false);
    expect(isPart(await bytes.read(2_000_000, 2_000_100), 2_000_000, 2_000_100)).toBe(true);
    expect(await bytes.size()).toBe(3_000_000);
    expect(asked).toHaveLength(1);
  });

  it('tries again after a lost connection and a passing fault', async () => {
    const { bytes, waited } = serve((n) =>
      n === 0
        ? new TypeError('failed to fetch')
        : n === 1
          ? new Response('', { status: 503 })
          : null,
    );
    expect(isPart(await bytes.read(0, 4), 0, 4)).toBe(true);
    expect(waited).toEqual([300, 1000]);
  });

  it('gives up after four tries, and can be asked again later', async () => {
    const { bytes, waited } = serve((n) => (n < 4 ? new TypeError('failed to fetch') : null));
    await expect(bytes.read(0, 4)).rejects.toMatchObject({ code: 'network' });
    expect(waited).toEqual([300, 1000, 3000]);
    expect(isPart(await bytes.read(0, 4), 0, 4)).toBe(true);
  });

  it.each([
    [401, 'signed-out'],
    [404, 'gone'],
    [403, 'gone'],
  ])('does not ask again after %i', async (status, code) => {
    const { bytes, asked } = serve(() => new Response('', { status }));
    await expect(bytes.size()).rejects.toMatchObject({ code });
    expect(asked).toHaveLength(1);
  });

  it('does not mix two versions of the copy', async () => {
    const { bytes } = serve((n) =>
      n === 1
        ? new Response(file.slice(0, 10), {
            status: 206,
            headers: { etag: 'b', 'content-range': 'bytes 1048576-1048585/3000000' },
          })
        : null,
    );
    await bytes.size();
    await expect(bytes.read(1_048_576, 1_048_580)).rejects.toMatchObject({ code: 'changed' });
  });

  it('says closed after it was closed', async () => {
    const { bytes } = serve();
    await bytes.size();
    bytes.close();
    await expect(bytes.read(1_000_000, 1_000_001)).rejects.toMatchObject({ code: 'closed' });
  });
});
