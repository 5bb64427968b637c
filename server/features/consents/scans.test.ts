import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { turnedJpeg } from '#tests/support/scans.ts';

const PDF = Buffer.from('%PDF-1.4\n1 0 obj <<>> endobj\ntrailer <<>>\n%%EOF\n');
let api: Api;
let path: string;
beforeAll(async () => {
  api = await startApi();
  const coach = await api.as(api.world.coach);
  const { body } = await coach.get(`/api/athletes/${api.world.athlete.id}/consents`).expect(200);
  path = `/api/consents/${body.items[0].id}/scan`;
});
afterAll(() => api.close());

type Who = 'coach' | 'owner' | 'supervisor' | 'otherCoach' | 'foreignOwner';
const as = (who: Who) => api.as(api.world[who]);
const add = async (bytes: Buffer, who: Who = 'coach') =>
  (await as(who)).post(path).attach('scan', bytes, 'Paper of Robin.pdf');
const files = async () =>
  (await readdir(join(api.ground.config.uploads, 'files'), { recursive: true })).filter((name) =>
    /consents\/.+/.test(name),
  );

describe('the scan of a consent', () => {
  it('is kept as what its bytes say, and saved by those who may see the athlete', async () => {
    const added = await add(PDF);
    expect(added.status).toBe(201);
    expect(added.body.scan).toMatchObject({ type: 'application/pdf', bytes: PDF.length });
    for (const who of ['coach', 'owner', 'supervisor'] as const) {
      const got = await (await as(who)).get(path).buffer(true).expect(200);
      expect(Buffer.from(got.body)).toEqual(PDF);
      expect(got.headers['content-type']).toBe('application/pdf');
      expect(got.headers['content-disposition']).toMatch(/^attachment; filename=consent-/);
      expect(got.headers['content-security-policy']).toBe("default-src 'none'; sandbox");
      expect(got.headers['x-content-type-options']).toBe('nosniff');
      expect(got.headers['cache-control']).toBe('private, no-store');
    }
    for (const who of ['otherCoach', 'foreignOwner'] as const) {
      await (await as(who)).get(path).expect(404);
      expect((await add(PDF, who)).status).toBe(404);
    }
    await api.nobody.get(path).expect(401);
    expect((await add(PDF, 'supervisor')).status).toBe(403);
  });

  it('takes the place of the one before, whose file goes', async () => {
    await add(PDF);
    const jpeg = turnedJpeg();
    const added = await add(jpeg);
    expect(added.body.scan.type).toBe('image/jpeg');
    expect(await files()).toHaveLength(1);
    const got = await (await as('coach')).get(path).buffer(true).expect(200);
    expect(Buffer.from(got.body).includes('GPS-SECRET')).toBe(false);
    expect(got.headers['content-disposition']).toMatch(/\.jpg$/);
  });

  it('is refused where it is something else, broken, too large, or not there', async () => {
    for (const bytes of [
      Buffer.from('<html><script>alert(1)</script></html>'),
      Buffer.from('%PDF-1.4 without its end'),
      Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0x00]),
      Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0]),
    ])
      expect((await add(bytes)).body.code).toBe('unsupported-media-type');
    const large = Buffer.concat([PDF, Buffer.alloc(10 * 1024 ** 2)]);
    expect((await add(large)).body.code).toBe('body-too-large');
    const agent = await as('coach');
    const none = await agent.post(path).field('note', 'x');
    expect(none.body.code).toBe('invalid-input');
    expect((await agent.post(path).send({ scan: 'x' })).body.code).toBe('unsupported-media-type');
  });

  it('is taken away with its file', async () => {
    await add(PDF);
    const { body } = await (await as('coach')).delete(path).expect(200);
    expect(body.scan).toBeNull();
    expect(await files()).toEqual([]);
    await (await as('coach')).get(path).expect(404);
  });
});
