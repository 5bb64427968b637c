import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { JobOutbox } from '#server/jobs/job-outbox.entity.ts';
import { product } from '../../db/in-practice.ts';
import type { User } from '../accounts/user.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { SEND_WAITING_MAIL } from './jobs/send-waiting-mail-type.ts';
import { sendWaitingMailJob } from './jobs/send-waiting-mail.ts';

type Agent = Awaited<ReturnType<Api['as']>>;

let api: Api;
let coach: Agent;
let supervisor: Agent;
let clipId: string;
let side: string;
/** Letters of earlier tests. */
let before = 0;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  supervisor = await api.as(api.world.supervisor);
});
afterAll(() => api.close());

const inPractice = <T>(
  work: Parameters<typeof api.ground.inPractice<ReturnType<typeof product>, T>>[1],
) => api.ground.inPractice(product(api.world.practiceId), work);

beforeEach(async () => {
  const { coach: user, athlete } = api.world;
  const made = await inPractice(async ({ em }) => {
    const visit = makeVisit(em, { athlete, coach: user });
    const clip = makeClip(em, { visit, uploadedBy: user });
    await em.execute('update mail_choice set asked_at = null, off = false');
    await em.flush();
    return { visit: visit.id, clip: clip.id };
  });
  clipId = made.clip;
  side = `/api/visits/${made.visit}/sides/left`;
  before = api.mailbox.length;
});

/** What the worker writes of what was asked for since the last time. */
const lettersTo = async (user: User): Promise<string[]> => {
  const { practiceId } = api.world;
  const asked = await inPractice(async ({ em }) => {
    const rows = await em.find(JobOutbox, { queue: SEND_WAITING_MAIL.queue });
    em.remove(rows);
    return rows.map(({ payload }) => payload);
  });
  const { signal } = new AbortController();
  for (const payload of asked)
    await sendWaitingMailJob.run({ ground: api.ground, practiceId, payload, signal });
  return api.mailbox
    .slice(before)
    .flatMap(({ to, subject, text }) => (to === user.email ? [`${subject}\n${text}`] : []));
};

const handIn = async () => {
  const { body } = await coach
    .post(`${side}/call`)
    .send({ seen: 'early', confidence: 'sure' })
    .expect(201);
  const about = { kind: 'call', id: String(body.id) };
  await coach.post(`${side}/hand-in`).send({ about }).expect(201);
  return about;
};
const comment = (who: Agent, body: object = {}) =>
  who
    .post(`/api/clips/${clipId}/comments`)
    .send({ body: 'Is the heel down?', fromFrame: 3, toFrame: 3, ...body })
    .expect(201);

describe('a letter about what waits', () => {
  it('goes to the supervisor when a side is handed in, and to the coach when it is sent back', async () => {
    const { supervisor: reviewer, coach: user, owner } = api.world;
    const about = await handIn();
    const [letter, ...more] = await lettersTo(reviewer);
    expect(more).toEqual([]);
    expect(letter).toContain('A side waits for your review');
    expect(letter).toMatch(/https?:\/\/\S+\/review\n/);
    // where there is a supervisor, the owner is left in peace
    expect(await lettersTo(owner)).toEqual([]);
    await supervisor
      .post(`${side}/review`)
      .send({ about, verdict: 'send-back', reason: 'Too early to say.' })
      .expect(201);
    const [back] = await lettersTo(user);
    expect(back).toContain('A side came back to you');
    expect(back).toContain(`${side.replace('/api', '')}#sign-off`);
  });

  it('names nobody who was filmed, no finding and none of what was said', async () => {
    const { supervisor: reviewer, coach: user, athlete } = api.world;
    const about = await handIn();
    await comment(supervisor);
    await supervisor
      .post(`${side}/review`)
      .send({ about, verdict: 'send-back', reason: 'Too early to say.' })
      .expect(201);
    const all = [...(await lettersTo(reviewer)), ...(await lettersTo(user))].join('\n');
    for (const secret of [athlete.givenName, athlete.familyName, 'heel', 'Too early', 'early'])
      expect(all).not.toContain(secret);
  });

  it('goes to the coach of what is commented, and to whoever is answered, never to who writes', async () => {
    const { body } = await comment(supervisor);
    expect((await lettersTo(api.world.coach))[0]).toContain(
      `/clips/${clipId}?frame=3&comment=${body.id}`,
    );
    expect(await lettersTo(api.world.supervisor)).toEqual([]);
    await comment(coach, { answerTo: body.id });
    expect(await lettersTo(api.world.supervisor)).toHaveLength(1);
    expect(await lettersTo(api.world.coach)).toHaveLength(1);
  });

  it('comes once in a while, however much is said meanwhile', async () => {
    for (let n = 0; n < 4; n += 1) await comment(supervisor);
    expect(await lettersTo(api.world.coach)).toHaveLength(1);
  });

  it('does not come of a kind that was turned off, also where it was asked for before', async () => {
    const off = await coach
      .put('/api/account/waiting-mail')
      .send({ kind: 'comment', on: false })
      .expect(200);
    expect(off.body.items).toEqual([
      { kind: 'to-review', on: true },
      { kind: 'sent-back', on: true },
      { kind: 'comment', on: false },
      { kind: 'second-marking', on: true },
      { kind: 'pain', on: true },
    ]);
    await comment(supervisor);
    expect(await lettersTo(api.world.coach)).toEqual([]);
    await coach.put('/api/account/waiting-mail').send({ kind: 'comment', on: true }).expect(200);
    await comment(supervisor);
    await coach.put('/api/account/waiting-mail').send({ kind: 'comment', on: false }).expect(200);
    expect(await lettersTo(api.world.coach)).toEqual([]);
    // another person's switch is their own
    const { body } = await supervisor.get('/api/account/waiting-mail').expect(200);
    expect(body.items.every(({ on }: { on: boolean }) => on)).toBe(true);
  });

  it('does not reach who no longer works here', async () => {
    await comment(supervisor);
    await inPractice(async ({ em }) => {
      await em.execute('update account set disabled_at = now() where id = ?', [api.world.coach.id]);
    });
    expect(await lettersTo(api.world.coach)).toEqual([]);
    await inPractice(async ({ em }) => {
      await em.execute('update account set disabled_at = null where id = ?', [api.world.coach.id]);
    });
  });
});
