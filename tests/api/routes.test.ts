import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Route } from '#shared/contracts/route.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { makeApp } from '#server/http/app.ts';
import { features } from '#server/main/features.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import {
  addressOf,
  BODIES,
  type Ids,
  NAMES,
  type RouteNameWithId,
  SILENT,
} from '#tests/support/every-route.ts';
import { makeOneOfEach } from '#tests/support/one-of-each.ts';

let api: Api;
let ids: Ids;
beforeAll(async () => {
  api = await startApi();
  ids = await makeOneOfEach(api);
});
afterAll(() => api.close());

const withId = Object.keys(NAMES) as RouteNameWithId[];

/** Of the owner alone: who may not is told so, whatever it names. */
const OWNERS: readonly string[] = [
  'withdrawInvitation',
  'changePerson',
  'deactivatePerson',
  'reactivatePerson',
  'resetCodes',
  'handOver',
];

const knock = async (name: RouteNameWithId, user: User | null) => {
  const { method } = routes[name];
  const agent = user ? await api.as(user) : api.nobody;
  return agent[method](addressOf(name, ids)).send(
    method === 'get' ? undefined : (BODIES[name] ?? {}),
  );
};

describe('every route', () => {
  it('of the contracts is served, and nothing else', () => {
    const served: Route[] = [];
    makeApp(api.ground, { features, onRoute: (route) => served.push(route) });
    const names = served.map(({ method, path }) => `${method} ${path}`).sort();
    const promised = Object.values(routes)
      .map(({ method, path }) => `${method} ${path}`)
      .sort();
    expect(names).toEqual(promised);
  });

  it.each(withId)('%s is not there for another practice', async (name) => {
    for (const user of [api.world.foreignCoach, api.world.foreignOwner]) {
      const answer = await knock(name, user);
      expect(answer.status).toBe(SILENT.has(name) ? 204 : 404);
      if (!SILENT.has(name)) expect(answer.body.code).toBe('not-found');
    }
  });

  const ofCaseload = withId.filter(
    (name) => !['endSession', 'deleteSetUp', ...OWNERS].includes(name),
  );
  it.each(ofCaseload)('%s is not there for a coach whose athlete it is not', async (name) => {
    const answer = await knock(name, api.world.otherCoach);
    expect(answer.status).toBe(404);
  });

  it.each(withId)('%s asks nobody in without a session', async (name) => {
    expect((await knock(name, null)).status).toBe(401);
  });
});
