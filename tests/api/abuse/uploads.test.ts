import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Clip } from '#server/features/clips/clip.entity.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { maxBytes } from '#server/media/limits.ts';
import { type Api, startApi } from '#tests/support/api.ts';

const HTML = '<!doctype html><script>alert(document.domain)</script>';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

/** A form as a program writes it that keeps to no rules: the part's header stands there as it is. */
const formWith = (parameter: string) => {
  const body = [
    '--edge\r\nContent-Disposition: form-data; name="view"\r\n\r\nfront',
    `\r\n--edge\r\nContent-Disposition: form-data; name="clip"; ${parameter}\r\n`,
    `Content-Type: text/html\r\n\r\n${HTML}\r\n--edge--\r\n`,
  ].join('');
  return coach
    .post(`/api/visits/${api.world.visit.id}/clips`)
    .set('Content-Type', 'multipart/form-data; boundary=edge')
    .send(Buffer.from(body));
};

/** By RFC 5987, so that every character arrives. */
const form = (name: string) => {
  const encoded = encodeURIComponent(name).replaceAll(
    /[()'*!]/g,
    (sign) => `%${sign.charCodeAt(0).toString(16)}`,
  );
  return formWith(`filename*=utf-8''${encoded}`);
};

const stored = async (): Promise<string[]> => {
  const root = join(api.ground.config.uploads, 'files');
  const entries = await readdir(root, { recursive: true, withFileTypes: true });
  return entries
    .filter((entry) => entry.isFile())
    .map(({ parentPath, name }) => `${parentPath.slice(root.length + 1)}/${name}`);
};

describe('the name of a clip', () => {
  const LONG = `${'long'.repeat(2000)}.mp4`;
  it.each([
    ['../../../../tmp/escaped.mp4', 'escaped.mp4'],
    ['..\\..\\escaped.mp4', 'escaped.mp4'],
    ['/etc/cron.d/escaped.mp4', 'escaped.mp4'],
    ['C:\\clips\\film.mp4', 'film.mp4'],
    ['a\u0000.html.mp4', 'a.html.mp4'],
    ['a\u001b[2Jb.mp4', 'a[2Jb.mp4'],
    ['\u202e4pm.exe.mp4', '4pm.exe.mp4'],
    ['a\u2066b\u2069\u200f.mp4', 'ab.mp4'],
    ['<img src=x onerror=alert(1)>.mp4', '<img src=x onerror=alert(1)>.mp4'],
    [LONG, LONG.slice(0, 255)],
  ])('%j is shown without path and tricks, and never part of a path', async (name, shown) => {
    const before = new Set(await stored());
    const { body } = await form(name).expect(201);
    expect(body.name).toBe(shown);
    const { practiceId } = api.world;
    const added = (await stored()).filter((key) => !before.has(key));
    expect(added).toEqual([`${practiceId}/clips/${body.id}/original`]);
    const resumed = await coach
      .post(`/api/visits/${api.world.visit.id}/uploads`)
      .send({ name: name.slice(0, 255), bytes: 10, view: 'front' });
    // one whose name the contract does not take is refused, not cut down
    expect([201, 422]).toContain(resumed.status);
  });
});

describe('a form that is none', () => {
  it.each([
    'filename="a\u0000.mp4"',
    'filename="a\u001b[2J.mp4"',
    'filename="a\nSet-Cookie: b=c.mp4"',
    'filename="\u007f"\u0001',
  ])('is refused where its header says %j, and nothing of it is kept', async (parameter) => {
    const before = await stored();
    const { body, status } = await formWith(parameter);
    expect(status).toBe(400);
    expect(body.code).toBe('unreadable-body');
    expect(await stored()).toEqual(before);
  });

  it.each([
    'multipart/form-data',
    'multipart/form-data; boundary=',
    'multipart/form-data; boundary=another',
  ])('is refused as %s', async (type) => {
    const { body, status } = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .set('Content-Type', type)
      .send(Buffer.from(HTML));
    expect(status).toBeLessThan(500);
    expect(['unreadable-body', 'upload-incomplete', 'invalid-input']).toContain(body.code);
  });
});

describe('a clip that is too large', () => {
  it('is refused before a byte of it is read', async () => {
    const answer = await coach
      .post(`/api/visits/${api.world.visit.id}/uploads`)
      .send({ name: 'a.mp4', bytes: maxBytes + 1, view: 'front' });
    expect(answer.status).toBeGreaterThanOrEqual(413);
    const request = coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .set('Content-Type', 'multipart/form-data; boundary=edge')
      .set('Content-Length', String(maxBytes + 1_000_000));
    const { body } = await request;
    expect(body).toMatchObject({ status: 413, code: 'body-too-large' });
  });

  it('does not get more bytes in than it said', async () => {
    const { body } = await coach
      .post(`/api/visits/${api.world.visit.id}/uploads`)
      .send({ name: 'a.mp4', bytes: 10, view: 'front' })
      .expect(201);
    const patch = await coach
      .patch(String(body.uploadUrl))
      .set({ 'Tus-Resumable': '1.0.0', 'Upload-Offset': '0' })
      .set('Content-Type', 'application/offset+octet-stream')
      .send(Buffer.alloc(1000));
    expect(patch.status).toBeGreaterThanOrEqual(400);
    expect(patch.status).toBeLessThan(500);
    await coach.get(`/api/clips/${body.id}`).expect(404);
  });

  it.each([
    ['many fields', Array.from({ length: 30 }, (_, n) => `f${n}`)],
    ['a long field', ['x'.repeat(5000)]],
  ])('or a form of %s is refused', async (_what, values) => {
    const request = coach.post(`/api/visits/${api.world.visit.id}/clips`);
    for (const [n, value] of values.entries()) void request.field(`field${n}`, value);
    const { body } = await request.attach('clip', Buffer.from(HTML), 'a.mp4').expect(422);
    expect(body.code).toBe('invalid-input');
  });
});

describe('a file that is a page too', () => {
  it('is sent as the video or picture that it was taken for, and never as a page', async () => {
    const { coach: user, visit } = api.world;
    const clip = await api.ground.inPractice(user, ({ em }) =>
      Promise.resolve(makeClip(em, { visit, uploadedBy: user })),
    );
    const { files } = await api.ground.inPractice(user, ({ em }) =>
      em.findOneOrFail(Clip, { id: clip.id }),
    );
    for (const key of [files.bench, files.poster, files.strip])
      await api.ground.storage.putStream(key ?? '', Readable.from([HTML]), 'text/html');
    for (const [copy, type] of [
      ['video', 'video/mp4'],
      ['poster', 'image/jpeg'],
      ['strip', 'image/jpeg'],
    ]) {
      const answer = await coach
        .get(`/api/clips/${clip.id}/${copy}`)
        .set('Accept', 'text/html')
        .expect(200);
      expect(answer.headers['content-type']).toBe(type);
      expect(answer.headers['x-content-type-options']).toBe('nosniff');
      expect(answer.headers['content-security-policy']).not.toContain('unsafe-inline');
      expect(answer.headers['cross-origin-resource-policy']).toBe('same-origin');
    }
  });
});
