import { DEEP_HIP } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const halfKneelingShift = exercise({
  id: 'half-kneeling-shift',
  name: 'Half-kneeling shift',
  purpose:
    'Turn the pelvis over the standing hip with one knee down, so that balance is no longer the hard part.',
  setUp: [
    'One knee down on a cushion, the standing leg in front, shin upright.',
    'A wall or a stick at the side of the knee that is down.',
  ],
  side: {
    stands: 'support',
    other: 'knee-down',
    load: null,
    support: 'lifted',
    because: 'The front leg is the one that was stood on in the test.',
  },
  foot: 'The front foot keeps its three points; the shin does not tip outwards.',
  cues: [
    'Shift the pelvis forwards and towards the front leg as one piece.',
    'Let the front hip pocket deepen.',
    'Stay tall: the ribs above the pelvis.',
  ],
  dose: { sets: 2, repetitions: 8, holdSeconds: null, restSeconds: 45, daysPerWeek: 5 },
  easier: 'Both hands on a chair in front.',
  harder: 'Lift the hand, then reach it across towards the front leg.',
  goOnWhen: ['Eight slow shifts with the front foot quiet, twice.'],
  goBackWhen: ['The front knee falls in, or pain on the knee that is down.'],
  notWith: ['recent-surgery-or-fracture', ...DEEP_HIP],
  notWhen: ['Pain from kneeling: use more cushions, or the staggered stance instead.'],
  source: COMMON_PRACTICE,
});
