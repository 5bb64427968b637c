import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { product } from '#server/db/in-practice.ts';
import { maxBytes, maxBytesADay, maxOpenUploads } from '#server/media/limits.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { Clip } from './clip.entity.ts';
import { makeClip } from './clip.factory.ts';
import { Upload } from './upload.entity.ts';

const HOUR_MS = 3_600_000;

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

const inPractice = (work: (unit: { readonly em: EntityManager }) => Promise<void>) =>
  api.ground.inPractice(product(api.world.practiceId), work);
afterEach(() =>
  inPractice(async ({ em }) => {
    await em.nativeDelete(Clip, {});
    await em.nativeDelete(Upload, {});
  }),
);

/** As many clips of the largest size as a day has room for, but one. */
const sent = (hoursAgo: number) =>
  inPractice(({ em }) => {
    const { visit, coach: uploadedBy } = api.world;
    for (let n = 1; n < maxBytesADay / maxBytes; n += 1)
      makeClip(em, {
        visit: em.merge(visit),
        uploadedBy: em.merge(uploadedBy),
        bytes: maxBytes,
        uploadedAt: new Date(Date.now() - hoursAgo * HOUR_MS),
      });
    return Promise.resolve();
  });

const open = (bytes: number, as = coach) =>
  as
    .post(`/api/visits/${api.world.visit.id}/uploads`)
    .send({ name: 'a.mp4', bytes, view: 'front' });

describe('what one person may send', () => {
  it('is bounded within a day, what is under way included, and says so', async () => {
    await sent(23);
    await open(maxBytes).expect(201);
    const { body } = await open(1).expect(429);
    expect(body).toMatchObject({
      code: 'upload-quota',
      detail:
        'One person may send 64 GB within a day, and 64.0 GB of that are sent or under way. Send this clip tomorrow.',
    });
    const form = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .field('view', 'front')
      .attach('clip', Buffer.from('film'), 'a.mp4');
    expect([form.status, form.body.code]).toEqual([429, 'upload-quota']);
    // the practice's owner is another person
    await open(1, await api.as(api.world.owner)).expect(201);
  });

  it('is not bounded by what was sent the day before', async () => {
    await sent(25);
    await open(maxBytes).expect(201);
    await open(maxBytes).expect(201);
  });

  it('is bounded in how many uploads are under way', async () => {
    for (let n = 0; n < maxOpenUploads; n += 1) await open(1).expect(201);
    const { body } = await open(1).expect(429);
    expect(body.detail).toContain(`${maxOpenUploads} of your uploads are under way`);
  });
});
