import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { query } from '#tests/support/whole-database.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

describe('files that carry data away', () => {
  it('are so many an hour for one person, and the next is refused and not written down', async () => {
    const owner = await api.as(api.world.owner);
    for (let nth = 1; nth <= 30; nth += 1) await owner.get('/api/practice/audit.csv').expect(200);
    const { body, headers } = await owner.get('/api/practice/audit.csv').expect(429);
    expect(body).toMatchObject({ code: 'too-many-tries' });
    expect(Number(headers['retry-after'])).toBeGreaterThan(0);
    const [row] = await query(
      api,
      `select count(*)::int as files from audit_entry where action = 'audit.export'`,
    );
    expect(row).toEqual({ files: 30 });
  });

  it('of one athlete are counted too, and another person’s are not touched', async () => {
    const coach = await api.as(api.world.coach);
    const owner = await api.as(api.world.owner);
    const path = `/api/visits/${crypto.randomUUID()}/frames.csv`;
    for (let nth = 1; nth <= 200; nth += 1) await coach.get(path).expect(404);
    await coach.get(path).expect(429);
    await owner.get(path).expect(404);
  });
});
