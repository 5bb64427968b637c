import type { Athlete } from '#shared/contracts/athletes.ts';
import { age } from '#src/ui/days.ts';
import { metres } from '#src/ui/figures.ts';

export const fullName = (athlete: Pick<Athlete, 'givenName' | 'familyName'>): string =>
  `${athlete.givenName} ${athlete.familyName}`;

/** `Born 2010, 15 years old, 1.62 m, hurdles.` What is not known is left out. */
export function aboutAthlete(athlete: Athlete, now = new Date()): string {
  const parts = [
    `Born ${athlete.birthDate.slice(0, 4)}`,
    `${age(athlete.birthDate, now)} years old`,
    athlete.heightMm === null ? '' : metres(athlete.heightMm),
    athlete.sport,
  ];
  return `${parts.filter((part) => part !== '').join(', ')}.`;
}
