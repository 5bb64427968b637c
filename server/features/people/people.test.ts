import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { tokenTo, writeLetters } from '#tests/support/letters.ts';

const PEOPLE = '/api/practice/people';
const INVITATIONS = '/api/practice/invitations';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

describe('the people of a practice', () => {
  it('are listed for the owner alone, and only those of the practice', async () => {
    const { owner, supervisor, coach, otherCoach } = api.world;
    const { body } = await (await api.as(owner)).get(PEOPLE).expect(200);
    expect(body.people.map(({ id }: { id: string }) => id).sort()).toEqual(
      [owner, supervisor, coach, otherCoach].map(({ id }) => id).sort(),
    );
    const row = (id: string) => body.people.find((person: { id: string }) => person.id === id);
    expect(row(coach.id)).toMatchObject({ role: 'coach', athletes: 1, deactivatedAt: null });
    expect(row(supervisor.id)).toMatchObject({ coachIds: [coach.id], lastSeenAt: null });
    for (const user of [supervisor, coach]) await (await api.as(user)).get(PEOPLE).expect(403);
    await api.nobody.get(PEOPLE).expect(401);
  });
});

describe('an invitation', () => {
  it('leads to an account with the role that the owner chose', async () => {
    const owner = await api.as(api.world.owner);
    const email = 'dunlin@test.example';
    const { body } = await owner.post(INVITATIONS).send({ email, role: 'supervisor' }).expect(201);
    expect(body.invitations).toMatchObject([
      { email, role: 'supervisor', invitedBy: api.world.owner.name, sentAt: null },
    ]);
    const token = await tokenTo(api, email);
    const { body: sent } = await owner.get(PEOPLE).expect(200);
    expect(sent.invitations[0].sentAt).not.toBeNull();
    const { body: me } = await api.nobody
      .post('/api/join')
      .send({ token, name: 'Dunlin Reed', password: 'reeds at low water' })
      .expect(201);
    expect(me).toMatchObject({
      user: { email, role: 'supervisor', name: 'Dunlin Reed' },
      practice: { id: api.world.practiceId },
    });
    const after = (await owner.get(PEOPLE)).body;
    expect(after.invitations).toEqual([]);
    expect(after.people).toHaveLength(5);
  });

  it('of an address of another practice tells the owner nothing, and its holder why', async () => {
    const owner = await api.as(api.world.owner);
    const { email } = api.world.foreignCoach;
    const known = await owner.post(INVITATIONS).send({ email, role: 'coach' }).expect(201);
    const unknown = await owner
      .post(INVITATIONS)
      .send({ email: 'plover@test.example', role: 'coach' })
      .expect(201);
    await writeLetters(api);
    const { body } = await owner.get(PEOPLE);
    const shape = (row: object) => Object.entries(row).map(([key, value]) => [key, typeof value]);
    const [first, second] = body.invitations as object[];
    expect(shape(first ?? {})).toEqual(shape(second ?? {}));
    expect(known.status).toBe(unknown.status);
    const letter = api.mailbox.find(({ to }) => to === email);
    expect(letter?.subject).toBe('You have a Redshank account already');
    expect(letter?.text).not.toContain('/join/');
    expect(api.mailbox.find(({ to }) => to === 'plover@test.example')?.text).toContain('/join/');
  });

  it('of somebody who is here already is a fault of the field', async () => {
    const owner = await api.as(api.world.owner);
    const { email } = api.world.coach;
    const { body } = await owner.post(INVITATIONS).send({ email, role: 'coach' }).expect(422);
    expect(body.faults).toMatchObject([{ path: 'body.email' }]);
  });

  it('is made by the owner alone', async () => {
    for (const user of [api.world.coach, api.world.supervisor])
      await (
        await api.as(user)
      )
        .post(INVITATIONS)
        .send({ email: 'x@test.example', role: 'owner' })
        .expect(403);
  });
});
