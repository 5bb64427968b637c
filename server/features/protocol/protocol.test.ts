import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { product } from '#server/db/in-practice.ts';
import { asAdmin } from '#tests/support/admin.ts';
import { type Api, startApi } from '#tests/support/api.ts';

const PATH = '/api/practice/protocol';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const change = (after: number, values: object = {}, note = 'Our people lift lower.') => ({
  after,
  values: { ...STANDARD_PROTOCOL, ...values },
  note,
});

describe('a practice’s protocol', () => {
  it('begins with the figures of the study, as version 1, and is read by all staff', async () => {
    for (const user of [api.world.coach, api.world.supervisor, api.world.owner]) {
      const { body } = await (await api.as(user)).get(PATH).expect(200);
      expect(body.history).toHaveLength(1);
      expect(body.current).toMatchObject({ version: 1, by: null, values: STANDARD_PROTOCOL });
    }
    await api.nobody.get(PATH).expect(401);
  });

  it('is changed by the owner alone, as a version beside the one before', async () => {
    for (const user of [api.world.coach, api.world.supervisor, api.world.otherCoach])
      await (
        await api.as(user)
      )
        .post(PATH)
        .send(change(1, { reps: 4 }))
        .expect(403);
    const owner = await api.as(api.world.owner);
    const { body } = await owner
      .post(PATH)
      .send(change(1, { reps: 4 }))
      .expect(201);
    expect(body.current).toMatchObject({
      version: 2,
      note: 'Our people lift lower.',
      by: { id: api.world.owner.id },
      values: { ...STANDARD_PROTOCOL, reps: 4 },
    });
    expect(body.history.map(({ version }: { version: number }) => version)).toEqual([2, 1]);
    // the one before is not passed over by somebody who has not seen this one
    const late = await owner
      .post(PATH)
      .send(change(1, { reps: 5 }))
      .expect(409);
    expect(late.body.code).toBe('edited-meanwhile');
  });

  it('of two changes at once keeps one', async () => {
    const owner = await api.as(api.world.owner);
    const after = (await owner.get(PATH)).body.current.version;
    const answers = await Promise.all([
      owner.post(PATH).send(change(after, { reps: 2 })),
      owner.post(PATH).send(change(after, { reps: 3 })),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  });

  it('of another practice is neither seen nor changed', async () => {
    const foreign = await api.as(api.world.foreignOwner);
    const { body } = await foreign
      .post(PATH)
      .send(change(1, { reps: 6 }))
      .expect(201);
    expect(body.history).toHaveLength(2);
    const own = (await (await api.as(api.world.owner)).get(PATH)).body;
    expect(own.current.values.reps).not.toBe(6);
  });

  it.each([
    ['gateFrom', { gateFrom: 40 }],
    ['gateTo', { gateFrom: 75, gateTo: 90 }],
    ['gateTo', { gateFrom: 45, gateTo: 95, liftShort: 90 }],
    ['toBelow', { gateFrom: 65, gateTo: 85, liftShort: 80 }],
    ['liftShort', { liftShort: 70 }],
    ['early', { early: 0.8 }],
    ['reps', { reps: 2.5 }],
  ])('refuses %s out of its bounds, and says what to do', async (key, values) => {
    const owner = await api.as(api.world.owner);
    const { body } = await owner.post(PATH).send(change(1, values)).expect(422);
    const fault = body.faults.find(
      ({ path }: { path: string }) => path === `body.values.${key}` || path === `values.${key}`,
    );
    expect(fault?.message).toMatch(/Choose|Put|Narrow/);
  });

  it('asks why it is changed', async () => {
    const owner = await api.as(api.world.owner);
    const { body } = await owner
      .post(PATH)
      .send(change(1, {}, ''))
      .expect(422);
    expect(body.faults.map(({ path }: { path: string }) => path).join()).toContain('note');
  });

  it('refuses a set-up that is not the practice’s', async () => {
    const owner = await api.as(api.world.owner);
    const after = (await owner.get(PATH)).body.current.version;
    const setUpId = '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01';
    await owner.post(PATH).send(change(after, { setUpId })).expect(422);
  });

  it('is only added to: the product may not, and the superuser cannot, change a version', async () => {
    for (const sql of ['update protocol_version set note = note', 'delete from protocol_version']) {
      await expect(
        api.ground.inPractice(product(api.world.practiceId), ({ em }) => em.execute(sql)),
      ).rejects.toThrow(/permission denied/);
    }
    const database = new URL(api.ground.config.database.app).pathname.slice(1);
    for (const sql of [
      'update protocol_version set note = note',
      'delete from protocol_version',
      'truncate protocol_version cascade',
    ])
      await expect(asAdmin((client) => client.query(sql), database)).rejects.toThrow(
        /only added to/,
      );
  });
});
