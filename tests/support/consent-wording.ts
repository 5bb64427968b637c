import type { ConsentWording, ConsentWordingPage } from '#shared/contracts/consents.ts';

export const aWording = (change: Partial<ConsentWording> = {}): ConsentWording => ({
  id: '00000000-0000-4000-8000-000000000810',
  version: 1,
  at: '2026-01-05T09:00:00Z',
  texts: {
    intro: 'We film you.',
    assessment: 'Your coach looks at it.',
    supervision: 'A colleague looks at it.',
    teaching: 'Learners look at it.',
    'sharing-by-link': 'You get a link.',
    minors: 'A guardian says yes, and you are asked.',
    withdrawal: 'Tell us.',
  },
  by: null,
  note: 'The wording that Redshank comes with.',
  consents: 0,
  ...change,
});

/** Newest first. */
export const aWordingPage = (
  current: ConsentWording = aWording(),
  ...before: ConsentWording[]
): ConsentWordingPage => ({ current, history: [current, ...before] });
