import { DEEP_HIP } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const splitSquat = exercise({
  id: 'split-squat',
  name: 'Split squat',
  purpose: 'Carry the turned pelvis through bending and straightening of the standing leg.',
  setUp: [
    'A long step: the standing leg in front and flat, the other behind on its toes.',
    'A support beside you; a light weight in the hand of the lifted side once it is easy.',
  ],
  side: {
    stands: 'support',
    other: 'toes-behind',
    load: 'lifted',
    support: null,
    because: 'The front leg is the one that was stood on in the test.',
  },
  foot: 'Front foot on its three points, the heel never light.',
  cues: [
    'Straight down like a lift, the front knee over the second toe.',
    'Keep the pelvis turned towards the front leg on the way up.',
  ],
  dose: { sets: 3, repetitions: 8, holdSeconds: null, restSeconds: 90, daysPerWeek: 3 },
  easier: 'Half as deep, one hand on a wall.',
  harder: 'Lower behind, or a heavier weight.',
  goOnWhen: ['Three sets of eight to mid-thigh depth, both knees quiet.'],
  goBackWhen: ['The pelvis turns away from the front leg on the way up.'],
  notWith: DEEP_HIP,
  notWhen: ['Pain in front of the knee.'],
  source: COMMON_PRACTICE,
});
