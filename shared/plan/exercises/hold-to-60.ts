import { ONE_LEG } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const holdTo60 = exercise({
  id: 'hold-to-60',
  name: 'Single-leg hold to 60°',
  purpose:
    'Stand on one leg and stop the lifted thigh at 60°, the pelvis turned towards the standing leg.',
  setUp: [
    'Beside a wall; a finger on it counts as help and is allowed.',
    'A mark on the wall at the height that the knee has at 60°.',
  ],
  side: {
    stands: 'support',
    other: 'lifted',
    load: null,
    support: 'support',
    because: 'The same standing leg as in the test.',
  },
  foot: 'Three points before the other foot leaves the floor, and until it is back.',
  cues: [
    'Weight over first, then lift.',
    'Knee to the mark, pause, and down as slowly as up.',
    'The belt buckle looks a little towards the standing leg.',
  ],
  dose: { sets: 3, repetitions: null, holdSeconds: 10, restSeconds: 45, daysPerWeek: 5 },
  easier: 'The toes of the lifted foot on a low step.',
  harder: 'Eyes follow a thumb from side to side.',
  goOnWhen: ['Ten seconds at the mark, three times, without help.'],
  goBackWhen: ['The trunk leans, or the standing foot turns.'],
  notWith: ONE_LEG,
  notWhen: [],
  source: COMMON_PRACTICE,
});
