import { DEEP_HIP } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const lyingKneeLift = exercise({
  id: 'lying-knee-lift',
  name: 'Knee lift lying on the back',
  purpose:
    'Lift the thigh through 60° and 90° without standing, so that the lift itself is free before it is loaded.',
  setUp: [
    'On the back, both knees bent, feet flat.',
    'A rolled towel under the small of the back if that is comfortable.',
  ],
  side: {
    stands: 'support',
    other: 'lifted',
    load: null,
    support: null,
    because:
      'The lifted leg of the test is the one that lifts; the other presses its foot into the floor as it will when standing.',
  },
  foot: 'The resting foot presses its three points into the floor.',
  cues: [
    'Lift the knee towards the chest, slowly, without the pelvis rocking.',
    'Stop at 60°, stop at 90°, and come back as slowly.',
  ],
  dose: { sets: 2, repetitions: 10, holdSeconds: null, restSeconds: 30, daysPerWeek: 6 },
  easier: 'Slide the heel along the floor instead of lifting it.',
  harder: 'A loop band around both feet.',
  goOnWhen: ['Ten lifts past 90° with the pelvis still.'],
  goBackWhen: ['A pinch in the groin at the top.'],
  notWith: DEEP_HIP,
  notWhen: ['A pinch in the groin that stays.'],
  source: COMMON_PRACTICE,
});
