import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PROBLEMS, type ProblemBody } from '#shared/contracts/problems.ts';
import type { Route } from '#shared/contracts/route.ts';
import { type RouteName, routes } from '#shared/contracts/routes.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { arbitraryOf } from '#tests/support/arbitrary-of.ts';
import { addressOf, BODIES, type Ids, NAMES } from '#tests/support/every-route.ts';
import { spoiled } from '#tests/support/hostile.ts';
import { makeOneOfEach } from '#tests/support/one-of-each.ts';
import { everythingIn } from '#tests/support/everything-in.ts';
import { thinPlaces } from '#tests/support/thin-places.ts';

const RUNS = { numRuns: 30, seed: 20261202, endOnFailure: true } as const;

/** What is right for these names what is not known before: the new coach, the athlete by name, the reading or the call, a link’s own token. */
const NAMING: ReadonlySet<RouteName> = new Set<RouteName>([
  'handOver',
  'eraseAthlete',
  'handIn',
  'decideReview',
  'sendReplay',
]);

/** Rules between its numbers that no schema says; what is right comes from the known body alone. */
const RULED: ReadonlySet<RouteName> = new Set<RouteName>(['changeProtocol']);

/** Ends what may be filmed or seen for every route that comes after, so it has an athlete of its own. */
const TAKES_AWAY: ReadonlySet<RouteName> = new Set<RouteName>(['withdrawPurposes', 'answerSafety']);

let api: Api;
let shared: Ids;
beforeAll(async () => {
  api = await startApi();
  shared = await makeOneOfEach(api);
});
afterAll(() => api.close());

const all = Object.entries(routes) as [RouteName, Route][];
const address = (name: RouteName, ids: Ids): string =>
  name in NAMES
    ? addressOf(name as keyof typeof NAMES, ids)
    : routes[name].path.replace(':token', 'x'.repeat(43)).replace(':frame', '0');

/** Someone for whom the route does something: staff of each kind that may use it, or nobody. */
const askers = async ({ audience }: Route) =>
  audience === 'staff'
    ? [await api.as(api.world.coach), await api.as(api.world.owner)]
    : [api.nobody];

/** A refusal in the product's words; never an accident. */
const expectAnswer = (status: number, body: Partial<ProblemBody>, said: string): void => {
  expect(status, said).toBeLessThan(500);
  if (status < 400) return;
  expect(body.code, said).toSatisfy((code: string) => code in PROBLEMS && code !== 'unexpected');
  expect(body.title, said).toMatch(/\w/);
  for (const { message } of body.faults ?? []) expect(message, said).toMatch(/^\S.*[.?]$/s);
};

const withBody = all.filter(([, { body, multipart }]) => body && !multipart);

describe('what is made up', () => {
  it.each(withBody)('for %s varies in every part, and some of it is right', (name, { body }) => {
    if (!body) throw new Error('a body was expected');
    const made = fc.sample(arbitraryOf(body), { numRuns: 400, seed: RUNS.seed });
    expect(thinPlaces(body, made)).toEqual([]);
    const right = (input: unknown) => body.safeParse(input).success;
    expect(RULED.has(name) ? right(BODIES[name]) : made.some(right)).toBe(true);
  });
});

describe('whatever is sent', () => {
  it.each(withBody)('to %s is taken whole or refused whole', async (name, route) => {
    if (!route.body) throw new Error('a body was expected');
    const inputs = arbitraryOf(route.body);
    const known = BODIES[name];
    const body = fc.oneof(
      inputs,
      spoiled(inputs),
      ...(known ? [spoiled(fc.constant(known))] : []),
      fc.jsonValue(),
    );
    const agents = await askers(route);
    const to = address(name, TAKES_AWAY.has(name) ? await makeOneOfEach(api) : shared);
    let taken = 0;
    const property = fc.asyncProperty(body, fc.nat(agents.length - 1), async (input, who) => {
      const before = await everythingIn(api);
      const agent = agents[who] ?? api.nobody;
      const answer = await agent[route.method](to)
        .set('Content-Type', 'application/json')
        .send(JSON.stringify(input));
      const said = `${answer.status} ${answer.text.slice(0, 400)}`;
      expectAnswer(answer.status, answer.body as ProblemBody, said);
      if (answer.status >= 400) expect(await everythingIn(api), said).toEqual(before);
      else taken += 1;
    });
    await fc.assert(property, {
      ...RUNS,
      examples: known ? agents.map((_, who): [unknown, number] => [known, who]) : [],
    });
    if (known && !NAMING.has(name)) expect(taken, 'what is right is taken').toBeGreaterThan(0);
  });

  const withQuery = all.filter(([, { query }]) => query);
  it.each(withQuery)('in the address of %s is understood or refused', async (name, route) => {
    if (!route.query) throw new Error('a query was expected');
    const inputs = arbitraryOf(route.query);
    const [agent = api.nobody] = await askers(route);
    const to = address(name, shared);
    const property = fc.asyncProperty(fc.oneof(inputs, spoiled(inputs)), async (input) => {
      const pairs = Object.entries(input ?? {}).map(([key, value]) => [
        key,
        (typeof value === 'object' ? JSON.stringify(value) : String(value)).slice(0, 2000),
      ]);
      const answer = await agent[route.method](`${to}?${new URLSearchParams(pairs).toString()}`);
      const said = `${answer.status} ${JSON.stringify(pairs)}`;
      expectAnswer(answer.status, answer.body as ProblemBody, said);
    });
    await fc.assert(property, RUNS);
  });
});
