import { IMPACT } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const skipDrill = exercise({
  id: 'skip-drill',
  name: 'Skipping drill',
  purpose: 'The march with a small hop: the standing hip turns in at speed.',
  setUp: ['Twenty metres of even, springy ground.'],
  side: {
    stands: 'support',
    other: 'alternates',
    load: null,
    support: null,
    because: 'Both legs take turns; the coach watches the standing leg of the test.',
  },
  foot: 'Short contact on the ball of the foot, heel kissing the floor.',
  cues: ['Low and quick before high.', 'Knee up, toe up.', 'Land under the hip.'],
  dose: { sets: 4, repetitions: 10, holdSeconds: null, restSeconds: 90, daysPerWeek: 2 },
  easier: 'The marching drill.',
  harder: 'For height, then for length.',
  goOnWhen: ['Four times twenty metres, even from side to side.'],
  goBackWhen: ['Pain on landing, or one side skips flatter.'],
  notWith: IMPACT,
  notWhen: ['Pain of a bone that grows with loading: rest and have it looked at.'],
  source: COMMON_PRACTICE,
});
