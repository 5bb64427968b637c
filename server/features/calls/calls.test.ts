import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { currentProtocol } from '#server/features/protocol/current-protocol.ts';
import { product } from '../../db/in-practice.ts';
import { Reading } from '../readings/reading.entity.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

const CALL = {
  seen: 'early',
  substitutions: ['side-bend-to-support', 'pelvis-hikes', 'pelvis-hikes'],
  confidence: 'fairly-sure',
  handsFelt: 'The hip let go late.',
};

const settingOf = async (em: EntityManager, side: 'left' | 'right'): Promise<SideSetting> => {
  const visit = api.world.visit.id;
  return (
    (await em.findOne(SideSetting, { visit, side })) ?? em.create(SideSetting, { visit, side })
  );
};

describe('a call by eye', () => {
  const pathOf = (side: string) => `/api/visits/${api.world.visit.id}/sides/${side}/call`;

  it('is kept as it was given; the next stands beside it', async () => {
    const coach = await api.as(api.world.coach);
    const first = await coach.post(pathOf('right')).send(CALL).expect(201);
    expect(first.body).toMatchObject({
      visitId: api.world.visit.id,
      side: 'right',
      seen: 'early',
      substitutions: ['side-bend-to-support', 'pelvis-hikes'],
      by: { id: api.world.coach.id },
      beforeFigures: true,
    });
    await api.ground.inPractice(product(api.world.practiceId), async ({ em }) => {
      (await settingOf(em, 'right')).figuresShownAt = new Date();
    });
    await coach.post(pathOf('right')).send({ seen: 'unsure', confidence: 'guess' }).expect(201);
    const { body } = await coach.get(pathOf('right')).expect(200);
    expect(body.items).toMatchObject([
      { seen: 'early', beforeFigures: true },
      { seen: 'unsure', beforeFigures: false, substitutions: [], handsFelt: '' },
    ]);
    expect((await coach.get(pathOf('left'))).body.items).toEqual([]);
  });

  it('is the coach’s: a supervisor reads it', async () => {
    const supervisor = await api.as(api.world.supervisor);
    await supervisor.get(pathOf('right')).expect(200);
    await supervisor.post(pathOf('right')).send(CALL).expect(403);
    await (await api.as(api.world.coach)).get(pathOf('middle')).expect(404);
  });

  it('lets the reading of its side be seen in the history, and of no other', async () => {
    const { visit, coach, athlete, practiceId } = api.world;
    await api.ground.inPractice(product(practiceId), async ({ em }) => {
      for (const side of ['left', 'right'] as const) {
        const reading = em.create(Reading, {
          visit,
          side,
          engine: 1,
          inputHash: 'a1',
          seed: 1,
          inputs: {} as never,
          result: {} as never,
          code: 'early-turn-out',
          before60: true,
          change: 8,
          u: 1.5,
          provisional: false,
          assumption: false,
          protocol: await currentProtocol(em),
          by: coach,
        });
        const setting = await settingOf(em, side);
        em.assign(setting, { reading });
      }
    });
    const agent = await api.as(coach);
    const { body } = await agent.get(`/api/athletes/${athlete.id}/visits`).expect(200);
    expect(body.items[0].sides).toEqual([
      {
        side: 'right',
        call: 'early',
        review: 'none',
        reading: {
          code: 'early-turn-out',
          label: 'Turns out early, before 60°',
          gates: { from: 60, to: 90 },
          change: 8,
          plusMinus: 2.94,
          u: 1.5,
          provisional: false,
        },
      },
    ]);
  });
});
