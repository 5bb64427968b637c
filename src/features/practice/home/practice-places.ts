import type { Role } from '#shared/contracts/accounts.ts';
import { paths } from '#src/ui/paths.ts';

interface Place {
  readonly to: string;
  readonly name: string;
  /** One line that says what is decided or found there. */
  readonly says: string;
  /** Who finds anything there; left out: all staff. */
  readonly of?: Role;
}

/** What is set for the practice as a whole, in the order in which a new practice needs it. */
const PLACES: readonly Place[] = [
  {
    to: paths.people(),
    name: 'People',
    says: 'Invite coaches and supervisors, and say who looks after whom.',
    of: 'owner',
  },
  {
    to: paths.consentWording(),
    name: 'Consent wording',
    says: 'What athletes and guardians agree to, in your practice’s words.',
    of: 'owner',
  },
  {
    to: paths.retention(),
    name: 'Retention',
    says: 'How long clips and records are kept, and what goes when.',
    of: 'owner',
  },
  {
    to: paths.setUps(),
    name: 'Set-ups',
    says: 'Saved ways of filming: one touch in a visit fills the figures.',
  },
  {
    to: paths.exercises(),
    name: 'Exercises',
    says: 'What plans are made of, with drawings, and the rules that suggest them.',
  },
  {
    to: paths.protocol(),
    name: 'Protocol',
    says: 'The gates and limits that readings go by, in versions.',
  },
  {
    to: paths.reliability(),
    name: 'Reliability',
    says: 'How well marks and calls repeat, from frames marked twice.',
  },
  {
    to: paths.audit(),
    name: 'Audit trail',
    says: 'Who did what to which athlete, and from where.',
    of: 'owner',
  },
];

export const placesFor = (role: Role): readonly Place[] =>
  PLACES.filter(({ of }) => of === undefined || of === role);
