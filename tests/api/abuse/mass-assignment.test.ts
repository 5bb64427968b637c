import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { type RouteName, routes } from '#shared/contracts/routes.ts';
import type { Route } from '#shared/contracts/route.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { foundInDatabase, query } from '#tests/support/whole-database.ts';
import { addressOf, BODIES, NAMES } from '#tests/support/every-route.ts';
import { tokenTo } from '#tests/support/letters.ts';
import { jsonSchemaOf } from '#tests/support/json-schema-of.ts';
import { makeOneOfEach } from '#tests/support/one-of-each.ts';
import { ACCESS } from '#tests/support/route-access.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

/** Names that rows have and no body may write; none of the values is to be found anywhere afterwards. */
const MARK = 'planted-by-a-stranger';
const DAY = '2001-02-03';
const ID = '0badc0de-0bad-4bad-8bad-';
/** @param n of the try, by which the place where something stuck is found */
const planted = (n: number) => plantedAs(`${ID}${String(n).padStart(12, '0')}`, `${MARK}-${n}`);
const plantedAs = (id: string, mark: string) => ({
  id,
  practiceId: api.world.foreignPracticeId,
  practice_id: api.world.foreignPracticeId,
  practice: { id: api.world.foreignPracticeId },
  role: 'owner',
  user: id,
  by: id,
  coachId: id,
  coach: id,
  athleteId: id,
  recordedBy: id,
  signedOff: true,
  signedOffAt: `${DAY}T00:00:00Z`,
  createdAt: `${DAY}T00:00:00Z`,
  revokedAt: `${DAY}T00:00:00Z`,
  disabledAt: `${DAY}T00:00:00Z`,
  deletionDue: DAY,
  state: 'ready',
  email: `${mark}@test.example`,
  passwordHash: mark,
  tokenHash: mark,
  files: { original: mark },
  __proto__: { practiceId: api.world.foreignPracticeId },
  constructor: { prototype: { role: 'owner' } },
});

interface Schema {
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly additionalProperties?: unknown;
}

/** Everywhere in a schema where an object takes fields that it does not name. */
const openPlaces = (schema: unknown, at: string): string[] => {
  if (typeof schema !== 'object' || schema === null) return [];
  const { properties, additionalProperties } = schema as Schema;
  return [
    ...(properties && additionalProperties !== false ? [at] : []),
    ...Object.entries(schema).flatMap(([key, part]) => openPlaces(part, `${at}/${key}`)),
  ];
};

const bodies = (Object.entries(routes) as [RouteName, Route][]).filter(([, { body }]) => body);

describe('a body', () => {
  it.each(bodies)('of %s keeps no field that its contract does not name', (_name, { body }) => {
    if (!body) throw new Error('a body was expected');
    const schema = jsonSchemaOf(body, 'output');
    expect(openPlaces(schema, '')).toEqual([]);
  });

  it('names no practice, no token and nothing that only the product decides', () => {
    const never = /^(practice|practiceId|.*Hash|createdAt|signedOff.*|revokedAt|disabledAt|files)$/;
    for (const [name, { body }] of bodies) {
      const text = JSON.stringify(jsonSchemaOf(body ?? z.object({})), (key, value: unknown) =>
        key === 'properties' ? Object.keys(value as object) : value,
      );
      const fields = [...text.matchAll(/"properties":\[([^\]]*)\]/g)].flatMap(([, list]) =>
        (list ?? '').split(',').map((field) => field.replaceAll('"', '')),
      );
      expect(
        fields.filter((field) => never.test(field)),
        name,
      ).toEqual([]);
    }
  });
});

const fieldsOf = ({ body }: Route): string[] =>
  Object.keys((jsonSchemaOf(body ?? z.object({})) as Schema).properties ?? {});

const foreign = async (): Promise<string> =>
  JSON.stringify(
    await query(
      api,
      `select (select count(*) from account where practice_id = $1) as accounts,
         (select count(*) from athlete where practice_id = $1) as athletes,
         (select count(*) from clip where practice_id = $1) as clips,
         (select name from practice where id = $1) as name`,
      [api.world.foreignPracticeId],
    ),
  );

describe('fields that nobody asked for', () => {
  const named = (Object.keys(BODIES) as RouteName[]).filter(
    (name) => !routes[name].path.includes('/r/'),
  );

  it('change nothing, whichever route they are sent to', async () => {
    const before = await foreign();
    const taken: string[] = [];
    const ids = await makeOneOfEach(api);
    const agents = { owner: await api.as(api.world.owner), coach: await api.as(api.world.coach) };
    for (const [n, name] of named.entries()) {
      const route = routes[name] as Route;
      const address = name in NAMES ? addressOf(name as keyof typeof NAMES, ids) : route.path;
      const extra = Object.entries(planted(n)).filter(([key]) => !fieldsOf(route).includes(key));
      const agent = agents[ACCESS[name] === 'owner' ? 'owner' : 'coach'];
      const answer = await agent[route.method](address).send({
        ...Object.fromEntries(extra),
        ...BODIES[name],
      });
      expect(answer.status, `${name} ${answer.text}`).toBeLessThan(500);
      if (answer.status < 400) taken.push(name);
    }
    expect(await foundInDatabase(api, [ID, MARK, DAY])).toEqual([]);
    expect(await foreign()).toBe(before);
    expect(taken).toEqual(
      expect.arrayContaining([
        'addAthlete',
        'editAthlete',
        'changePractice',
        'addRep',
        'editVisit',
      ]),
    );
    expect(taken.length).toBeGreaterThan(25);
    const [row] = await query(
      api,
      `select string_agg(distinct role, ',') as roles from account where id = any($1)`,
      [[api.world.coach.id, api.world.otherCoach.id]],
    );
    expect(row?.roles).toBe('coach');
  });

  it('make nobody who joins an owner, nor somebody of another practice', async () => {
    const email = `${randomUUID()}@test.example`;
    const owner = await api.as(api.world.owner);
    await owner.post('/api/practice/invitations').send({ email, role: 'coach' }).expect(201);
    const token = await tokenTo(api, email);
    const { body } = await api.nobody
      .post('/api/join')
      .send({ ...planted(0), token, name: 'Wren Alder', password: 'reeds at low water' })
      .expect(201);
    expect(body).toMatchObject({
      user: { email, role: 'coach' },
      practice: { id: api.world.practiceId },
    });
    expect(await foundInDatabase(api, [ID, MARK, DAY])).toEqual([]);
  });
});
