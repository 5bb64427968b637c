import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { tokenHash } from '../../http/token-hash.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { AuditEntry } from '../audit/audit-entry.entity.ts';
import { Replay } from '../replays/replay.entity.ts';
import { makeRep } from '../reps/rep.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { Athlete } from './athlete.entity.ts';
import { makeAthlete, makeConsent } from './athlete.factory.ts';
import { hasConsent } from './consent-check.ts';
import { daysLater, today } from './days.ts';

let api: Api;
let adult: Athlete;
let minor: Athlete;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());
beforeEach(async () => {
  const { coach, practiceId } = api.world;
  [adult, minor] = await api.ground.inPractice(product(practiceId), ({ em }) =>
    Promise.resolve([
      makeAthlete(em, { coach }),
      makeAthlete(em, { coach, birthDate: daysLater(today(), -15 * 365) }),
    ]),
  );
});

const BODY = {
  givenBy: 'athlete',
  purposes: ['assessment', 'sharing-by-link'],
  validUntil: daysLater(today(), 90),
  how: 'On the tablet.',
};
const record = async (athlete: Athlete, body: object) =>
  (await api.as(api.world.coach)).post(`/api/athletes/${athlete.id}/consents`).send(body);

const consented = (purpose: 'assessment' | 'sharing-by-link', athlete = adult) =>
  api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    hasConsent(em, athlete.id, purpose),
  );

/** A live replay link of an athlete. */
const linkOf = (athlete: Athlete, token: string) => {
  const { coach, practiceId } = api.world;
  return api.ground.inPractice(product(practiceId), ({ em }) => {
    const visit = makeVisit(em, { athlete, coach });
    const clip = makeClip(em, { visit, uploadedBy: coach });
    const rep = makeRep(em, { clip, createdBy: coach });
    return Promise.resolve(
      em.create(Replay, {
        visit,
        rep,
        side: 'right',
        fromFrame: 0,
        toFrame: 100,
        showReading: true,
        showCall: true,
        message: '',
        tokenHash: tokenHash(token),
        passPhraseHash: null,
        expiresAt: new Date(Date.now() + 1e9),
        by: coach,
      }),
    );
  });
};

/** Whether the look-up behind every opening finds it. */
const opens = async (token: string): Promise<boolean> => {
  const em = api.ground.orm.em.fork();
  return (await em.execute('select * from find_replay(?)', [tokenHash(token)])).length > 0;
};

describe('a guardian’s consent from before the child was asked', () => {
  const old = () => {
    const { coach, practiceId } = api.world;
    return api.ground.inPractice(product(practiceId), ({ em }) => {
      const mine = em.getReference(Athlete, minor.id);
      const guardian = { givenBy: 'guardian', guardianName: 'Ada Marsh' } as const;
      makeConsent(em, { athlete: mine, recordedBy: coach, ...guardian });
      return Promise.resolve(makeVisit(em, { athlete: mine, coach }).id);
    });
  };
  const seen = async () => {
    const coach = await api.as(api.world.coach);
    const { body } = await coach.get(`/api/athletes/${minor.id}`).expect(200);
    const { body: list } = await coach.get(`/api/athletes/${minor.id}/consents`).expect(200);
    return { ...body, states: list.items.map(({ state }: { state: string }) => state) };
  };
  const send = async (visitId: string) =>
    (await api.as(api.world.coach))
      .post(`/api/visits/${visitId}/uploads`)
      .send({ name: 'a.mov', bytes: 1000, view: 'front' });

  it('does not count for new clips nor links, and says what is missing', async () => {
    const visitId = await old();
    expect(await consented('assessment', minor)).toBe(false);
    expect(await consented('sharing-by-link', minor)).toBe(false);
    expect(await seen()).toMatchObject({
      consentedTo: [],
      consentUntil: null,
      assentMissing: true,
      states: ['assent-missing'],
    });
    const refused = await send(visitId);
    expect(refused.body.code).toBe('consent-missing');
    const coach = await api.as(api.world.coach);
    const { body } = await coach.get('/api/athletes?consent=valid&pageSize=100').expect(200);
    expect(body.items.map(({ id }: { id: string }) => id)).not.toContain(minor.id);
  });

  it('is made good by a consent with the child’s own yes', async () => {
    const visitId = await old();
    const guardian = { ...BODY, givenBy: 'guardian', guardianName: 'Ada Marsh', assent: true };
    expect((await record(minor, guardian)).status).toBe(201);
    expect(await consented('assessment', minor)).toBe(true);
    expect(await seen()).toMatchObject({
      assentMissing: false,
      states: ['valid', 'assent-missing'],
    });
    // a chaperone in the room is what is left
    expect((await send(visitId)).body.code).toBe('safety-check-stops');
  });

  it('counts for whoever is of age, and an adult’s own needs no other', async () => {
    const { coach, practiceId } = api.world;
    await api.ground.inPractice(product(practiceId), ({ em }) => {
      const grown = em.getReference(Athlete, adult.id);
      return Promise.resolve(makeConsent(em, { athlete: grown, recordedBy: coach }));
    });
    expect(await consented('assessment')).toBe(true);
  });
});

describe('a consent', () => {
  it('is recorded with who, what for and until when, and counts at once', async () => {
    expect(await consented('assessment')).toBe(false);
    const answer = await record(adult, BODY);
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      givenBy: 'athlete',
      guardianName: null,
      purposes: ['assessment', 'sharing-by-link'],
      validFrom: today(),
      validUntil: BODY.validUntil,
      state: 'valid',
      recordedBy: { id: api.world.coach.id },
      withdrawnAt: null,
    });
    expect(await consented('assessment')).toBe(true);
    const coach = await api.as(api.world.coach);
    const { body } = await coach.get(`/api/athletes/${adult.id}`);
    expect(body).toMatchObject({
      consentedTo: ['assessment', 'sharing-by-link'],
      consentUntil: BODY.validUntil,
    });
  });

  it('of a minor comes from a guardian who is named', async () => {
    const own = await record(minor, BODY);
    expect(own.status).toBe(422);
    expect(own.body.faults[0].path).toBe('body.givenBy');
    const unnamed = await record(minor, { ...BODY, givenBy: 'guardian' });
    expect(unnamed.body.faults[0].path).toBe('body.guardianName');
    const good = await record(minor, {
      ...BODY,
      givenBy: 'guardian',
      guardianName: 'Kim Sedge',
      guardianRelation: 'Mother',
      assent: true,
    });
    expect(good.status).toBe(201);
  });

  it('of a minor needs their own yes beside the guardian’s', async () => {
    const guardian = { ...BODY, givenBy: 'guardian', guardianName: 'Kim Sedge' };
    for (const assent of [{}, { assent: false }]) {
      const refused = await record(minor, { ...guardian, ...assent });
      expect(refused.status).toBe(422);
      expect(refused.body.faults).toEqual([
        {
          path: 'body.assent',
          message: 'Without the athlete’s own yes nothing is recorded and nothing is filmed.',
        },
      ]);
    }
    expect(await consented('assessment', minor)).toBe(false);
    expect((await record(minor, { ...guardian, assent: true })).status).toBe(201);
    expect(await consented('assessment', minor)).toBe(true);
  });

  it('cannot end before it begins, nor leave assessment out', async () => {
    const past = await record(adult, { ...BODY, validUntil: daysLater(today(), -1) });
    expect(past.body.faults).toEqual([
      { path: 'body.validUntil', message: 'Choose today or a later day.' },
    ]);
    const without = await record(adult, { ...BODY, purposes: ['teaching'] });
    expect(without.body.faults[0].path).toBe('body.purposes');
  });

  it('lapses by itself the day after its last', async () => {
    const { coach, practiceId } = api.world;
    await api.ground.inPractice(product(practiceId), ({ em }) => {
      makeConsent(em, {
        athlete: adult,
        recordedBy: coach,
        validFrom: daysLater(today(), -10),
        validUntil: daysLater(today(), -1),
      });
      return Promise.resolve();
    });
    expect(await consented('assessment')).toBe(false);
    const agent = await api.as(coach);
    const { body } = await agent.get(`/api/athletes/${adult.id}/consents`);
    expect(body.items[0].state).toBe('lapsed');
  });

  it('is withdrawn once, stays visible, and its links die with it', async () => {
    const { coach, practiceId } = api.world;
    const { id } = (await record(adult, BODY)).body as { id: string };
    const replay = await linkOf(adult, id);
    expect(await opens(id)).toBe(true);
    const agent = await api.as(coach);
    const first = await agent.post(`/api/consents/${id}/withdraw`).expect(200);
    expect(first.body.state).toBe('withdrawn');
    const again = await agent.post(`/api/consents/${id}/withdraw`).expect(200);
    expect(again.body.withdrawnAt).toBe(first.body.withdrawnAt);
    expect(await consented('assessment')).toBe(false);
    const dead = await api.ground.inPractice(product(practiceId), ({ em }) =>
      em.findOneOrFail(Replay, { id: replay.id }),
    );
    expect(dead.revokedAt).toBeInstanceOf(Date);
    expect(await opens(id)).toBe(false);
    const { body } = await agent.get(`/api/athletes/${adult.id}/consents`);
    expect(body.items).toHaveLength(1);
    const trail = await api.ground.inPractice(product(practiceId), ({ em }) =>
      em.find(AuditEntry, { subjectId: id }, { orderBy: { at: 'asc' } }),
    );
    expect(trail.map(({ action }) => action)).toEqual(['consent.record', 'consent.withdraw']);
    expect(trail.every(({ byUser }) => byUser === coach.id)).toBe(true);
  });

  it('that lapses closes its links too, and a new one opens them again', async () => {
    const { coach, practiceId } = api.world;
    const token = 'a link of somebody without consent today';
    await api.ground.inPractice(product(practiceId), ({ em }) => {
      makeConsent(em, {
        athlete: adult,
        recordedBy: coach,
        validFrom: daysLater(today(), -10),
        validUntil: daysLater(today(), -1),
      });
      return Promise.resolve();
    });
    await linkOf(adult, token);
    expect(await opens(token)).toBe(false);
    await record(adult, { ...BODY, purposes: ['assessment'] });
    expect(await opens(token)).toBe(false);
    await record(adult, BODY);
    expect(await opens(token)).toBe(true);
  });

  it('is nobody else’s to withdraw', async () => {
    const { id } = (await record(adult, BODY)).body as { id: string };
    const { supervisor, otherCoach, foreignOwner } = api.world;
    const path = `/api/consents/${id}/withdraw`;
    await (await api.as(supervisor)).post(path).expect(403);
    await (await api.as(otherCoach)).post(path).expect(404);
    await (await api.as(foreignOwner)).post(path).expect(404);
  });
});
