import { DEEP_HIP } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const supportedHinge = exercise({
  id: 'supported-hinge',
  name: 'Supported hinge',
  purpose:
    'Bend at the hip over the standing leg while the pelvis turns back towards it, with the hands to hold on.',
  setUp: [
    'Stand at arm’s length from a wall, a counter or a heavy chair, both hands on it.',
    'Weight on the standing leg, the toes of the other foot lightly on the floor behind.',
  ],
  side: {
    stands: 'support',
    other: 'toes-behind',
    load: null,
    support: 'both',
    because: 'The pelvis is to turn back over the leg that was stood on in the test.',
  },
  foot: 'Three points of the foot stay heavy; as the hip goes back the heel gains weight.',
  cues: [
    'Push the hip of the standing leg back, the knee a little bent.',
    'Let the pelvis turn towards the standing leg as you go down.',
    'Come up by pushing the floor away, the pelvis level at the end.',
  ],
  dose: { sets: 3, repetitions: 8, holdSeconds: null, restSeconds: 60, daysPerWeek: 4 },
  easier: 'Hinge on both legs and shift the weight by hand.',
  harder: 'One hand off the support, then the hand of the standing side off.',
  goOnWhen: [
    'Three sets of eight with the foot still and the pelvis turning each time.',
    'No more than two out of ten of effort in the hands.',
  ],
  goBackWhen: ['The foot rolls out, the knee falls in, or the back rounds.'],
  notWith: DEEP_HIP,
  notWhen: ['Back pain when bending.'],
  source: COMMON_PRACTICE,
});
