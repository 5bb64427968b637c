import type { EntityManager } from '@mikro-orm/postgresql';
import type { Purpose } from '#shared/contracts/consents.ts';
import type { User } from '../accounts/user.entity.ts';
import { Athlete } from './athlete.entity.ts';
import { Consent } from './consent.entity.ts';

type AthleteGiven = {
  coach: User;
  givenName?: string;
  familyName?: string;
  birthDate?: string;
  heightMm?: number | null;
  sport?: string;
  cautions?: string;
};

export const makeAthlete = (em: EntityManager, given: AthleteGiven): Athlete =>
  em.create(Athlete, {
    givenName: 'Robin',
    familyName: 'Marsh',
    birthDate: '1994-05-02',
    heightMm: 1740,
    ...given,
  });

/** Valid for a year from today unless told otherwise. */
export const makeConsent = (
  em: EntityManager,
  given: {
    athlete: Athlete;
    recordedBy: User;
    purposes?: Purpose[];
    validFrom?: string;
    validUntil?: string;
    givenBy?: 'athlete' | 'guardian';
    guardianName?: string;
    guardianRelation?: string;
    assent?: boolean;
    how?: string;
  },
): Consent =>
  em.create(Consent, {
    givenBy: 'athlete',
    assent: false,
    purposes: ['assessment', 'supervision', 'sharing-by-link'],
    held: given.purposes ?? ['assessment', 'supervision', 'sharing-by-link'],
    validFrom: new Date().toISOString().slice(0, 10),
    validUntil: new Date(Date.now() + 365 * 86_400_000).toISOString().slice(0, 10),
    how: 'On paper.',
    ...given,
  });
