import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { daysLater, today } from '../athletes/days.ts';

const PATH = '/api/practice/consent-wording';
let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const read = async () => (await (await api.as(api.world.coach)).get(PATH).expect(200)).body;
const change = async (by: 'owner' | 'coach' | 'supervisor', after: number) => {
  const { current } = await read();
  const texts = { ...current.texts, intro: `We film you, version ${after + 1}.` };
  return (await api.as(api.world[by])).post(PATH).send({ after, texts, note: 'Plainer words.' });
};
const consent = async (wordingId: string | null) =>
  (await api.as(api.world.coach)).post(`/api/athletes/${api.world.athlete.id}/consents`).send({
    givenBy: 'athlete',
    purposes: ['assessment'],
    validUntil: daysLater(today(), 90),
    wordingId,
  });

describe('the consent wording', () => {
  it('comes with a practice, and everybody in it reads it', async () => {
    const { current, history } = await read();
    expect(current).toMatchObject({ version: 1, by: null, consents: 0 });
    expect(Object.values(current.texts).every((text) => String(text).length > 20)).toBe(true);
    expect(history).toHaveLength(1);
    await api.nobody.get(PATH).expect(401);
  });

  it('gets a new version from the owner alone, who names the one that was changed', async () => {
    for (const by of ['coach', 'supervisor'] as const)
      expect((await change(by, 1)).body.code).toBe('not-allowed');
    const made = await change('owner', 1);
    expect(made.status).toBe(201);
    expect(made.body.current).toMatchObject({ version: 2, note: 'Plainer words.' });
    expect((await change('owner', 1)).body.code).toBe('edited-meanwhile');
    expect((await read()).history.map(({ version }: { version: number }) => version)).toEqual([
      2, 1,
    ]);
    const { body } = await (await api.as(api.world.foreignOwner)).get(PATH).expect(200);
    expect(body.history).toHaveLength(1);
  });

  it('is named by the consent that was given to it; an old one is not taken', async () => {
    const { current, history } = await read();
    const given = await consent(current.id);
    expect(given.status).toBe(201);
    expect(given.body.wording).toMatchObject({ id: current.id, version: current.version });
    expect((await consent(history.at(-1).id)).body.code).toBe('edited-meanwhile');
    expect((await consent(null)).body.wording).toBeNull();
    expect((await read()).current.consents).toBe(1);
  });

  it('is never changed nor deleted, whoever tries', async () => {
    const { practiceId } = api.world;
    for (const sql of [`update consent_wording set note = ''`, 'delete from consent_wording'])
      await expect(
        api.ground.inPractice(product(practiceId), ({ em }) => em.execute(sql)),
      ).rejects.toThrow();
  });
});
