/** Who acts. Everybody else is nobody, and nobody may do nothing. */
export type Role = 'owner' | 'supervisor' | 'coach';

export interface UserActor {
  readonly kind: 'user';
  readonly id: string;
  readonly practiceId: string;
  readonly role: Role;
  /** Coaches assigned to a supervisor; empty for everybody else. */
  readonly coachIds: readonly string[];
}

/** A replay link that was opened. It sees one replay and nothing else of the practice. */
export interface LinkActor {
  readonly kind: 'link';
  readonly practiceId: string;
  readonly replayId: string;
}

export interface NobodyActor {
  readonly kind: 'nobody';
}

export const NOBODY: NobodyActor = { kind: 'nobody' };

export type Actor = UserActor | LinkActor | NobodyActor;
