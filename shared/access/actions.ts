/** What a thing is for the question who may touch it. */
export type Resource =
  /** The practice as a whole: its lists, its set-ups. */
  | { readonly kind: 'practice'; readonly practiceId: string }
  /** An athlete and all that hangs on them: consents, visits, clips, reps, marks, calls, readings, links. */
  | { readonly kind: 'caseload'; readonly practiceId: string; readonly coachId: string }
  | {
      readonly kind: 'comment';
      readonly practiceId: string;
      /** The athlete's coach. */
      readonly coachId: string;
      readonly byUserId: string;
    }
  | { readonly kind: 'replay'; readonly practiceId: string; readonly replayId: string };

/** The kind of resource that each action is asked for; with another kind the answer is no. */
export const ACTIONS = {
  'practice.read': 'practice',
  'athlete.add': 'practice',
  'set-up.save': 'practice',
  'set-up.delete': 'practice',
  'protocol.change': 'practice',
  'people.manage': 'practice',
  'practice.edit': 'practice',
  'audit.read': 'practice',
  'consent-wording.change': 'practice',
  'retention.read': 'practice',
  'retention.change': 'practice',
  'athlete.read': 'caseload',
  'athlete.edit': 'caseload',
  'athlete.erase': 'caseload',
  'athlete.export': 'caseload',
  'consent.record': 'caseload',
  'consent.withdraw': 'caseload',
  'visit.add': 'caseload',
  'visit.edit': 'caseload',
  'clip.upload': 'caseload',
  'clip.edit': 'caseload',
  'clip.delete': 'caseload',
  'rep.edit': 'caseload',
  'marks.save': 'caseload',
  'marks.second': 'caseload',
  'reliability.read': 'caseload',
  'call.record': 'caseload',
  'reading.assume': 'caseload',
  'reading.renew': 'caseload',
  'review.hand-in': 'caseload',
  'review.decide': 'caseload',
  'comment.add': 'caseload',
  'head.save': 'caseload',
  'head.look': 'caseload',
  'plan.edit': 'caseload',
  'report.make': 'caseload',
  'replay.make': 'caseload',
  'replay.revoke': 'caseload',
  'comment.read': 'comment',
  'comment.resolve': 'comment',
  'comment.edit': 'comment',
  'comment.delete': 'comment',
  'replay.open': 'replay',
  'replay.answer': 'replay',
} as const satisfies Record<string, Resource['kind']>;

export type Action = keyof typeof ACTIONS;

/** The action that decides whether a thing of this kind is seen at all: without it, it does not exist. */
export const SEEING = {
  practice: 'practice.read',
  caseload: 'athlete.read',
  comment: 'comment.read',
  replay: 'replay.open',
} as const satisfies Record<Resource['kind'], Action>;
