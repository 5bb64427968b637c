import { ONE_LEG } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const singleLegHinge = exercise({
  id: 'single-leg-hinge',
  name: 'Single-leg hinge',
  purpose: 'The hinge on one leg: the pelvis turns back over it without help from the other foot.',
  setUp: [
    'A support within reach of the standing side.',
    'Stand on one leg, the other just off the floor behind; a light weight in the hand of the lifted side.',
  ],
  side: {
    stands: 'support',
    other: 'lifted',
    load: 'lifted',
    support: 'support',
    because:
      'The standing leg is the one of the test; the weight in the other hand asks the pelvis to turn towards it.',
  },
  foot: 'Three points; small corrections come from the ankle, not from hopping.',
  cues: [
    'Hip back, the pelvis turns over the standing leg, then level again at the top.',
    'Go only as deep as the pelvis stays with you.',
  ],
  dose: { sets: 3, repetitions: 6, holdSeconds: null, restSeconds: 90, daysPerWeek: 3 },
  easier: 'Toes of the other foot on the floor.',
  harder: 'Slower, deeper, or heavier.',
  goOnWhen: ['Three sets of six without a touch of the support.'],
  goBackWhen: ['The pelvis opens away from the standing leg, or the foot grips.'],
  notWith: ONE_LEG,
  notWhen: ['Back pain when bending.'],
  source: COMMON_PRACTICE,
});
