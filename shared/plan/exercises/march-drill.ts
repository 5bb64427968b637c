import { DEEP_HIP, ONE_LEG } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const marchDrill = exercise({
  id: 'march-drill',
  name: 'Marching drill',
  purpose: 'Step forward at a walk with the knee to 90° each time, so that the turn comes in time.',
  setUp: ['Ten metres of level floor.'],
  side: {
    stands: 'support',
    other: 'alternates',
    load: null,
    support: null,
    because: 'Both legs take turns; the coach watches the standing leg of the test.',
  },
  foot: 'Land on the whole foot under the hip.',
  cues: ['Tall, knee to 90°, pause, step.', 'Quiet landing.', 'The arms swing against the legs.'],
  dose: { sets: 4, repetitions: 10, holdSeconds: null, restSeconds: 60, daysPerWeek: 3 },
  easier: 'A pause on both feet between steps.',
  harder: 'A light weight overhead.',
  goOnWhen: ['Four times ten metres in one rhythm without a sway.'],
  goBackWhen: ['The trunk sways, or the steps cross.'],
  notWith: [...ONE_LEG, ...DEEP_HIP],
  notWhen: [],
  source: COMMON_PRACTICE,
});
