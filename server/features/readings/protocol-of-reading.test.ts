import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { type Protocol, STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial, moveFirstMark } from '#tests/support/marked-trial.ts';

type Agent = Awaited<ReturnType<Api['as']>>;

let api: Api;
let coach: Agent;
let owner: Agent;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  owner = await api.as(api.world.owner);
});
afterAll(() => api.close());

const LOWER: Partial<Protocol> = {
  gateFrom: degrees(50),
  gateTo: degrees(80),
  liftShort: degrees(75),
};

const adopt = (after: number, values: Partial<Protocol>) =>
  owner
    .post('/api/practice/protocol')
    .send({ after, values: { ...STANDARD_PROTOCOL, ...values }, note: 'For the trial.' })
    .expect(201);

const pageOf = async (side: string) => (await coach.get(`${side}/reading`).expect(200)).body;

describe('a reading and the protocol', () => {
  it('keeps the version it was made with until asked anew; new marks take the new version', async () => {
    const golden = goldenClip('g01_early_big_thigh');
    const { side, clip, visit } = await markedTrial(api, coach, golden);
    await coach.post(`${side}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
    const first = await pageOf(side);
    expect(first.reading).toMatchObject({
      protocol: { version: 1 },
      result: { rules: { gateFrom: 60, gateTo: 90 } },
    });
    expect(first.newerProtocol).toBeNull();

    // what only new work starts from is no reason to read again
    await adopt(1, { reps: 4 });
    expect(await pageOf(side)).toMatchObject({
      reading: { id: first.reading.id, protocol: { version: 1 } },
      newerProtocol: null,
    });

    await adopt(2, LOWER);
    const kept = await pageOf(side);
    expect(kept.reading).toEqual(first.reading);
    expect(kept.newerProtocol).toMatchObject({ version: 3 });
    const renewed = (await coach.post(`${side}/reading`).expect(200)).body;
    expect(renewed.reading).toMatchObject({
      protocol: { version: 3 },
      result: { rules: { gateFrom: 50, gateTo: 80 } },
    });
    expect(renewed.reading.result.warnings).toContainEqual(
      expect.objectContaining({ warning: { code: 'gates-not-studied', from: 50, to: 80 } }),
    );
    expect(renewed.newerProtocol).toBeNull();
    expect(
      renewed.history.map(({ protocol }: { protocol: { version: number } }) => protocol.version),
    ).toEqual([3, 1]);

    // marks that come later are read by the version of their day
    await adopt(3, {});
    await moveFirstMark(coach, clip, golden);
    expect((await pageOf(side)).reading.protocol.version).toBe(4);

    const visits = (await coach.get(`/api/athletes/${visit.athlete.id}/visits`)).body;
    const sides = visits.items.flatMap(({ sides: all }: { sides: object[] }) => all);
    expect(sides).toContainEqual(
      expect.objectContaining({
        reading: expect.objectContaining({ gates: { from: 60, to: 90 } }),
      }),
    );
  });

  it('takes the assumption of the protocol for sides that begin with it', async () => {
    const before = (await owner.get('/api/practice/protocol')).body.current.version;
    await adopt(before, { thighTurnsLittle: true });
    const { side } = await markedTrial(api, coach, goldenClip('g06_flat'));
    await coach.post(`${side}/call`).send({ seen: 'still', confidence: 'sure' }).expect(201);
    expect((await pageOf(side)).assumption).toBe(true);
  });
});
