import { type Action, ACTIONS, type Resource } from './actions.ts';
import type { Actor, UserActor } from './actors.ts';

/** How an athlete stands to a user of the same practice; null: not in their sight. */
type Reach = 'own' | 'assigned' | 'practice' | null;

const reach = (actor: UserActor, coachId: string): Reach => {
  if (coachId === actor.id) return 'own';
  if (actor.role === 'owner') return 'practice';
  if (actor.role === 'supervisor' && actor.coachIds.includes(coachId)) return 'assigned';
  return null;
};

/**
 * A supervisor sees, comments and marks a second time, blind, which changes no reading; what is measured stays the
 * coach's hand.
 */
const ASSIGNED: ReadonlySet<Action> = new Set<Action>([
  'athlete.read',
  'comment.add',
  'marks.second',
  'reliability.read',
]);

/** What changes the practice as a whole, who works in it, who did what, and what answers for all that it holds of one person. */
const OWNERS: ReadonlySet<Action> = new Set<Action>([
  'protocol.change',
  'practice.edit',
  'audit.read',
  'people.manage',
  'consent-wording.change',
  'retention.read',
  'retention.change',
  'athlete.erase',
  'athlete.export',
]);

const onPractice = (actor: UserActor, action: Action): boolean =>
  action === 'practice.read' ||
  actor.role === 'owner' ||
  (actor.role === 'coach' && !OWNERS.has(action));

const onCaseload = (actor: UserActor, action: Action, coachId: string): boolean => {
  if (OWNERS.has(action)) return actor.role === 'owner';
  const held = reach(actor, coachId);
  // a second pair of eyes: nobody signs off what their own athlete's reading says
  if (action === 'review.decide') return held === 'assigned' || held === 'practice';
  return held === 'assigned' ? ASSIGNED.has(action) : held !== null;
};

/** Words belong to who wrote them: others may read, answer and resolve. */
const onComment = (
  actor: UserActor,
  action: Action,
  comment: { coachId: string; byUserId: string },
): boolean => {
  if (reach(actor, comment.coachId) === null) return false;
  const ownWordsOnly = action === 'comment.edit' || action === 'comment.delete';
  return !ownWordsOnly || comment.byUserId === actor.id;
};

/** Whether this actor may do this to this thing. What is not allowed here is denied. */
export const can = (actor: Actor, action: Action, resource: Resource): boolean => {
  if (actor.kind === 'nobody') return false;
  if (actor.practiceId !== resource.practiceId || ACTIONS[action] !== resource.kind) return false;
  if (actor.kind === 'link') {
    return resource.kind === 'replay' && resource.replayId === actor.replayId;
  }
  switch (resource.kind) {
    case 'practice':
      return onPractice(actor, action);
    case 'caseload':
      return onCaseload(actor, action, resource.coachId);
    case 'comment':
      return onComment(actor, action, resource);
    case 'replay':
      return false;
  }
};
