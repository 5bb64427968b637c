import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ProblemBody } from '#shared/contracts/problems.ts';
import { type RouteName, routes } from '#shared/contracts/routes.ts';
import type { Route } from '#shared/contracts/route.ts';
import { product } from '#server/db/in-practice.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { makeUser } from '#server/features/accounts/user.factory.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { addressOf, BODIES, type Ids, LINK_BODIES, NAMES } from '#tests/support/every-route.ts';
import { makeOneOfEach } from '#tests/support/one-of-each.ts';
import { type Access, ACCESS } from '#tests/support/route-access.ts';

/** Everybody who may knock. `stranger` is a supervisor of the practice without the athlete's coach. */
const KNOCKERS = [
  'owner',
  'supervisor',
  'coach',
  'stranger',
  'otherCoach',
  'foreignOwner',
  'foreignCoach',
  'nobody',
] as const;
type Knocker = (typeof KNOCKERS)[number];

/** `in`: let in, whatever the route then says of what was sent. */
type Answer = 'in' | 401 | 403 | 404;

const UNSEEN = {
  stranger: 404,
  otherCoach: 404,
  foreignOwner: 404,
  foreignCoach: 404,
  nobody: 401,
} as const;
const SIGNED_IN = Object.fromEntries(
  KNOCKERS.map((who) => [who, who === 'nobody' ? 401 : 'in']),
) as Record<Knocker, Answer>;

/** The exact answer to each of them. Foreign staff are staff of their own practice, and get its things alone. */
const EXPECTED: Record<Exclude<Access, 'link'>, Record<Knocker, Answer>> = {
  anyone: { ...SIGNED_IN, nobody: 'in' },
  self: SIGNED_IN,
  practice: SIGNED_IN,
  owner: {
    ...SIGNED_IN,
    supervisor: 403,
    coach: 403,
    stranger: 403,
    otherCoach: 403,
    foreignCoach: 403,
  },
  coaching: { ...SIGNED_IN, supervisor: 403, stranger: 403 },
  see: { owner: 'in', supervisor: 'in', coach: 'in', ...UNSEEN },
  work: { owner: 'in', supervisor: 403, coach: 'in', ...UNSEEN },
  'own-words': { owner: 403, supervisor: 403, coach: 'in', ...UNSEEN },
  'see-owner-acts': { owner: 'in', supervisor: 403, coach: 403, ...UNSEEN },
  'see-reviewers-act': { owner: 'in', supervisor: 'in', coach: 403, ...UNSEEN },
  'own-marking': { owner: 403, supervisor: 403, coach: 'in', ...UNSEEN },
};

/** A practice's things that are named in the address, asked for from another practice. */
const NOT_THERE: Partial<Record<RouteName, Answer>> = {
  deleteSetUp: 404,
  withdrawInvitation: 404,
  changePerson: 404,
  deactivatePerson: 404,
  reactivatePerson: 404,
  resetCodes: 404,
  handOver: 404,
  eraseAthlete: 404,
  exportAthlete: 404,
};

/** Of these the made things have none: a scan of the consent, a box around a head. */
const LACKING: ReadonlySet<RouteName> = new Set<RouteName>(['consentScan', 'lookedAtHead']);

let api: Api;
let ids: Ids;
let stranger: User;
beforeAll(async () => {
  api = await startApi();
  ids = await makeOneOfEach(api);
  stranger = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    Promise.resolve(makeUser(em, { role: 'supervisor' })),
  );
});
afterAll(() => api.close());

const sessions = new Map<Knocker, Awaited<ReturnType<Api['as']>>>();

/** With a session of its own where the route may end it. */
const agentOf = async (who: Knocker, access: Access) => {
  if (who === 'nobody') return api.nobody;
  const user = who === 'stranger' ? stranger : api.world[who];
  if (access === 'self' || access === 'anyone') return api.as(user);
  const agent = sessions.get(who) ?? (await api.as(user));
  sessions.set(who, agent);
  return agent;
};

const names = (Object.keys(routes) as RouteName[]).filter((name) => ACCESS[name] !== 'link');
const streams = (name: RouteName) => (routes[name] as Route).answer.kind === 'event-stream';

describe.each(names)('%s', (name) => {
  const access = ACCESS[name] as Exclude<Access, 'link'>;
  it.each(KNOCKERS)('answers exactly so: %s', async (who) => {
    const foreign = who.startsWith('foreign');
    const expected = (foreign ? NOT_THERE[name] : undefined) ?? EXPECTED[access][who];
    // what is let in may change or end things: it gets some of its own
    const mine = expected === 'in' && name in NAMES ? await makeOneOfEach(api) : ids;
    const { method, path } = routes[name];
    const address = name in NAMES ? addressOf(name as keyof typeof NAMES, mine) : path;
    const agent = await agentOf(who, access);
    const request = agent[method](address);
    if (streams(name) && expected === 'in') {
      const status = await new Promise((resolve, reject) => {
        request
          .buffer(false)
          .parse((res, _done) => {
            resolve(res.statusCode);
            (res as unknown as { destroy: () => void }).destroy();
          })
          .end((error: unknown) => {
            reject(error instanceof Error ? error : new Error('it ended'));
          });
      });
      expect(status).toBe(200);
      return;
    }
    const named =
      name === 'makeReplay' ? { visitId: mine.visit, repId: mine.rep, side: 'right' } : {};
    const answer = await request.send(method === 'get' ? undefined : { ...BODIES[name], ...named });
    const { code } = answer.body as Partial<ProblemBody>;
    const said = `${answer.status} ${code ?? ''}`;
    if (expected === 'in') {
      // the made clip and the made report have no files
      if (code !== 'clip-missing-in-storage' && code !== 'report-missing-in-storage')
        expect(answer.status, said).toBeLessThan(500);
      expect([401, 403], said).not.toContain(answer.status);
      if (!LACKING.has(name)) expect(answer.status, said).not.toBe(404);
    } else expect(answer.status, said).toBe(expected);
  });
});

describe('without a token that opens something', () => {
  const links = (Object.keys(routes) as RouteName[]).filter((name) => ACCESS[name] === 'link');
  it.each(links)('%s is not there, for staff neither', async (name) => {
    const { method, path } = routes[name];
    for (const who of KNOCKERS) {
      const agent = await agentOf(who, 'link');
      const answer = await agent[method](path.replace(':token', 'a'.repeat(43))).send(
        method === 'get' ? undefined : LINK_BODIES[name],
      );
      expect(answer.status, who).toBe(404);
      expect((answer.body as ProblemBody).code, who).toBe('not-found');
    }
  });
});
