import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const footTripod = exercise({
  id: 'foot-tripod',
  name: 'Standing foot tripod',
  purpose:
    'Feel three points of the standing foot on the floor, and keep them while the weight comes over that leg.',
  setUp: [
    'Bare feet beside a wall or a heavy chair, feet under the hips.',
    'Shift two thirds of the weight onto the standing leg; the other foot rests lightly on the floor.',
  ],
  side: {
    stands: 'support',
    other: 'on-floor',
    load: null,
    support: 'support',
    because: 'The standing foot of the side that was tested is the one to be learnt.',
  },
  foot: 'Ball of the big toe, ball of the little toe and heel press alike; the toes stay long and do not claw.',
  cues: [
    'Draw the arch up without lifting the big toe.',
    'Let the knee look over the second toe.',
    'Turn the pelvis slowly towards the standing leg and back, over a still foot.',
  ],
  dose: { sets: 2, repetitions: null, holdSeconds: 30, restSeconds: 30, daysPerWeek: 6 },
  easier: 'Sit, the foot flat under the knee, and press the three points.',
  harder: 'Lift the other heel, then the other foot, for a breath.',
  goOnWhen: ['Thirty seconds with the three points kept, twice, without holding on.'],
  goBackWhen: ['The big toe lifts or the arch cramps.'],
  notWith: [],
  notWhen: ['A wound, a fresh sprain or an ulcer on the foot.'],
  source: COMMON_PRACTICE,
});
