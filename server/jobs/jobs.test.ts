import { randomUUID } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import type { Client } from 'pg';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import * as z from 'zod';
import { type Api, startApi } from '#tests/support/api.ts';
import { withJobs } from '#tests/support/as-jobs.ts';
import { product } from '../db/in-practice.ts';
import { makeClip } from '../features/clips/clip.factory.ts';
import { enqueue, handles, type JobContext, type JobType } from './job.ts';
import { Locks } from './locks.ts';
import { startWorker, type Worker } from './worker.ts';

type Payload = { clipId: string };
const type: JobType<Payload> = { queue: 'test-job', payload: z.object({ clipId: z.uuid() }) };

let api: Api;
let worker: Worker | null = null;
beforeAll(async () => {
  api = await startApi();
});
afterEach(async () => {
  await worker?.stop();
  worker = null;
});
afterAll(() => api.close());

const start = async (run: (context: JobContext<Payload>) => Promise<void>): Promise<void> => {
  const handler = handles<Payload>({
    type,
    lockKey: ({ clipId }) => clipId,
    run,
    expireInMinutes: 1,
    retryLimit: 2,
    retryDelaySeconds: 1,
    unfinished: {
      sql: 'select clip_id, practice_id from clips_to_prepare()',
      read: (row) => ({
        practiceId: String(row.practice_id),
        payload: { clipId: String(row.clip_id) },
      }),
    },
  });
  worker = await startWorker(api.ground, [handler], () => undefined);
};

const ask = (clipId: string, thenFail = false): Promise<string> =>
  api.ground.inPractice(product(api.world.practiceId), async (unit) => {
    const id = await enqueue(unit, type, { clipId });
    if (thenFail) throw new Error('the state was not kept');
    return id;
  });

const asJobs = <T>(work: (client: Client) => Promise<T>): Promise<T> => withJobs(api, work);

const eventually = (check: () => void | Promise<void>): Promise<void> =>
  vi.waitFor(check, { timeout: 25_000, interval: 50 });

describe('a job', () => {
  it('runs once its state is committed, with what it was given', async () => {
    const ran: JobContext<Payload>[] = [];
    await start((context) => {
      ran.push(context);
      return Promise.resolve();
    });
    const clipId = randomUUID();
    await ask(clipId);
    await eventually(() => {
      expect(ran).toHaveLength(1);
    });
    expect(ran[0]).toMatchObject({ practiceId: api.world.practiceId, payload: { clipId } });
  });

  it('is never asked for when its state is rolled back', async () => {
    const ran: string[] = [];
    await start(({ payload }) => {
      ran.push(payload.clipId);
      return Promise.resolve();
    });
    await expect(ask(randomUUID(), true)).rejects.toThrow('the state was not kept');
    const kept = randomUUID();
    await ask(kept);
    await eventually(() => {
      expect(ran).toEqual([kept]);
    });
  });

  it('that was committed while no worker lived runs when one comes', async () => {
    const clipId = randomUUID();
    await ask(clipId);
    const ran: string[] = [];
    await start(({ payload }) => {
      ran.push(payload.clipId);
      return Promise.resolve();
    });
    await eventually(() => {
      expect(ran).toEqual([clipId]);
    });
  });

  it('that was sent, but not ticked off before a crash, is not done twice', async () => {
    const ran: string[] = [];
    await start(({ payload }) => {
      ran.push(payload.clipId);
      return Promise.resolve();
    });
    const first = randomUUID();
    const id = await ask(first);
    await eventually(() => {
      expect(ran).toEqual([first]);
    });
    await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.execute('update job_outbox set sent_at = null where id = ?', [id]),
    );
    const second = randomUUID();
    await ask(second);
    await eventually(() => {
      expect(ran).toEqual([first, second]);
    });
    const waiting = await asJobs((client) => client.query('select * from jobs_to_send(10)'));
    expect(waiting.rows).toEqual([]);
  });

  it('that fails is tried again', async () => {
    let tries = 0;
    await start(() => {
      tries += 1;
      return tries === 1 ? Promise.reject(new Error('the disk was busy')) : Promise.resolve();
    });
    await ask(randomUUID());
    await eventually(() => {
      expect(tries).toBe(2);
    });
  });

  it('has its place in the queue and its moment, and keeps them when a worker comes anew', async () => {
    const startAfter = new Date('2999-01-01T00:00:00.000Z');
    const clipId = await api.ground.inPractice(product(api.world.practiceId), async (unit) => {
      const { visit, coach } = api.world;
      const { id } = makeClip(unit.em, { visit, uploadedBy: coach, state: 'waiting' });
      await enqueue(unit, type, { clipId: id }, { priority: -3, startAfter });
      return id;
    });
    const waiting = () =>
      asJobs((client) =>
        client.query(
          `select priority, start_after from pgboss.job where name = $1 and data->'payload'->>'clipId' = $2`,
          [type.queue, clipId],
        ),
      );
    const once = [{ priority: -3, start_after: startAfter }];
    await start(() => Promise.resolve());
    await eventually(async () => {
      expect((await waiting()).rows).toContainEqual(once[0]);
    });
    const { length } = (await waiting()).rows;
    await worker?.stop();
    await start(() => Promise.resolve());
    expect((await waiting()).rows).toHaveLength(length);
  });

  it('is told when the worker stops, and the stop waits for its end', async () => {
    let ended = false;
    let begun = false;
    await start(async ({ signal }) => {
      begun = true;
      await pause(60_000, undefined, { signal }).catch(() => undefined);
      ended = true;
    });
    await ask(randomUUID());
    await eventually(() => {
      expect(begun).toBe(true);
    });
    await worker?.stop();
    worker = null;
    expect(ended).toBe(true);
  });
});

describe('a job whose worker was killed', () => {
  it('is taken up by the next worker, not when its time is over', async () => {
    await start(() => Promise.resolve());
    await worker?.stop();
    worker = null;
    const clipId = randomUUID();
    // as the queue looks after a kill: fetched, and nobody there
    await asJobs((client) =>
      client.query(
        `insert into pgboss.job (name, data, state, started_on, retry_limit)
         values ($1, $2, 'active', now(), 2)`,
        [type.queue, { practiceId: api.world.practiceId, payload: { clipId } }],
      ),
    );
    const ran: string[] = [];
    await start(({ payload }) => {
      ran.push(payload.clipId);
      return Promise.resolve();
    });
    await eventually(() => {
      expect(ran).toEqual([clipId]);
    });
  });
});

describe('a clip whose worker was killed', () => {
  const clipInPreparation = () =>
    api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      Promise.resolve(
        makeClip(em, {
          visit: api.world.visit,
          uploadedBy: api.world.coach,
          state: 'preparing',
        }),
      ),
    );

  it('is prepared again by the next worker, unless another still works on it', async () => {
    const [orphan, held] = [await clipInPreparation(), await clipInPreparation()];
    const other = await Locks.open(api.ground.config.database.jobs, () => undefined);
    const ran: string[] = [];
    await other.hold(`test-job ${held.id}`, async () => {
      await start(({ payload }) => {
        ran.push(payload.clipId);
        return Promise.resolve();
      });
      await eventually(() => {
        expect(ran).toContain(orphan.id);
      });
      expect(ran).not.toContain(held.id);
    });
    await other.close();
  });
});

describe('the health of an instance', () => {
  it('sees whether a worker lives', async () => {
    const { WORKER_LIVES_SQL } = await import('./locks.ts');
    const lives = async (): Promise<boolean | undefined> => {
      const rows = await api.ground.orm.em.fork().execute<{ lives: boolean }[]>(WORKER_LIVES_SQL);
      return rows[0]?.lives;
    };
    expect(await lives()).toBe(false);
    await start(() => Promise.resolve());
    expect(await lives()).toBe(true);
  });
});

describe('the role of the queue', () => {
  it('reads no table of the product', async () => {
    for (const table of ['athlete', 'clip', 'job_outbox', 'account']) {
      await expect(asJobs((client) => client.query(`select * from ${table}`))).rejects.toThrow(
        /permission denied/,
      );
    }
  });

  it('leaves nothing at work where it cannot start', async () => {
    const broken = handles<Payload>({
      type,
      lockKey: ({ clipId }) => clipId,
      run: () => Promise.resolve(),
      expireInMinutes: 1,
      retryLimit: 2,
      unfinished: {
        sql: 'select nothing',
        read: () => ({ practiceId: '', payload: { clipId: '' } }),
      },
    });
    await expect(startWorker(api.ground, [broken], () => undefined)).rejects.toThrow('nothing');
    const open = await asJobs(
      async (client) =>
        (
          await client.query(
            `select from pg_stat_activity where application_name = 'redshank worker'
              and datname = current_database()`,
          )
        ).rowCount,
    );
    expect(open).toBe(0);
  });
});
