import { randomUUID } from 'node:crypto';
import { readdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import pg from 'pg';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { asJobs } from '#tests/support/as-jobs.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { tokenHash } from '../../http/token-hash.ts';
import { Athlete } from '../athletes/athlete.entity.ts';
import { makeAthlete, makeConsent } from '../athletes/athlete.factory.ts';
import { clipFiles, frameKey, hiddenFiles, keptFilmKey, sheetKey } from '../clips/clip-files.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { Upload } from '../clips/upload.entity.ts';
import { Comment } from '../comments/comment.entity.ts';
import { KeptFilm } from '../replays/film/kept-film.entity.ts';
import { Replay } from '../replays/replay.entity.ts';
import { emptyReport } from '#tests/support/one-of-each.ts';
import { reportKey } from '../reports/report-files.ts';
import { Report } from '../reports/report.entity.ts';
import { makeRep } from '../reps/rep.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { Erasure } from './erasure.entity.ts';
import { heldRows } from './export/held-rows.ts';
import { eraseFilesJob } from './jobs/erase-files.ts';

/** Stands in every text and file of the person, and nowhere else. */
let secret = '';
let n = 0;

let api: Api;
let owner: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  owner = await api.as(api.world.owner);
});
afterAll(() => api.close());

interface Made {
  readonly athleteId: string;
  readonly clipId: string;
  readonly uploadId: string;
  readonly token: string;
}
let made: Made;

/** Somebody with a row or a file of every kind that a person can leave behind. */
beforeEach(async () => {
  n += 1;
  secret = `Xylotera${n}x`;
  const { coach, practiceId } = api.world;
  const { storage } = api.ground;
  const token = randomUUID().replaceAll('-', '').padEnd(43, 'e');
  made = await api.ground.inPractice(product(practiceId), async ({ em }) => {
    const athlete = makeAthlete(em, {
      coach,
      givenName: secret,
      familyName: 'Marsh',
      sport: secret,
      cautions: secret,
    });
    makeConsent(em, {
      athlete,
      recordedBy: coach,
      guardianName: secret,
      guardianRelation: secret,
      how: secret,
      purposes: ['assessment', 'sharing-by-link'],
    });
    const visit = makeVisit(em, { athlete, coach });
    visit.note = secret;
    const id = randomUUID();
    const files = clipFiles(practiceId, id);
    const clip = makeClip(em, { id, visit, uploadedBy: coach, name: `${secret}.mp4`, files });
    const rep = makeRep(em, { clip, createdBy: coach, excludedNote: secret });
    em.create(Comment, {
      ...{ clip, body: secret, fromFrame: 0, toFrame: 1, shape: null, shared: true, by: coach },
      answerTo: null,
    });
    const replay = em.create(Replay, {
      ...{ visit, rep, side: 'right', fromFrame: 0, toFrame: 100, message: secret, by: coach },
      ...{ showReading: false, showCall: false, hideHead: true, passPhraseHash: null },
      tokenHash: tokenHash(token),
      expiresAt: new Date(Date.now() + 1e9),
    });
    const film = em.create(KeptFilm, {
      ...{ replay, state: 'ready', bytes: 1, madeAt: new Date(), by: coach },
    });
    const report = em.create(Report, {
      ...{ visit, number: 1, state: 'ready', content: emptyReport(secret), pages: 1, bytes: 1 },
      by: coach,
    });
    const upload = em.create(Upload, {
      ...{ visit, name: `${secret}.mov`, bytes: 100, view: 'front', supportSide: 'right' },
      ...{ mirrored: false, openedBy: coach },
    });
    await em.flush();
    const keys = [
      ...Object.values(files),
      ...Object.values(hiddenFiles(practiceId, id, replay.id, randomUUID())),
      keptFilmKey(practiceId, id, film.id),
      frameKey(practiceId, id, 3),
      sheetKey(practiceId, id, 1),
      reportKey(practiceId, athlete.id, report.id),
    ];
    for (const key of keys)
      await storage.putStream(key, Readable.from([secret]), 'application/octet-stream');
    for (const name of [upload.id, `${upload.id}.json`])
      await writeFile(join(storage.incoming, name), secret);
    return { athleteId: athlete.id, clipId: id, uploadId: upload.id, token };
  });
  const agent = await api.as(coach);
  const { body } = await agent.get(`/api/athletes/${made.athleteId}/consents`).expect(200);
  await agent
    .post(`/api/consents/${body.items[0].id}/scan`)
    .attach('scan', Buffer.from(`%PDF-1.4 ${secret}\n%%EOF\n`), 'a.pdf')
    .expect(201);
  // looks, marks and exports leave entries in the trail
  await agent.get(`/api/visits/${await visitOf()}`).expect(200);
});

const visitOf = async (): Promise<string> => {
  const { body } = await owner.get(`/api/athletes/${made.athleteId}/visits`).expect(200);
  return String(body.items[0].id);
};

/** Every table of every schema of the product, all rows as text, read past the walls. */
const everyRow = async (): Promise<{ table: string; text: string }[]> => {
  const { pathname: database } = new URL(api.ground.config.database.owner);
  const admin = new URL(String(process.env.REDSHANK_TEST_PG));
  admin.pathname = database;
  const client = new pg.Client({ connectionString: admin.href });
  await client.connect();
  try {
    const { rows: tables } = await client.query<{ name: string }>(
      `select quote_ident(table_schema) || '.' || quote_ident(table_name) as name from information_schema.tables
       where table_type = 'BASE TABLE' and table_schema not in ('pg_catalog', 'information_schema')`,
    );
    const found = [];
    for (const { name } of tables) {
      const { rows } = await client.query<{ text: string }>(
        `select to_jsonb(t)::text as text from ${name} t`,
      );
      found.push(...rows.map(({ text }) => ({ table: name, text })));
    }
    expect(tables.length).toBeGreaterThan(25);
    return found;
  } finally {
    await client.end();
  }
};
const tablesWith = async (needle: string): Promise<string[]> =>
  [
    ...new Set(
      (await everyRow()).filter(({ text }) => text.includes(needle)).map(({ table }) => table),
    ),
  ].sort();

/** Every file below the data folder that says something of the person, by its path or by what is in it. */
const filesWith = async (...needles: readonly string[]): Promise<string[]> => {
  const { uploads } = api.ground.config;
  const names = await readdir(uploads, { recursive: true, withFileTypes: true });
  const found = [];
  for (const entry of names.filter((each) => each.isFile())) {
    const path = join(entry.parentPath, entry.name);
    const text = `${path} ${(await readFile(path)).toString('latin1')}`;
    if (needles.some((needle) => text.includes(needle))) found.push(path);
  }
  return found;
};

/** Ids of every row that hangs on the person. */
const idsOf = async (): Promise<string[]> => {
  const rows = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    heldRows(em, made.athleteId),
  );
  return [...rows.values()].flat().flatMap(({ id }) => (typeof id === 'string' ? [id] : []));
};

const erase = async (name = `${secret} Marsh`) =>
  owner.post(`/api/athletes/${made.athleteId}/erase`).send({ name });
const runJob = (erasureId: string, again = false, ground = api.ground) =>
  eraseFilesJob.run({
    ground,
    practiceId: api.world.practiceId,
    payload: { erasureId, ...(again ? { again } : {}) },
    signal: new AbortController().signal,
  });

describe('an athlete who is erased', () => {
  it('leaves nothing in any table and in no file, but a tombstone without a name', async () => {
    const ids = await idsOf();
    expect(ids.length).toBeGreaterThan(6);
    expect(await filesWith(secret)).toHaveLength(14);
    const answer = await erase();
    expect(answer.status).toBe(202);
    expect(answer.body).toMatchObject({ why: 'asked', visits: 1, clips: 1, doneAt: null });
    // rows are gone at once, whenever the files follow
    expect(await tablesWith(secret)).toEqual([]);
    await runJob(answer.body.id);
    await runJob(answer.body.id, true);
    expect(await filesWith(secret, ...ids)).toEqual([]);
    expect(await tablesWith(secret)).toEqual([]);
    const left = new Set<string>();
    for (const id of ids) for (const table of await tablesWith(id)) left.add(table);
    expect([...left].sort()).toEqual(['public.audit_entry', 'public.erasure']);
    const { body } = await owner.get('/api/practice/retention').expect(200);
    expect(body.erasures[0]).toMatchObject({ athleteId: made.athleteId, why: 'asked' });
    expect(body.erasures[0].doneAt).not.toBeNull();
    expect(JSON.stringify(body)).not.toContain(secret);
  });

  it('is out of sight at once: pages, clips, lists, links, uploads', async () => {
    const visitId = await visitOf();
    await api.nobody.get(`/api/r/${made.token}`).expect(200);
    expect((await erase()).status).toBe(202);
    const coach = await api.as(api.world.coach);
    for (const path of [
      `/api/athletes/${made.athleteId}`,
      `/api/athletes/${made.athleteId}/consents`,
      `/api/visits/${visitId}`,
      `/api/clips/${made.clipId}`,
      `/api/clips/${made.clipId}/video`,
      `/api/clips/${made.clipId}/bench`,
    ])
      await coach.get(path).expect(404);
    await api.nobody.get(`/api/r/${made.token}`).expect(404);
    const { body } = await coach.get(`/api/athletes?q=${secret}`).expect(200);
    expect(body.items.filter(({ id }: { id: string }) => id === made.athleteId)).toEqual([]);
    const upload = await coach.head(`/api/uploads/${made.uploadId}`).set('Tus-Resumable', '1.0.0');
    expect(upload.status).toBe(410);
    await coach
      .post(`/api/visits/${visitId}/uploads`)
      .send({ name: 'a.mov', bytes: 9, view: 'front' })
      .expect(404);
  });

  it('goes on where its job was killed', async () => {
    const { body } = await erase();
    const { storage } = api.ground;
    let deletions = 0;
    const dying = new Proxy(storage, {
      get: (target, name) =>
        name === 'deleteAll'
          ? (prefix: string) => {
              deletions += 1;
              if (deletions > 1) throw new Error('killed');
              return target.deleteAll(prefix);
            }
          : Reflect.get(target, name),
    });
    await expect(runJob(body.id, false, { ...api.ground, storage: dying })).rejects.toThrow(
      'killed',
    );
    expect(await filesWith(made.clipId)).not.toEqual([]);
    const rows = () =>
      api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
        em.findOneOrFail(Erasure, { id: body.id }),
      );
    expect((await rows()).doneAt ?? null).toBeNull();
    // what a new worker finds unfinished
    const unfinished = await asJobs(api, 'select erasure_id from erasures_unfinished()');
    expect(unfinished).toContainEqual({ erasure_id: body.id });
    await runJob(body.id);
    expect(await filesWith(made.clipId, made.uploadId)).toEqual([]);
    expect((await rows()).doneAt).toBeInstanceOf(Date);
  });

  it('is swept once more, for what work of that moment still put down', async () => {
    const { body } = await erase();
    await runJob(body.id);
    const key = `${api.world.practiceId}/clips/${made.clipId}/bench.mp4`;
    await api.ground.storage.putStream(key, Readable.from([secret]), 'video/mp4');
    await runJob(body.id, true);
    expect(await filesWith(secret)).toEqual([]);
  });

  it('is erased by the owner alone, who types the name', async () => {
    const wrong = await erase('Robin Marsh');
    expect(wrong.status).toBe(422);
    expect(wrong.body.faults[0].path).toBe('body.name');
    for (const who of ['coach', 'supervisor'] as const) {
      const agent = await api.as(api.world[who]);
      const path = `/api/athletes/${made.athleteId}/erase`;
      await agent
        .post(path)
        .send({ name: `${secret} Marsh` })
        .expect(403);
    }
    const foreign = await api.as(api.world.foreignOwner);
    const path = `/api/athletes/${made.athleteId}/erase`;
    await foreign
      .post(path)
      .send({ name: `${secret} Marsh` })
      .expect(404);
    expect(
      await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
        em.count(Athlete, { id: made.athleteId }),
      ),
    ).toBe(1);
  });
});
