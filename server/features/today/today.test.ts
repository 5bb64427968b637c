import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Waiting } from '#shared/contracts/today.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { currentProtocol } from '#server/features/protocol/current-protocol.ts';
import { product } from '../../db/in-practice.ts';
import type { User } from '../accounts/user.entity.ts';
import { makeAthlete, makeConsent } from '../athletes/athlete.factory.ts';
import { daysLater, today } from '../athletes/days.ts';
import { Call } from '../calls/call.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { Comment } from '../comments/comment.entity.ts';
import { Reading } from '../readings/reading.entity.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import { Replay } from '../replays/replay.entity.ts';
import { SecondMarking } from '../second-markings/second-marking.entity.ts';
import { makeRep } from '../reps/rep.factory.ts';
import { Visit } from '../visits/visit.entity.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { mondayOf } from './today.service.ts';

let api: Api;
let clipId: string;
let commentId: string;
beforeAll(async () => {
  api = await startApi();
  const { coach, supervisor, athlete, practiceId } = api.world;
  [clipId, commentId] = await api.ground.inPractice(product(practiceId), async ({ em }) => {
    const visit = makeVisit(em, { athlete, coach });
    const by = { visit, uploadedBy: coach };
    const marked = makeClip(em, { ...by, supportSide: 'right' });
    const unmarked = makeRep(em, { clip: marked, createdBy: coach });
    makeRep(em, { clip: marked, createdBy: coach, startFrame: 300, excluded: 'hopped' });
    makeClip(em, { ...by, state: 'preparing', progress: 40, name: 'on-its-way.mov' });
    makeClip(em, { ...by, state: 'waiting', trouble: 'no-space', name: 'held.mov' });
    makeClip(em, {
      ...by,
      state: 'waiting',
      trouble: 'no-space',
      nextTryAt: new Date(Date.now() + 60_000),
      name: 'tried-again.mov',
    });
    makeClip(em, {
      ...by,
      state: 'refused',
      refusalCode: 'not-a-video',
      refusalFigures: {},
      name: 'notes.pdf',
    });
    em.create(Call, {
      visit,
      side: 'right',
      seen: 'early',
      substitutions: [],
      confidence: 'sure',
      handsFelt: '',
      by: coach,
      beforeFigures: true,
    });
    for (const side of ['left', 'right'] as const) {
      const reading = em.create(Reading, {
        visit,
        side,
        engine: 1,
        inputHash: 'a',
        seed: 1,
        inputs: {} as never,
        result: {} as never,
        code: 'cannot-tell',
        before60: false,
        provisional: false,
        assumption: false,
        protocol: await currentProtocol(em),
        by: coach,
      });
      em.create(SideSetting, { visit, side, reading });
    }
    const comment = em.create(Comment, {
      clip: marked,
      body: 'Look at the foot.',
      fromFrame: 12,
      toFrame: 12,
      shared: false,
      by: supervisor,
      at: new Date(Date.now() - 60_000),
    });
    const lapsing = makeAthlete(em, { coach, givenName: 'Sandy' });
    makeConsent(em, { athlete: lapsing, recordedBy: coach, validUntil: daysLater(today(), 5) });
    const old = makeVisit(em, { athlete: lapsing, coach, day: daysLater(today(), -40) });
    em.create(Replay, {
      visit: old,
      rep: unmarked,
      side: 'left',
      fromFrame: 0,
      toFrame: 9,
      showReading: true,
      showCall: true,
      message: '',
      tokenHash: 'x',
      passPhraseHash: null,
      expiresAt: new Date(Date.now() + 86_400_000),
      by: coach,
    });
    await em.flush();
    return [marked.id, comment.id];
  });
});
afterAll(() => api.close());

const itemsOf = async (user: User): Promise<Waiting[]> =>
  (await (await api.as(user)).get('/api/today').expect(200)).body.items as Waiting[];
const kindsOf = async (user: User) => (await itemsOf(user)).map(({ kind }) => kind);

describe('today', () => {
  it('tells a coach what waits, people first', async () => {
    const items = await itemsOf(api.world.coach);
    const kinds = items.map(({ kind }) => kind);
    expect(kinds.slice(0, 3)).toEqual(['comment-open', 'reading-ready', 'rep-unmarked']);
    expect(kinds.slice(3, 7).sort()).toEqual([
      'clip-held',
      'clip-preparing',
      'clip-preparing',
      'clip-refused',
    ]);
    expect(kinds.slice(7)).toEqual(['consent-lapses', 'link-lapses']);
    expect(items[0]).toMatchObject({
      commentId,
      clipId,
      frame: 12,
      body: 'Look at the foot.',
      by: { id: api.world.supervisor.id },
      athlete: { name: 'Robin Marsh' },
    });
    expect(items.find(({ kind }) => kind === 'rep-unmarked')).toMatchObject({
      clipId,
      repNumber: 1,
      side: 'right',
    });
    expect(items.find(({ kind }) => kind === 'reading-ready')).toMatchObject({
      side: 'right',
      label: 'Can’t tell yet',
    });
    expect(items.filter(({ kind }) => kind === 'clip-preparing')).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ progress: 40 }),
        expect.objectContaining({ name: 'tried-again.mov' }),
      ]),
    );
    expect(items.find(({ kind }) => kind === 'clip-held')).toMatchObject({
      name: 'held.mov',
      sentence: expect.stringContaining('disk is full'),
    });
    expect(items.find(({ kind }) => kind === 'consent-lapses')).toMatchObject({
      until: daysLater(today(), 5),
      athlete: { name: 'Sandy Marsh' },
    });
  });

  it('asks for a call where a filmed side has none', async () => {
    const { coach, athlete, practiceId } = api.world;
    const visitId = await api.ground.inPractice(product(practiceId), ({ em }) => {
      const visit = makeVisit(em, { athlete, coach });
      const clip = makeClip(em, { visit, uploadedBy: coach, supportSide: null });
      makeRep(em, { clip, createdBy: coach, supportSide: 'left' });
      return Promise.resolve(visit.id);
    });
    const calls = (await itemsOf(coach)).filter(({ kind }) => kind === 'call-missing');
    expect(calls).toMatchObject([{ visitId, side: 'left' }]);
  });

  it('tells a supervisor of what was handed in alone, and of answers', async () => {
    const { supervisor, coach, practiceId } = api.world;
    expect(await kindsOf(supervisor)).toEqual([]);
    await api.ground.inPractice(product(practiceId), ({ em }) => {
      const words = { clip: clipId, fromFrame: 12, toFrame: 12, shared: false };
      em.create(Comment, { ...words, answerTo: commentId, body: 'It turned out.', by: coach.id });
      em.create(Comment, { ...words, body: 'Good marks.', by: supervisor.id });
      return Promise.resolve();
    });
    const items = await itemsOf(supervisor);
    expect(items).toMatchObject([
      { kind: 'comment-open', commentId, body: 'It turned out.', by: { id: coach.id } },
    ]);
    expect(await itemsOf(coach)).toContainEqual(
      expect.objectContaining({ kind: 'comment-open', body: 'Good marks.' }),
    );
  });

  it('tells whoever is asked for a second marking, until it is finished, and shows no mark', async () => {
    const { coach, supervisor, athlete, practiceId } = api.world;
    const [visitId, open] = await api.ground.inPractice(product(practiceId), async ({ em }) => {
      const visit = makeVisit(em, { athlete, coach });
      const made = makeClip(em, { visit, uploadedBy: coach, supportSide: 'right' });
      makeRep(em, { clip: made, createdBy: coach });
      const rep = makeRep(em, { clip: made, createdBy: coach, startFrame: 200 });
      const asked = {
        rep,
        marker: supervisor,
        askedBy: coach,
        frames: [{ frame: 210, landmarks: ['kneecap'] as const }],
        first: [],
        phases: {},
      };
      const again = em.create(SecondMarking, asked);
      em.create(SecondMarking, { ...asked, finishedAt: new Date() });
      await em.flush();
      return [visit.id, again.id];
    });
    const ofKind = async (user: User) =>
      (await itemsOf(user)).filter(({ kind }) => kind === 'second-marking-asked');
    const [item, ...more] = await ofKind(supervisor);
    expect(more).toEqual([]);
    expect(item).toMatchObject({
      secondMarkingId: open,
      repNumber: 2,
      side: 'right',
      frames: 1,
      askedBy: { id: coach.id },
      mine: false,
      athlete: { id: athlete.id },
    });
    expect(JSON.stringify(item)).not.toMatch(/kneecap|landmark/);
    for (const other of [coach, api.world.otherCoach, api.world.owner, api.world.foreignOwner])
      expect(await ofKind(other)).toEqual([]);
    await api.ground.inPractice(product(practiceId), ({ em }) =>
      em.nativeDelete(Visit, { id: visitId }),
    );
  });

  it('tells the owner what lapses in the practice, and others nothing', async () => {
    expect(await kindsOf(api.world.owner)).toEqual(
      expect.arrayContaining(['consent-lapses', 'link-lapses']),
    );
    expect(await kindsOf(api.world.owner)).toContain('clip-held');
    expect(await itemsOf(api.world.otherCoach)).toEqual([]);
    expect(await itemsOf(api.world.foreignOwner)).toEqual([]);
  });

  it('counts the athletes in sight and the visits of this week', async () => {
    const coach = await api.as(api.world.coach);
    const { body } = await coach.get('/api/today');
    expect(body.athletes).toBe(2);
    expect(body.visitsThisWeek).toBe(3);
    const other = await api.as(api.world.otherCoach);
    expect((await other.get('/api/today')).body).toMatchObject({ athletes: 0, visitsThisWeek: 0 });
  });
});

describe('the first steps', () => {
  const stepsOf = async (user: User) => (await (await api.as(user)).get('/api/today')).body.steps;

  it('are ticked by what is there, for each in their own sight', async () => {
    const { coach, otherCoach, foreignOwner, athlete, foreignAthlete } = api.world;
    expect(await stepsOf(coach)).toEqual({
      ...{ contact: false, consent: true, clip: true, call: true },
      athleteId: athlete.id,
    });
    expect(await stepsOf(otherCoach)).toEqual({
      ...{ contact: false, consent: false, clip: false, call: false },
      athleteId: null,
    });
    expect(await stepsOf(foreignOwner)).toEqual({
      ...{ contact: false, consent: true, clip: false, call: false },
      athleteId: foreignAthlete.id,
    });
  });

  it('are ticked at once, and a practice that says how it is reached says so to all', async () => {
    const { owner, coach } = api.world;
    const asOwner = await api.as(owner);
    await asOwner.put('/api/practice').send({ name: 'Test Practice', contact: '1' }).expect(200);
    expect((await stepsOf(coach)).contact).toBe(true);
  });
});

describe('the week', () => {
  it.each([
    ['2026-11-30', '2026-11-30'],
    ['2026-12-06', '2026-11-30'],
    ['2027-01-01', '2026-12-28'],
  ])('of %s begins on %s', (day, monday) => {
    expect(mondayOf(day)).toBe(monday);
  });
});
