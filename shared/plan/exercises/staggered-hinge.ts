import { DEEP_HIP } from '../cautions.ts';
import { COMMON_PRACTICE, exercise } from '../exercise.ts';

export const staggeredHinge = exercise({
  id: 'staggered-hinge',
  name: 'Staggered-stance hinge, load on one side',
  purpose:
    'The same turn of the pelvis over the standing leg with a weight that asks for it, the other foot helping.',
  setUp: [
    'Feet a foot’s length apart front to back; the standing leg in front and flat, the other on its toes.',
    'A light weight (2 to 6 kg) in the hand of the lifted side.',
  ],
  side: {
    stands: 'support',
    other: 'toes-behind',
    load: 'lifted',
    support: null,
    because:
      'A weight in the hand of the other side draws the pelvis towards the standing leg, which is the turn to be practised.',
  },
  foot: 'Eight tenths of the weight on the flat foot, on its three points.',
  cues: [
    'Send the weight down along the inside of the front shin.',
    'Let the pelvis turn over the front leg, the ribs follow.',
    'Stand up tall before the next.',
  ],
  dose: { sets: 3, repetitions: 8, holdSeconds: null, restSeconds: 75, daysPerWeek: 3 },
  easier: 'Without the weight, one hand on a wall.',
  harder: 'A heavier weight, or the back foot barely touching.',
  goOnWhen: ['Three sets of eight with 6 kg, the back foot light.'],
  goBackWhen: ['The front knee falls in, or the weight is swung.'],
  notWith: DEEP_HIP,
  notWhen: ['Back pain when bending or lifting.'],
  source: COMMON_PRACTICE,
});
