import { describe, expect, it } from 'vitest';
import { type Action, ACTIONS, type Resource } from './actions.ts';
import { type Actor, NOBODY } from './actors.ts';
import { can } from './can.ts';

const user = (
  role: 'owner' | 'supervisor' | 'coach',
  id: string,
  practiceId = 'here',
  coachIds: string[] = [],
) => ({ kind: 'user', id, practiceId, role, coachIds }) as const;

/** All stand in the practice 'here' unless named otherwise; 'wren' is the coach whose athlete it is. */
const ACTORS = {
  ownCoach: user('coach', 'wren'),
  otherCoach: user('coach', 'dunlin'),
  herSupervisor: user('supervisor', 'curlew', 'here', ['wren']),
  otherSupervisor: user('supervisor', 'plover', 'here', ['dunlin']),
  owner: user('owner', 'heron'),
  foreignCoachSameId: user('coach', 'wren', 'elsewhere'),
  foreignSupervisor: user('supervisor', 'curlew', 'elsewhere', ['wren']),
  foreignOwner: user('owner', 'heron', 'elsewhere'),
  link: { kind: 'link', practiceId: 'here', replayId: 'loop' },
  foreignLink: { kind: 'link', practiceId: 'elsewhere', replayId: 'loop' },
  otherLink: { kind: 'link', practiceId: 'here', replayId: 'other' },
  nobody: NOBODY,
} as const satisfies Record<string, Actor>;
type ActorName = keyof typeof ACTORS;

const RESOURCES: Record<Resource['kind'], Resource> = {
  practice: { kind: 'practice', practiceId: 'here' },
  caseload: { kind: 'caseload', practiceId: 'here', coachId: 'wren' },
  comment: { kind: 'comment', practiceId: 'here', coachId: 'wren', byUserId: 'curlew' },
  replay: { kind: 'replay', practiceId: 'here', replayId: 'loop' },
};

const ALL_STAFF: ActorName[] = [
  'ownCoach',
  'otherCoach',
  'herSupervisor',
  'otherSupervisor',
  'owner',
];
const COACHES_AND_OWNER: ActorName[] = ['ownCoach', 'otherCoach', 'owner'];
const SEES: ActorName[] = ['ownCoach', 'herSupervisor', 'owner'];
const WORKS: ActorName[] = ['ownCoach', 'owner'];

/** Who may, by action. Everybody who is not named may not. The comment is curlew's, the supervisor's. */
const EXPECTED: Record<Action, readonly ActorName[]> = {
  'practice.read': ALL_STAFF,
  'athlete.add': COACHES_AND_OWNER,
  'set-up.save': COACHES_AND_OWNER,
  'set-up.delete': COACHES_AND_OWNER,
  'protocol.change': ['owner'],
  'people.manage': ['owner'],
  'practice.edit': ['owner'],
  'audit.read': ['owner'],
  'consent-wording.change': ['owner'],
  'retention.read': ['owner'],
  'retention.change': ['owner'],
  'athlete.erase': ['owner'],
  'athlete.export': ['owner'],
  'athlete.read': SEES,
  'athlete.edit': WORKS,
  'consent.record': WORKS,
  'consent.withdraw': WORKS,
  'visit.add': WORKS,
  'visit.edit': WORKS,
  'clip.upload': WORKS,
  'clip.edit': WORKS,
  'clip.delete': WORKS,
  'rep.edit': WORKS,
  'marks.save': WORKS,
  'marks.second': SEES,
  'reliability.read': SEES,
  'call.record': WORKS,
  'reading.assume': WORKS,
  'reading.renew': WORKS,
  'review.hand-in': WORKS,
  'review.decide': ['herSupervisor', 'owner'],
  'comment.add': SEES,
  'head.save': WORKS,
  'head.look': WORKS,
  'plan.edit': WORKS,
  'report.make': WORKS,
  'replay.make': WORKS,
  'replay.revoke': WORKS,
  'comment.read': SEES,
  'comment.resolve': SEES,
  'comment.edit': ['herSupervisor'],
  'comment.delete': ['herSupervisor'],
  'replay.open': ['link'],
  'replay.answer': ['link'],
};

const cases = (Object.keys(ACTIONS) as Action[]).flatMap((action) =>
  (Object.keys(ACTORS) as ActorName[]).map((name) => ({
    action,
    name,
    allowed: EXPECTED[action].includes(name),
  })),
);

describe('can', () => {
  it.each(cases)('$name, $action: $allowed', ({ action, name, allowed }) => {
    expect(can(ACTORS[name], action, RESOURCES[ACTIONS[action]])).toBe(allowed);
  });

  it('says no where an action is asked of another kind of thing', () => {
    for (const action of Object.keys(ACTIONS) as Action[]) {
      for (const resource of Object.values(RESOURCES)) {
        if (resource.kind === ACTIONS[action]) continue;
        for (const actor of Object.values(ACTORS)) expect(can(actor, action, resource)).toBe(false);
      }
    }
  });

  it('lets a supervisor work on athletes of their own', () => {
    const own: Resource = { kind: 'caseload', practiceId: 'here', coachId: 'curlew' };
    expect(can(ACTORS.herSupervisor, 'marks.save', own)).toBe(true);
  });

  it('lets nobody sign off what their own athlete’s reading says, whatever their role', () => {
    for (const [role, id] of [
      ['owner', 'heron'],
      ['supervisor', 'curlew'],
      ['coach', 'wren'],
    ] as const)
      expect(
        can(user(role, id, 'here', [id]), 'review.decide', {
          kind: 'caseload',
          practiceId: 'here',
          coachId: id,
        }),
      ).toBe(false);
  });

  it('does not read the list of assigned coaches for anyone but a supervisor', () => {
    const coachWithList = user('coach', 'dunlin', 'here', ['wren']);
    expect(can(coachWithList, 'athlete.read', RESOURCES.caseload)).toBe(false);
  });
});
