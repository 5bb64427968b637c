import type { Dose } from '#shared/contracts/athlete-plan.ts';
import type { Side, View } from '#shared/contracts/primitives.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';

const format = (date: Date): string =>
  new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    timeZone: 'UTC',
  }).format(date);

/** `3 March 2026`, of a calendar day or a moment. */
export const dayWords = (at: string): string => format(new Date(at));

export const VIEW_WORDS = {
  front: 'the front',
  back: 'the back',
  'lifted-side': 'the side of the lifted leg',
  'support-side': 'the side of the leg stood on',
} as const satisfies Record<View, string>;

export const SET_WORDS = {
  bare: 'bare landmarks, without pointers',
  belt: 'a belt pointer',
  'belt+thigh': 'a belt and a thigh pointer',
} as const satisfies Record<LandmarkSetId, string>;

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** `a`, `a and b`, `a, b and c`. */
export const listed = (parts: readonly string[]): string =>
  parts.length < 2
    ? (parts[0] ?? '')
    : `${parts.slice(0, -1).join(', ')} and ${parts.at(-1) ?? ''}`;

export const counted = (count: number, one: string, many = `${one}s`): string =>
  `${count} ${count === 1 ? one : many}`;

export const hipWords = (side: Side): string => `${capital(side)} hip, standing on the ${side} leg`;

/** `3 × 8, 60 s rest, 4 days a week` */
export const doseWords = (dose: Dose): string => {
  const { sets, repetitions, holdSeconds, restSeconds, daysPerWeek } = dose;
  const work = repetitions === null ? `${holdSeconds ?? 0} s held` : String(repetitions);
  return `${sets} × ${work}, ${restSeconds} s rest, ${counted(daysPerWeek, 'day')} a week`;
};

/** Hundredths of a probability, never said to be certain. */
export const inHundred = (p: number): string => {
  const whole = Math.round(100 * p);
  if (whole < 1) return 'under 1 in 100';
  return whole > 99 ? 'over 99 in 100' : `${whole} in 100`;
};
