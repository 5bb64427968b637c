import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { product } from '#server/db/in-practice.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { AuditEntry } from '../audit/audit-entry.entity.ts';

const PATH = '/api/practice';
const given = { name: 'Quiet Harbour', contact: 'desk@quiet-harbour.example' };
const settings = { ...given, ownersNeedCode: false };

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

describe('what athletes are told of the practice', () => {
  it('is read by all staff and changed by the owner, who sees it at once everywhere', async () => {
    const owner = await api.as(api.world.owner);
    expect((await owner.put(PATH).send(given).expect(200)).body).toEqual(settings);
    for (const user of [api.world.coach, api.world.supervisor, api.world.owner]) {
      const who = await api.as(user);
      expect((await who.get(PATH).expect(200)).body).toEqual(settings);
      expect((await who.get('/api/me')).body.practice.name).toBe(given.name);
    }
    const trail = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.find(AuditEntry, { action: 'practice.edit' }),
    );
    expect(trail).toMatchObject([
      { byUser: api.world.owner.id, detail: { fields: 'name contact' } },
    ]);
  });

  it('is changed by nobody else, and never in another practice', async () => {
    for (const user of [api.world.coach, api.world.supervisor])
      await (await api.as(user)).put(PATH).send(given).expect(403);
    await api.nobody.put(PATH).send(given).expect(401);
    const foreign = await api.as(api.world.foreignOwner);
    await foreign
      .put(PATH)
      .send({ ...given, name: 'Elsewhere' })
      .expect(200);
    const own = await (await api.as(api.world.owner)).get(PATH).expect(200);
    expect(own.body.name).toBe(given.name);
  });

  it.each([
    ['name', { name: ' ' }],
    ['name', { name: 'x'.repeat(81) }],
    ['contact', { contact: 'two\nlines' }],
  ])('refuses a %s that cannot stand there', async (field, change) => {
    const owner = await api.as(api.world.owner);
    const { body } = await owner
      .put(PATH)
      .send({ ...given, ...change })
      .expect(422);
    expect(body.faults[0].path).toBe(`body.${field}`);
  });

  it('may have no contact', async () => {
    const owner = await api.as(api.world.owner);
    const { body } = await owner
      .put(PATH)
      .send({ ...given, contact: '' })
      .expect(200);
    expect(body.contact).toBe('');
  });
});
