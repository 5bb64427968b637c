import * as bcrypt from 'bcryptjs';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { hashPassword } from '#server/features/accounts/password.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { query } from '#tests/support/whole-database.ts';

// every password is wrong, and that costs nothing
vi.mock('bcryptjs', async (actual) => ({
  ...(await actual<typeof bcrypt>()),
  compare: vi.fn(() => Promise.resolve(false)),
}));
const compare = vi.mocked(bcrypt.compare);

let api: Api;
beforeAll(async () => {
  api = await startApi({ TRUST_PROXY: '1' });
});
afterAll(() => api.close());
beforeEach(() => {
  compare.mockClear();
});

const signIn = (email: string, from = '192.0.2.1', of = api) =>
  of.nobody.post('/api/sign-in').set('X-Forwarded-For', from).send({ email, password: 'wrong' });

describe('the work of a refused sign-in', () => {
  it('is one comparison, whether the account exists, is closed or does not', async () => {
    const { coach, otherCoach } = api.world;
    await query(api, 'update account set disabled_at = now() where id = $1', [otherCoach.id]);
    for (const email of [coach.email, otherCoach.email, 'nobody@test.example']) {
      compare.mockClear();
      await signIn(email).expect(401);
      expect(compare, email).toHaveBeenCalledTimes(1);
    }
  });

  it('is as dear for an unknown address as for a password that the product hashed', async () => {
    await signIn('nobody@test.example').expect(401);
    const costOf = (hash: string | undefined) => /^\$2[aby]\$(\d\d)\$.{53}$/.exec(hash ?? '')?.[1];
    const [, against] = compare.mock.calls[0] ?? [];
    expect(costOf(against)).toBe('12');
    expect(costOf(await hashPassword('reeds at low water'))).toBe('12');
  });
});

let guesses = 0;

/** How many go through until it is refused for their number; every try names another account. */
const tries = async (from: (n: number) => string, of = api): Promise<number> => {
  for (let n = 0; n < 70; n += 1) {
    const { status } = await signIn(`guess-${(guesses += 1)}@test.example`, from(n), of);
    if (status === 429) return n;
    expect(status).toBe(401);
  }
  return Infinity;
};

describe('sign-ins that fail', () => {
  it('are fifty from one address, whichever accounts they name, and none more', async () => {
    expect(await tries(() => '203.0.113.5')).toBe(50);
    await signIn('another@test.example', '203.0.113.6').expect(401);
  });

  it('are counted together over the addresses of one subscriber', async () => {
    expect(await tries((n) => `2001:db8:0:${(n % 200).toString(16)}::${n + 1}`)).toBe(50);
    await signIn('another@test.example', '2001:db8:1::1').expect(401);
  });

  it('are not hidden by an address that the sender made up', async () => {
    const direct = await startApi();
    try {
      expect(await tries((n) => `198.51.100.${n}`, direct)).toBe(50);
    } finally {
      await direct.close();
    }
  });
});
