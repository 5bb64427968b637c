import { parse } from 'node:querystring';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { AuditEntry } from '#shared/contracts/audit.ts';
import { product } from '#server/db/in-practice.ts';
import { type Api, startApi } from '#tests/support/api.ts';

const PATH = '/api/practice/audit';
const FILE = '/api/practice/audit.csv';

let api: Api;
let owner: Awaited<ReturnType<Api['as']>>;
let gone: string;
beforeAll(async () => {
  api = await startApi();
  owner = await api.as(api.world.owner);
  const coach = await api.as(api.world.coach);
  const other = await api.as(api.world.otherCoach);
  const add = (who: typeof coach, givenName: string) =>
    who
      .post('/api/athletes')
      .send({ givenName, familyName: 'Wren', birthDate: '2001-02-03' })
      .expect(201);
  await add(coach, '=SUM(A1)');
  gone = (await add(other, 'Leaver')).body.id;
  await coach.post(`/api/athletes/${api.world.athlete.id}/visits`).send({}).expect(201);
  await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    em.execute('delete from athlete where id = ?', [gone]),
  );
});
afterAll(() => api.close());

const read = async (query = ''): Promise<{ items: AuditEntry[]; total: number }> =>
  (await owner.get(PATH).query(parse(query)).expect(200)).body;

describe('the audit trail', () => {
  it('is read by the owner, newest first, with names as they are now', async () => {
    const { items, total } = await read();
    expect(total).toBe(3);
    expect(items.map(({ action, by, athlete }) => [action, by?.name, athlete?.name])).toEqual([
      ['visit.add', api.world.coach.name, expect.stringContaining('Robin')],
      // the athlete is gone, and with them the name
      ['athlete.add', api.world.otherCoach.name, null],
      ['athlete.add', api.world.coach.name, '=SUM(A1) Wren'],
    ]);
    expect(items[1]?.athlete?.id).toBe(gone);
  });

  it.each([
    ['person', () => `person=${api.world.otherCoach.id}`, 1],
    ['athlete, though gone', () => `athlete=${gone}`, 1],
    ['action', () => 'action=athlete.add', 2],
    ['first moment', () => `from=${new Date(Date.now() + 60_000).toISOString()}`, 0],
    ['last moment', () => `to=${new Date(Date.now() + 60_000).toISOString()}`, 3],
    ['several at once', () => `action=athlete.add&person=${api.world.coach.id}`, 1],
  ])('is narrowed by %s', async (_by, query, count) => {
    const { items, total } = await read(query());
    expect([items.length, total]).toEqual([count, count]);
  });

  it('comes in pages', async () => {
    const first = await read('page=1&pageSize=2');
    const second = await read('page=2&pageSize=2');
    expect([first.items.length, second.items.length, second.total]).toEqual([2, 1, 3]);
    expect(new Set([...first.items, ...second.items].map(({ id }) => id)).size).toBe(3);
  });

  it('says what it cannot be asked', async () => {
    const { body } = await owner.get(PATH).query({ action: 'all', from: 'May' }).expect(422);
    expect(body.faults.map(({ path }: { path: string }) => path)).toEqual([
      'query.action',
      'query.from',
    ]);
  });

  it('names the people and the athletes whom it can be asked for', async () => {
    const { body } = await owner.get(`${PATH}/names`).expect(200);
    expect(body.people).toHaveLength(4);
    expect(body.athletes).toContainEqual({ id: gone, name: null });
  });

  it('is nobody else’s, and another practice’s is another', async () => {
    for (const user of [api.world.coach, api.world.supervisor, api.world.otherCoach]) {
      const who = await api.as(user);
      for (const path of [PATH, `${PATH}/names`, FILE]) await who.get(path).expect(403);
    }
    for (const path of [PATH, `${PATH}/names`, FILE]) await api.nobody.get(path).expect(401);
    const foreign = await api.as(api.world.foreignOwner);
    const { body } = await foreign.get(PATH).query({ athlete: api.world.athlete.id }).expect(200);
    expect(body).toMatchObject({ items: [], total: 0 });
    const names = (await foreign.get(`${PATH}/names`)).body;
    expect(names.athletes).toEqual([]);
    expect(names.people.map(({ id }: { id: string }) => id)).not.toContain(api.world.coach.id);
  });

  it('is taken away as a file without formulas, and that stands in it', async () => {
    const { text, headers } = await owner.get(FILE).query({ action: 'athlete.add' }).expect(200);
    expect(headers['content-disposition']).toContain('audit-trail.csv');
    const [head, ...lines] = text.trim().split('\r\n');
    expect(head).toMatch(/^at,actor,person,person id,role,what,action,athlete,/);
    expect(lines).toHaveLength(2);
    expect(text).toContain(",'=SUM(A1) Wren,");
    const [exported] = (await read('action=audit.export')).items;
    expect(exported).toMatchObject({ by: { id: api.world.owner.id }, detail: { rows: 2 } });
  });
});
