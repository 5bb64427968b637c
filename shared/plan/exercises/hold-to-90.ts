import { DEEP_HIP, ONE_LEG } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const holdTo90 = exercise({
  id: 'hold-to-90',
  name: 'Single-leg hold to 90°',
  purpose: 'The hold carried past 60° to 90°, where the standing hip is to have turned in.',
  setUp: ['Beside a wall, marks at the heights that the knee has at 60° and at 90°.'],
  side: {
    stands: 'support',
    other: 'lifted',
    load: null,
    support: 'support',
    because: 'The same standing leg as in the test.',
  },
  foot: 'Three points, the toes quiet.',
  cues: [
    'Pause at the first mark, then go on to the second.',
    'Let the standing hip pocket deepen between the marks.',
    'Down with the same pauses.',
  ],
  dose: { sets: 3, repetitions: null, holdSeconds: 8, restSeconds: 60, daysPerWeek: 4 },
  easier: 'Go back to the hold to 60°.',
  harder: 'A light weight in the hand of the lifted side.',
  goOnWhen: ['Eight seconds at 90°, three times, without help.'],
  goBackWhen: ['The pelvis turns away before 90°, or the back leans.'],
  notWith: [...ONE_LEG, ...DEEP_HIP],
  notWhen: [],
  source: COMMON_PRACTICE,
});
