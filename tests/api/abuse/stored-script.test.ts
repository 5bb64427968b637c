import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { type RouteName, routes } from '#shared/contracts/routes.ts';
import type { Route } from '#shared/contracts/route.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { addressOf, BODIES, type Ids, NAMES } from '#tests/support/every-route.ts';
import { jsonSchemaOf } from '#tests/support/json-schema-of.ts';
import { makeOneOfEach } from '#tests/support/one-of-each.ts';
import { ACCESS } from '#tests/support/route-access.ts';

const SCRIPT = '<script>alert(1)</script>"\'><img src=x onerror=alert(1)>';

/** Texts that are no words of a person: they are compared or counted, and kept nowhere. */
const NOT_WORDS = /^(email|contactEmail|password|token|code|passPhrase)$/;

interface Schema {
  readonly type?: string;
  readonly format?: string;
  readonly enum?: unknown;
  readonly const?: unknown;
  readonly maxLength?: number;
  readonly anyOf?: readonly Schema[];
  readonly properties?: Readonly<Record<string, Schema>>;
}

const isText = (schema: Schema): boolean =>
  schema.anyOf?.some(isText) ??
  (schema.type === 'string' &&
    schema.format === undefined &&
    schema.enum === undefined &&
    schema.const === undefined &&
    (schema.maxLength ?? Infinity) >= SCRIPT.length);

/** The fields of a body that take words, and of an object inside of it. */
const textsOf = ({ properties = {} }: Schema): Record<string, unknown> =>
  Object.fromEntries(
    Object.entries(properties).flatMap(([name, part]): [string, unknown][] => {
      if (NOT_WORDS.test(name)) return [];
      if (isText(part)) return [[name, SCRIPT]];
      const inner = part.properties ? textsOf(part) : {};
      return Object.keys(inner).length > 0 ? [[name, inner]] : [];
    }),
  );

let api: Api;
let ids: Ids;
let owner: Awaited<ReturnType<Api['as']>>;
let coach: Awaited<ReturnType<Api['as']>>;
const taken: string[] = [];

beforeAll(async () => {
  api = await startApi();
  ids = await makeOneOfEach(api);
  owner = await api.as(api.world.owner);
  coach = await api.as(api.world.coach);
  const bodies = (Object.entries(routes) as [RouteName, Route][]).filter(
    ([name, { body, multipart, audience }]) =>
      body && !multipart && audience === 'staff' && name !== 'eraseAthlete',
  );
  for (const [name, route] of bodies) {
    const texts = textsOf(jsonSchemaOf(route.body ?? z.object({})) as Schema);
    if (Object.keys(texts).length === 0) continue;
    const address = name in NAMES ? addressOf(name as keyof typeof NAMES, ids) : route.path;
    const agent = ACCESS[name] === 'owner' ? owner : coach;
    const answer = await agent[route.method](address).send({ ...BODIES[name], ...texts });
    if (answer.status < 300) taken.push(`${name} ${Object.keys(texts).join(',')}`);
    else expect(answer.status, `${name} ${answer.text}`).toBeLessThan(500);
  }
});
afterAll(() => api.close());

it('a script is taken as the words that it is, in every room', () => {
  expect(taken).toEqual(
    expect.arrayContaining([
      expect.stringMatching(/^addAthlete .*givenName,familyName/),
      expect.stringMatching(/^editAthlete /),
      expect.stringMatching(/^editVisit .*note/),
      expect.stringMatching(/^changeName name/),
      expect.stringMatching(/^changePractice name/),
      expect.stringMatching(/^addSetUp name/),
      expect.stringMatching(/^recordCall handsFelt/),
      expect.stringMatching(/^addComment body/),
      expect.stringMatching(/^editRep excludedNote/),
      expect.stringMatching(/^changeConsentWording texts/),
      expect.stringMatching(/^openUpload name/),
    ]),
  );
});

/** What a browser would run, were it asked for the address itself. */
const RUN = /html|xml|svg|javascript/;

describe('an answer that holds it', () => {
  const asked = (Object.entries(routes) as [RouteName, Route][]).filter(
    ([, { method, answer, audience }]) =>
      method === 'get' && answer.kind !== 'event-stream' && audience === 'staff',
  );

  it('is data or a file to be saved, whatever the browser would like', async () => {
    const holding: string[] = [];
    for (const [name, route] of asked) {
      const address = name in NAMES ? addressOf(name as keyof typeof NAMES, ids) : route.path;
      const answer = await owner.get(address).set('Accept', 'text/html').buffer(true);
      const type = String(answer.headers['content-type']);
      expect(type, name).not.toMatch(RUN);
      expect(answer.headers['x-content-type-options'], name).toBe('nosniff');
      const said = answer.text ?? '';
      if (!said.includes('<script>alert(1)</script>')) continue;
      holding.push(name);
      if (!type.startsWith('application/json'))
        expect(String(answer.headers['content-disposition']), name).toMatch(
          /^attachment; filename=/,
        );
    }
    expect(holding).toEqual(
      expect.arrayContaining(['me', 'practice', 'listAthletes', 'listSetUps', 'visit', 'people']),
    );
    expect(holding.length).toBeGreaterThan(10);
  });

  it('never stands in an error', async () => {
    const tries = [
      owner.get(`/api/${encodeURIComponent(SCRIPT)}`),
      owner.get(`/api/athletes?sort=${encodeURIComponent(SCRIPT)}`),
      owner.get(`/api/clips/${encodeURIComponent(SCRIPT)}`),
      owner.post('/api/athletes').send({ [SCRIPT]: 1, givenName: 7, birthDate: SCRIPT }),
      owner.post('/api/athletes').type('json').send(`{${SCRIPT}`),
      api.nobody.get(`/api/r/${encodeURIComponent(SCRIPT)}`),
    ];
    for (const request of tries) {
      const { headers, status, text } = await request;
      expect(status).toBeGreaterThanOrEqual(400);
      expect(headers['content-type']).toContain('application/problem+json');
      expect(text).not.toContain('<script>');
    }
  });
});
