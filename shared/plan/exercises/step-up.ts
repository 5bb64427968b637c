import { DEEP_HIP, ONE_LEG } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const stepUp = exercise({
  id: 'step-up',
  name: 'Step-up',
  purpose: 'Take the turn in the standing hip up a step, where the lift follows the push.',
  setUp: [
    'A step of 10 to 20 cm, a rail or a wall beside it.',
    'The whole standing foot on the step.',
  ],
  side: {
    stands: 'support',
    other: 'lifted',
    load: 'lifted',
    support: 'support',
    because:
      'The foot on the step is the standing leg of the test; the other knee lifts at the top.',
  },
  foot: 'The whole foot on the step, three points before you push.',
  cues: [
    'Weight over the foot on the step, then push straight up.',
    'At the top the other knee comes up to 90°, the pelvis level.',
    'Down as slowly as up.',
  ],
  dose: { sets: 3, repetitions: 8, holdSeconds: null, restSeconds: 75, daysPerWeek: 3 },
  easier: 'A lower step, a hand on the rail.',
  harder: 'A higher step, or a weight in the hand of the lifted side.',
  goOnWhen: ['Three sets of eight without a push from the lower foot.'],
  goBackWhen: ['The knee falls in, or the pelvis drops.'],
  notWith: [...ONE_LEG, ...DEEP_HIP],
  notWhen: ['Pain in front of the knee on stairs.'],
  source: COMMON_PRACTICE,
});
