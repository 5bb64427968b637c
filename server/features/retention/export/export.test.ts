import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { crc32 } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { Comment } from '../../comments/comment.entity.ts';
import { makeClip } from '../../clips/clip.factory.ts';
import { zip } from './zip.ts';

/** The files of an archive by its own list at the end, each checked against its sum. */
const unzipped = (archive: Buffer): Map<string, Buffer> => {
  const long = archive.lastIndexOf(Buffer.from([0x50, 0x4b, 0x06, 0x06]));
  let at = Number(archive.readBigUInt64LE(long + 48));
  const files = new Map<string, Buffer>();
  for (let n = Number(archive.readBigUInt64LE(long + 32)); n > 0; n -= 1) {
    expect(archive.readUInt32LE(at)).toBe(0x02014b50);
    const length = archive.readUInt16LE(at + 28);
    const name = archive.subarray(at + 46, at + 46 + length).toString();
    const offset = Number(archive.readBigUInt64LE(at + 46 + length + 4));
    const start = offset + 30 + archive.readUInt16LE(offset + 26);
    const content = archive.subarray(start, start + archive.readUInt32LE(at + 24));
    expect(crc32(content)).toBe(archive.readUInt32LE(at + 16));
    files.set(name, content);
    at += 46 + length + archive.readUInt16LE(at + 30);
  }
  return files;
};

describe('an archive', () => {
  it('gives back what was put in, names and all', async () => {
    const entries = [
      { name: 'a.txt', text: 'First.' },
      { name: 'ordner/ü.txt', text: '' },
    ].map(({ name, text }) => ({
      name,
      modified: new Date('2026-12-02T04:05:06Z'),
      content: () => Promise.resolve(Readable.from([Buffer.from(text)])),
    }));
    const files = unzipped(await buffer(Readable.from(zip(entries), { objectMode: false })));
    expect([...files].map(([name, content]) => [name, content.toString()])).toEqual([
      ['a.txt', 'First.'],
      ['ordner/ü.txt', ''],
    ]);
  });
});

describe('the export of an athlete', () => {
  let api: Api;
  let clipId: string;
  beforeAll(async () => {
    api = await startApi();
    const { coach, visit } = api.world;
    clipId = await api.ground.inPractice(coach, async ({ em }) => {
      const clip = makeClip(em, { visit, uploadedBy: coach, name: 'Robin hops.MP4' });
      em.create(Comment, {
        ...{ clip, body: 'The hip turns.', fromFrame: 0, toFrame: 9, shape: null, shared: false },
        ...{ answerTo: null, by: coach },
      });
      await em.flush();
      await api.ground.storage.putStream(
        clip.files.original,
        Readable.from(['the film']),
        'video/mp4',
      );
      return clip.id;
    });
    const agent = await api.as(coach);
    const { body } = await agent.get(`/api/athletes/${api.world.athlete.id}/consents`).expect(200);
    const paper = Buffer.from('%PDF-1.4 paper\n%%EOF\n');
    await agent.post(`/api/consents/${body.items[0].id}/scan`).attach('scan', paper, 'a.pdf');
    await agent.post(`/api/athletes/${api.world.athlete.id}/withdrawals`).send({
      purposes: ['assessment'],
    });
  });
  afterAll(() => api.close());

  it('holds every kind of thing, also after filming was withdrawn', async () => {
    const owner = await api.as(api.world.owner);
    const answer = await owner
      .get(`/api/athletes/${api.world.athlete.id}/export`)
      .buffer(true)
      .parse((res, done) => {
        buffer(res as unknown as Readable).then(
          (all) => {
            done(null, all);
            return all;
          },
          (error: Error) => {
            done(error, null);
            return null;
          },
        );
      })
      .expect(200);
    expect(answer.headers['content-disposition']).toMatch(
      /^attachment; filename="?[\d-]+-athlete\.zip/,
    );
    expect(answer.headers['cache-control']).toBe('private, no-store');
    const files = unzipped(answer.body as Buffer);
    const names = [...files.keys()];
    const visit = `visits/1-${api.world.visit.day}`;
    for (const name of [
      'README.txt',
      'athlete.json',
      'consents.json',
      'link-openings.json',
      'audit.json',
      'rows/visit.json',
      'rows/clip.json',
      'rows/comment.json',
      `${visit}/clip-1.mp4`,
      `${visit}/clip-1-comments.vtt`,
      `${visit}/annotations.jsonld`,
    ])
      expect(names).toContain(name);
    expect(files.get(`${visit}/clip-1.mp4`)?.toString()).toBe('the film');
    expect(files.get(`${visit}/clip-1-comments.vtt`)?.toString()).toContain('The hip turns.');
    expect(names.some((name) => /^consents\/.+\.pdf$/.test(name))).toBe(true);
    expect(JSON.parse(String(files.get('rows/clip.json')))).toMatchObject([{ id: clipId }]);
    for (const name of names.slice(1)) expect(String(files.get('README.txt'))).toContain(name);
  });

  it('is the owner’s alone', async () => {
    const path = `/api/athletes/${api.world.athlete.id}/export`;
    for (const who of ['coach', 'supervisor'] as const)
      await (await api.as(api.world[who])).get(path).expect(403);
    await (await api.as(api.world.foreignOwner)).get(path).expect(404);
  });
});
