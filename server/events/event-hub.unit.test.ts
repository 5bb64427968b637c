import { describe, expect, it } from 'vitest';
import type { UserActor } from '#shared/access/actors.ts';
import { EventHub, type Listener } from './event-hub.ts';
import type { EventScope, ToldEvent } from './tell.ts';

const user = (id: string, role: UserActor['role'], coachIds: string[] = []): UserActor => ({
  kind: 'user',
  id,
  practiceId: 'here',
  role,
  coachIds,
});
const PEOPLE = {
  coach: user('wren', 'coach'),
  otherCoach: user('dunlin', 'coach'),
  supervisor: user('curlew', 'supervisor', ['wren']),
  owner: user('heron', 'owner'),
  foreign: { ...user('heron', 'owner'), practiceId: 'elsewhere' },
};

const listening = () => {
  const hub = new EventHub();
  const heard: string[] = [];
  const closed: string[] = [];
  for (const [name, actor] of Object.entries(PEOPLE)) {
    const listener: Listener = {
      actor,
      sessionId: `session of ${name}`,
      send: () => heard.push(name),
      close: () => closed.push(name),
    };
    hub.add(listener);
  }
  return { hub, heard, closed };
};

const event = (id: string, scope: EventScope = { coachId: 'wren' }): ToldEvent => ({
  id,
  practiceId: 'here',
  scope,
  event: { type: 'comments', clipId: 'c', byUserId: 'u' },
});

describe('the event hub', () => {
  it('tells those who may see the athlete, and nobody else', () => {
    const { hub, heard } = listening();
    hub.publish(event('1'));
    expect(heard).toEqual(['coach', 'supervisor', 'owner']);
  });

  it('tells one user’s tabs, and one session', () => {
    const { hub, heard } = listening();
    hub.publish(event('1', { userId: 'dunlin' }));
    hub.publish(event('2', { sessionId: 'session of coach' }));
    expect(heard).toEqual(['otherCoach', 'coach']);
  });

  it('closes the streams of who signed out, after telling them', () => {
    const { hub, heard, closed } = listening();
    hub.publish({ ...event('1', { userId: 'wren' }), event: { type: 'signed-out' } });
    expect(heard).toEqual(['coach']);
    expect(closed).toEqual(['coach']);
  });

  it('tells who comes back what they missed, as far as they may hear it', () => {
    const { hub } = listening();
    hub.publish(event('1'));
    hub.publish(event('2', { coachId: 'dunlin' }));
    hub.publish(event('3'));
    const ids = (actor: UserActor, after: string) =>
      hub.since(after, { actor, sessionId: 's' })?.map(({ id }) => id);
    expect(ids(PEOPLE.coach, '1')).toEqual(['3']);
    expect(ids(PEOPLE.owner, '1')).toEqual(['2', '3']);
    expect(ids(PEOPLE.owner, '3')).toEqual([]);
    expect(ids(PEOPLE.foreign, '1')).toEqual([]);
  });

  it('admits that it does not know what was missed after an event it has forgotten', () => {
    const { hub } = listening();
    for (let i = 0; i <= 500; i += 1) hub.publish(event(String(i)));
    const ear = { actor: PEOPLE.owner, sessionId: 's' };
    expect(hub.since('0', ear)).toBeNull();
    expect(hub.since('1', ear)).toHaveLength(499);
  });

  it('tells who is on a clip, and does not remember it', () => {
    const { hub, heard } = listening();
    hub.publish(event('1'));
    hub.publish({
      ...event('2'),
      event: { type: 'here', clipId: 'c', by: { id: 'wren', name: 'Wren' }, here: true },
    });
    hub.publish(event('3'));
    expect(heard.filter((name) => name === 'supervisor')).toHaveLength(3);
    const ear = { actor: PEOPLE.owner, sessionId: 's' };
    expect(hub.since('1', ear)?.map(({ id }) => id)).toEqual(['3']);
  });

  it('forgets a stream that was closed', () => {
    const { hub, heard } = listening();
    const remove = hub.add({
      actor: PEOPLE.owner,
      sessionId: 'x',
      send: () => heard.push('late'),
      close: () => undefined,
    });
    expect(hub.size).toBe(6);
    remove();
    hub.publish(event('1'));
    expect(heard).not.toContain('late');
  });
});
