import type { Action } from '#shared/access/actions.ts';
import { can } from '#shared/access/can.ts';
import { useMe } from './me.ts';

export type May = (action: Action) => boolean;

/**
 * What the person signed in may do with an athlete whom they see, so that a page shows only what it can do. The
 * server decides; this is the same rule, asked ahead. A supervisor sees an athlete of another coach only where that
 * coach is assigned to them.
 * @param coachId the athlete's coach; unknown while it loads: only a supervisor's answer depends on it, and is no
 */
export function useMay(coachId: string | undefined): May {
  const { user, practice } = useMe();
  const { id, role } = user;
  const of = coachId ?? (role === 'supervisor' ? undefined : id);
  return (action) =>
    of !== undefined &&
    can(
      {
        kind: 'user',
        id,
        practiceId: practice.id,
        role,
        coachIds: role === 'supervisor' ? [of] : [],
      },
      action,
      { kind: 'caseload', practiceId: practice.id, coachId: of },
    );
}

/** What the person signed in may do in the practice as a whole. */
export function useMayInPractice(): May {
  const { user, practice } = useMe();
  return (action) =>
    can(
      { kind: 'user', id: user.id, practiceId: practice.id, role: user.role, coachIds: [] },
      action,
      { kind: 'practice', practiceId: practice.id },
    );
}
