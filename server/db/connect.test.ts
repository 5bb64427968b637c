import { afterAll, beforeAll, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

it('a connection that serves requests compiles no plans and speaks of times in UTC', async () => {
  const [settings] = await api.ground.orm.em
    .fork()
    .execute(`select current_setting('jit') as jit, current_setting('TimeZone') as zone`);
  expect(settings).toEqual({ jit: 'off', zone: 'Etc/UTC' });
});
