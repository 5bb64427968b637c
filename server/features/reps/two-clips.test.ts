import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { RepInput } from '#shared/course/types.ts';
import { madeFront, type MadeMotion, madeSide } from '#shared/evaluate/made-pair.ts';
import { BELT_POINTER_MM, THIGH_POINTER_MM } from '#shared/evaluate/made-rep.ts';
import type { LandmarkId, Mark } from '#shared/landmarks/types.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';
import type { Visit } from '../visits/visit.entity.ts';
import { makeVisit } from '../visits/visit.factory.ts';

let api: Api;
type Agent = Awaited<ReturnType<Api['as']>>;
let coach: Agent;
let visit: Visit;

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const { coach: user, athlete } = api.world;
  visit = await api.ground.inPractice(user, ({ em }) =>
    Promise.resolve(makeVisit(em, { athlete, coach: user })),
  );
  await coach
    .post(`/api/visits/${visit.id}/sides/right/call`)
    .send({ seen: 'early', confidence: 'sure' })
    .expect(201);
});
afterAll(() => api.close());

const MOTION: MadeMotion = {
  side: 'right',
  stillMs: 1200,
  upMs: 1800,
  holdMs: 400,
  highest: 108,
  turnAt: (lift) => Math.max(0, lift - 60) / 3,
};
const STEP = 1000 / 60;
const FRONT = madeFront(MOTION, { startMs: 310, stepMs: STEP, scatterPx: 1, seed: 3 });
const sideOf = (motion: MadeMotion) =>
  madeSide(motion, { startMs: 2475, stepMs: STEP, scatterPx: 1, seed: 4 });

const aClip = (change: Partial<Parameters<typeof makeClip>[1]>): Promise<Clip> =>
  api.ground.inPractice(api.world.coach, ({ em }) =>
    Promise.resolve(
      makeClip(em, {
        visit,
        uploadedBy: api.world.coach,
        geometry: {
          scale: { from: 'typed', mmPerPx: 2 },
          distanceMm: 3000,
          lensHeightMm: 900,
          beltPointerMm: BELT_POINTER_MM,
          thighPointerMm: THIGH_POINTER_MM - 55,
          plumb: null,
          floorLine: null,
          shutter: null,
        },
        ...change,
      }),
    ),
  );
const frontClip = () => aClip({});
const sideClip = () => aClip({ view: 'lifted-side', cameraStood: 'athlete-left', mirrored: true });

/** A rep of a clip, every second frame of the made one marked. */
const addRep = async (clip: Clip, made: RepInput | null, supportSide = 'right') => {
  const { body: rep } = await coach
    .post(`/api/clips/${clip.id}/reps`)
    .send({ supportSide, startFrame: 0, endFrame: 599 })
    .expect(201);
  const commands = (made?.frames ?? [])
    .filter((_, i) => i % 2 === 0)
    .flatMap(({ frame, marks }) =>
      (Object.entries(marks) as [LandmarkId, Mark][]).flatMap(([landmark, mark]) =>
        mark.hidden
          ? []
          : [
              {
                id: randomUUID(),
                frame,
                landmark,
                baseRevision: 0,
                set: { to: 'point', ...mark.point, pictureLongEdge: 1920 },
              },
            ],
      ),
    );
  if (commands.length > 0)
    await coach.post(`/api/reps/${rep.id}/marks`).send({ commands }).expect(200);
  return rep.id as string;
};
const repOf = async (clip: Clip, id: string) => {
  const { body } = await coach.get(`/api/clips/${clip.id}/reps`).expect(200);
  return body.items.find((rep: { id: string }) => rep.id === id);
};
const tie = async (clip: Clip, id: string, liftFrom: string | null, agent: Agent = coach) => {
  const { version } = await repOf(clip, id);
  return agent.patch(`/api/reps/${id}`).send({ version, liftFrom });
};

describe('a front and a side clip of one rep', () => {
  it('are tied, read together, named in the reading, and parted again', async () => {
    const [front, side] = [await frontClip(), await sideClip()];
    const frontRep = await addRep(front, FRONT);
    const sideRep = await addRep(side, sideOf(MOTION));
    const made = await tie(front, frontRep, sideRep);
    expect(made.status).toBe(200);
    expect(made.body).toMatchObject({ liftFrom: sideRep, tieFault: null });

    const read = async () => {
      const { body } = await coach.get(`/api/visits/${visit.id}/sides/right/reading`).expect(200);
      return body.reading;
    };
    const tied = await read();
    const own = (reading: { result: { reps: { id: string }[] } }) =>
      reading.result.reps.find(({ id }) => id === frontRep);
    expect(own(tied)).toMatchObject({ used: true, liftFrom: sideRep });

    const { body: bench } = await coach.get(`/api/clips/${front.id}/bench`).expect(200);
    expect(bench.reps[0].rep.liftFrom).toBe(sideRep);

    await coach.delete(`/api/reps/${sideRep}`).expect(204);
    expect(await repOf(front, frontRep)).toMatchObject({ liftFrom: null, tieFault: null });
    const alone = await read();
    expect(own(alone)).not.toHaveProperty('liftFrom');
    expect(alone.inputHash).not.toBe(tied.inputHash);
  });

  it('are not merged where they show different reps, and the reason is told', async () => {
    const [front, side] = [await frontClip(), await sideClip()];
    const frontRep = await addRep(front, FRONT);
    const other = await addRep(side, sideOf({ ...MOTION, upMs: 2400 }));
    const { body } = await tie(front, frontRep, other);
    expect(body).toMatchObject({ liftFrom: other, tieFault: { code: 'durations-differ' } });
    const { body: page } = await coach
      .get(`/api/visits/${visit.id}/sides/right/reading`)
      .expect(200);
    const named = page.reading.reps.find((rep: { id: string }) => rep.id === frontRep);
    expect(named).toMatchObject({ liftFrom: other, tieFault: { code: 'durations-differ' } });
    const used = page.reading.result.reps.find((rep: { id: string }) => rep.id === frontRep);
    expect(used).not.toHaveProperty('liftFrom');
  });

  it('wait for marks that both show', async () => {
    const [front, side] = [await frontClip(), await sideClip()];
    const frontRep = await addRep(front, FRONT);
    const { body } = await tie(front, frontRep, await addRep(side, null));
    expect(body.tieFault).toEqual({ code: 'few-shared-events', have: [] });
  });

  it('keep a clap of each, and bring its time to the other clip’s Bench', async () => {
    const [front, side] = [await frontClip(), await sideClip()];
    const frontRep = await addRep(front, null);
    await addRep(side, null);
    const clap = (clapFrame: number) =>
      coach.patch(`/api/reps/${frontRep}`).send({ version: 1, clapFrame });
    await clap(600).expect(422);
    expect((await clap(30).expect(200)).body.clapFrame).toBe(30);
    const { body } = await coach.get(`/api/clips/${side.id}/bench`).expect(200);
    const there = body.otherReps.find(({ rep }: { rep: { id: string } }) => rep.id === frontRep);
    expect(there.times).toEqual([{ frame: 30, milliseconds: 500 }]);
  });
});

describe('two reps that cannot be one', () => {
  it('are refused: one clip, one view, the other leg, another visit, one that is not there', async () => {
    const { coach: user, athlete } = api.world;
    const elsewhere = await api.ground.inPractice(user, ({ em }) =>
      Promise.resolve(makeVisit(em, { athlete, coach: user })),
    );
    const [front, side] = [await frontClip(), await sideClip()];
    const frontRep = await addRep(front, null);
    const sideRep = await addRep(side, null);
    const refused = [
      frontRep,
      await addRep(await frontClip(), null),
      await addRep(side, null, 'left'),
      await addRep(
        await aClip({ visit: elsewhere, view: 'lifted-side', cameraStood: 'athlete-left' }),
        null,
      ),
      randomUUID(),
    ];
    for (const liftFrom of refused) {
      const { status, body } = await tie(front, frontRep, liftFrom);
      expect(status).toBe(422);
      expect(body.faults[0].path).toBe('body.liftFrom');
    }
    // the side rep takes no lift from the front
    expect((await tie(side, sideRep, frontRep)).status).toBe(422);
    expect((await tie(front, frontRep, sideRep)).status).toBe(200);
  });

  it('are not seen from another caseload or practice', async () => {
    const [front, side] = [await frontClip(), await sideClip()];
    const frontRep = await addRep(front, null);
    const sideRep = await addRep(side, null);
    for (const user of [api.world.otherCoach, api.world.foreignCoach, api.world.foreignOwner]) {
      const answer = await tie(front, frontRep, sideRep, await api.as(user));
      expect(answer.status).toBe(404);
    }
    expect(await repOf(front, frontRep)).toMatchObject({ liftFrom: null });
  });
});
