import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { deriveReading } from '#shared/reading/derive.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { type GoldenClip, goldenClip } from '#tests/support/golden.ts';
import { markedTrial } from '#tests/support/marked-trial.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { deriveReadingJob } from './jobs/derive-reading.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

const marked = (golden: GoldenClip) => markedTrial(api, coach, golden);

const seen = (what: string) => ({ seen: what, confidence: 'sure' });

describe('a reading', () => {
  it('is hidden until somebody has said what they saw', async () => {
    const { side, visit } = await marked(goldenClip('g06_flat'));
    const before = await coach.get(`${side}/reading`);
    expect(before.status).toBe(409);
    expect(before.body.code).toBe('call-first');
    expect(JSON.stringify(before.body)).not.toMatch(/"change"|"pEarly"/);
    await coach.post(`${side}/call`).send(seen('still')).expect(201);
    const after = await coach.get(`${side}/reading`).expect(200);
    expect(after.body.calls).toMatchObject([{ seen: 'still', beforeFigures: true }]);
    await coach.post(`${side}/call`).send(seen('early')).expect(201);
    const late = await coach.get(`${side}/call`);
    expect(late.body.items).toMatchObject([
      { seen: 'still', beforeFigures: true },
      { seen: 'early', beforeFigures: false },
    ]);
    expect(visit.id).toBeTruthy();
  });

  it.each([
    ['g01_early_big_thigh', 'early-turn-out'],
    ['g04_expected_big', 'expected-turn-in'],
    ['g09_range_not_reached', 'lift-stops-short'],
  ])('of %s is derived from the stored marks: %s', async (name, code) => {
    const golden = goldenClip(name);
    const { side } = await marked(golden);
    await coach.post(`${side}/call`).send(seen('unsure')).expect(201);
    const { body } = await coach.get(`${side}/reading`).expect(200);
    expect(body.reading.code).toBe(code);
    // the same code on the same marks, without the phases that the trial file names
    const direct = deriveReading({
      engine: CURRENT_ENGINE,
      supportSide: golden.trial.supportSide,
      set: null,
      thighTurnsLittle: false,
      markError: ASSUMED_MARK_ERROR,
      ownSystematic: null,
      rules: STANDARD_RULES,
      reps: golden.trial.reps.map((rep) => ({
        ...rep,
        labels: null,
        frames: rep.frames.map((frame) => ({
          ...frame,
          time: milliseconds((frame.frame * 1000) / 60),
        })),
      })),
    });
    expect(direct.code).toBe(code);
    if (direct.figures)
      // other rep ids give another seed: the draws differ, the fit does not
      expect(body.reading.change).toBeCloseTo(direct.figures.d, 0);
    else expect(body.reading.change).toBeNull();
  });

  it('is made once from the same inputs, anew from others, and both are kept', async () => {
    const { side, clip } = await marked(goldenClip('g01_early_big_thigh'));
    await coach.post(`${side}/call`).send(seen('early')).expect(201);
    const first = await coach.get(`${side}/reading`).expect(200);
    const again = await coach.get(`${side}/reading`).expect(200);
    expect(again.body.reading).toEqual(first.body.reading);
    // every call of this coach in this file that could agree did
    expect(first.body.agreement.of).toBeGreaterThan(0);
    expect(first.body.agreement.agreed).toBe(first.body.agreement.of);
    const reps = await coach.get(`/api/clips/${clip.id}/reps`);
    const [rep] = reps.body.items;
    await coach
      .patch(`/api/reps/${rep.id}`)
      .send({ version: rep.version, excluded: 'hopped' })
      .expect(200);
    const second = await coach.get(`${side}/reading`).expect(200);
    expect(second.body.reading.id).not.toBe(first.body.reading.id);
    expect(second.body.history.map((row: { id: string }) => row.id)).toEqual([
      second.body.reading.id,
      first.body.reading.id,
    ]);
    expect(second.body.reading.reps[0].excluded).toBe('hopped');
    await coach
      .patch(`/api/reps/${rep.id}`)
      .send({ version: rep.version + 1, excluded: null })
      .expect(200);
    const back = await coach.get(`${side}/reading`).expect(200);
    expect(back.body.reading.id).toBe(first.body.reading.id);
  });

  it('warns of what the coach draws on the picture: floor line, plumb line and a smeared dot', async () => {
    const { side, clip } = await marked(goldenClip('g01_early_big_thigh'));
    await coach.post(`${side}/call`).send(seen('early')).expect(201);
    const codesNow = async () => {
      const { body } = await coach.get(`${side}/reading`).expect(200);
      return body.reading.result.warnings.map(
        ({ warning }: { warning: { code: string } }) => warning.code,
      );
    };
    const before = await codesNow();
    const stored = await coach.get(`/api/clips/${clip.id}`).expect(200);
    const geometry = {
      ...stored.body.geometry,
      plumb: { top: { u: 500, v: 100 }, bottom: { u: 560, v: 1100 } },
      floorLine: { a: { u: 400, v: 1500 }, b: { u: 640, v: 1440 } },
      shutter: { from: 'smear', a: { u: 10, v: 20 }, b: { u: 20, v: 20 } },
    };
    await coach
      .patch(`/api/clips/${clip.id}`)
      .send({ version: stored.body.version, geometry })
      .expect(200);
    const after = await codesNow();
    for (const code of ['camera-off-front', 'plumb-off', 'smear']) {
      expect(before).not.toContain(code);
      expect(after).toContain(code);
    }
  });

  it('says nothing where nothing is marked', async () => {
    const { coach: user, athlete } = api.world;
    const visit = await api.ground.inPractice(user, ({ em }) =>
      Promise.resolve(makeVisit(em, { athlete, coach: user })),
    );
    const side = `/api/visits/${visit.id}/sides/left`;
    await coach.post(`${side}/call`).send(seen('on-time')).expect(201);
    const { body } = await coach.get(`${side}/reading`).expect(200);
    expect(body).toMatchObject({ reading: null, history: [], compared: null, otherSide: null });
  });

  it('keeps the assumption where it was turned on, and only for who may mark', async () => {
    const { side } = await marked(goldenClip('g06_flat'));
    await coach.post(`${side}/call`).send(seen('still')).expect(201);
    const on = await coach.put(`${side}/assumption`).send({ on: true }).expect(200);
    expect(on.body.assumption).toBe(true);
    const supervisor = await api.as(api.world.supervisor);
    await supervisor.put(`${side}/assumption`).send({ on: false }).expect(403);
    const { body } = await supervisor.get(`${side}/reading`).expect(200);
    expect(body.assumption).toBe(true);
  });

  it('does not exist for another caseload or practice', async () => {
    const { side } = await marked(goldenClip('g06_flat'));
    await coach.post(`${side}/call`).send(seen('still')).expect(201);
    for (const user of [api.world.otherCoach, api.world.foreignOwner]) {
      const stranger = await api.as(user);
      await stranger.get(`${side}/reading`).expect(404);
      await stranger.put(`${side}/assumption`).send({ on: true }).expect(404);
    }
    await api.nobody.get(`${side}/reading`).expect(401);
  });
});

describe('the lists', () => {
  it('show a side’s reading as its marks stand, without anybody opening it', async () => {
    const { side, clip, visit } = await marked(goldenClip('g01_early_big_thigh'));
    await coach.post(`${side}/call`).send(seen('early')).expect(201);
    const waiting = () =>
      api.ground.inPractice(api.world.coach, ({ em }) =>
        em.execute<{ payload: { visitId: string; side: string } }[]>(
          `select payload from job_outbox where queue = 'derive-reading' and payload ->> 'visitId' = ?`,
          [visit.id],
        ),
      );
    const [job] = await waiting();
    if (!job) throw new Error('No job was asked for.');
    const derive = () =>
      deriveReadingJob.run({
        ground: api.ground,
        practiceId: api.world.practiceId,
        payload: job.payload,
        signal: new AbortController().signal,
      });
    await derive();
    const { body } = await coach.get(`/api/athletes/${api.world.athlete.id}/visits`).expect(200);
    const row = body.items.find(({ id }: { id: string }) => id === visit.id);
    expect(row.sides).toMatchObject([{ call: 'early', reading: { code: 'early-turn-out' } }]);
    // three more changes ask for one more job, not for three
    const reps = await coach.get(`/api/clips/${clip.id}/reps`);
    for (const rep of reps.body.items)
      await coach
        .patch(`/api/reps/${rep.id}`)
        .send({ version: rep.version, excludedNote: 'Looked at.' })
        .expect(200);
    const sideName = side.endsWith('left') ? 'left' : 'right';
    expect((await waiting()).filter(({ payload }) => payload.side === sideName)).toHaveLength(2);
  });
});
