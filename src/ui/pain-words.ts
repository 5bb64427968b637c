import type { PainBody, PainPlace } from '#shared/contracts/athlete-plan.ts';

/** Where it hurts, as people say it. */
export const PAIN_PLACE_WORDS: Record<PainPlace, string> = {
  back: 'back',
  groin: 'groin',
  'hip-front': 'front of the hip',
  'hip-side': 'side of the hip',
  buttock: 'buttock',
  'thigh-front': 'front of the thigh',
  'thigh-back': 'back of the thigh',
  knee: 'knee',
  'lower-leg': 'lower leg',
  ankle: 'ankle',
  foot: 'foot',
  elsewhere: 'somewhere else',
};

export const PAIN_TIME_WORDS: Record<NonNullable<PainBody['time']>, string> = {
  'while-doing-it': 'while doing it',
  afterwards: 'afterwards',
  'next-day': 'the day after',
  always: 'all the time',
};

export const PAIN_WHICH_WORDS: Record<NonNullable<PainBody['which']>, string> = {
  left: 'left',
  right: 'right',
  both: 'both sides',
};
