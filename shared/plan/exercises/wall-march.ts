import { DEEP_HIP, ONE_LEG } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const wallMarch = exercise({
  id: 'wall-march',
  name: 'Wall march',
  purpose: 'Keep the turned standing hip while leaning into a wall, as in the drive of a run.',
  setUp: ['Both hands on a wall at shoulder height, the body leaning as one line.'],
  side: {
    stands: 'support',
    other: 'lifted',
    load: null,
    support: 'both',
    because: 'Begin on the standing leg of the test; change legs only when the plan says so.',
  },
  foot: 'On the ball of the foot with the heel just off, pressed back and down.',
  cues: [
    'Lift the knee to 90° and hold for two breaths.',
    'Push the wall with the standing leg, not with the hands.',
    'The pelvis looks at the wall.',
  ],
  dose: { sets: 3, repetitions: 6, holdSeconds: null, restSeconds: 60, daysPerWeek: 3 },
  easier: 'Stand more upright.',
  harder: 'Change legs on one count.',
  goOnWhen: ['Three sets of six holds without the pelvis turning away.'],
  goBackWhen: ['The back hollows, or the standing heel drops.'],
  notWith: [...ONE_LEG, ...DEEP_HIP],
  notWhen: ['Pain in the tendon above the heel.'],
  source: COMMON_PRACTICE,
});
