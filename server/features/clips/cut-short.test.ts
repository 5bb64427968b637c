import { randomUUID } from 'node:crypto';
import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type InPractice } from '#server/db/in-practice.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { acceptClip } from './accept-clip.ts';
import { clipFiles } from './clip-files.ts';

const TUS = { 'Tus-Resumable': '1.0.0' };
const FILM = Buffer.from('twelve bytes');

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

const open = async (): Promise<{ id: string; uploadUrl: string }> => {
  const { body } = await coach
    .post(`/api/visits/${api.world.visit.id}/uploads`)
    .send({ name: 'a.mp4', bytes: FILM.length, view: 'front' })
    .expect(201);
  return body;
};
const originalOf = (id: string) => clipFiles(api.world.practiceId, id).original;
const isKept = (id: string) => api.ground.storage.exists(originalOf(id));
const received = async (id: string): Promise<string> => {
  const path = join(api.ground.storage.incoming, id);
  await writeFile(path, FILM);
  return path;
};
/** Takes a file in over a database whose connection breaks. */
const takeIn = async (id: string, breaks: 'before' | 'after') => {
  let first = true;
  const breaking: InPractice = async (actor, work) => {
    const isFirst = first;
    first = false;
    if (isFirst && breaks === 'before') throw new Error('the connection broke');
    const done = await api.ground.inPractice(actor, work);
    if (isFirst) throw new Error('the connection broke');
    return done;
  };
  const { world, ground } = api;
  const facts = { name: 'a.mp4', view: 'front', supportSide: null, mirrored: false } as const;
  const file = { ...facts, path: await received(id), bytes: FILM.length };
  const actor = {
    kind: 'user',
    id: world.coach.id,
    practiceId: world.practiceId,
    role: 'coach',
    coachIds: [],
  } as const;
  await expect(
    acceptClip({ inPractice: breaking, storage: ground.storage }, actor, world.visit.id, file, id),
  ).rejects.toThrow('the connection broke');
};

describe('an upload that was cut short while it was taken in', () => {
  it('is taken in when its sender asks again: the film lies in its place already', async () => {
    const { id, uploadUrl } = await open();
    await takeIn(id, 'before');
    expect(await isKept(id)).toBe(true);
    await coach.get(`/api/clips/${id}`).expect(404);
    const { headers } = await coach.head(uploadUrl).set(TUS).expect(200);
    expect(headers['upload-offset']).toBe(String(FILM.length));
    await coach.get(`/api/clips/${id}`).expect(200);
    expect(await isKept(id)).toBe(true);
  });

  it('leaves nothing when it is given up instead', async () => {
    const { id, uploadUrl } = await open();
    await takeIn(id, 'before');
    await coach.delete(uploadUrl).expect(204);
    expect(await isKept(id)).toBe(false);
  });

  it('keeps its film where the commit came through and only the answer did not', async () => {
    const { id } = await open();
    await takeIn(id, 'after');
    await coach.get(`/api/clips/${id}`).expect(200);
    expect(await isKept(id)).toBe(true);
  });

  it('leaves nothing where nobody can come back for it', async () => {
    const id = randomUUID();
    await takeIn(id, 'before');
    expect(await isKept(id)).toBe(false);
  });
});
