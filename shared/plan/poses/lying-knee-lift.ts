import type { ExerciseDrawing } from '../figure/drawing.ts';

export const lyingKneeLift: ExerciseDrawing = {
  label:
    'On the back, both knees bent, feet flat, a towel under the small of the back. Then the {lifted} knee lifts towards the chest while the {support} foot presses into the floor.',
  positions: [
    {
      name: 'feet flat',
      pose: {
        hip: [4, 12],
        trunk: -90,
        near: { ankle: [50, 8] },
        far: { ankle: [57, 8] },
        nearArm: { hand: [8, 5], elbow: 'front' },
        farArm: { hand: [8, 7], elbow: 'front' },
      },
      props: [{ kind: 'towel', at: -18 }],
    },
    {
      name: 'knee up',
      pose: {
        hip: [4, 12],
        trunk: -90,
        near: { ankle: [50, 8] },
        far: { ankle: [36, 60], foot: 15 },
        nearArm: { hand: [8, 5], elbow: 'front' },
        farArm: { hand: [8, 7], elbow: 'front' },
      },
      props: [{ kind: 'towel', at: -18 }],
      arrow: [
        [14, 72],
        [-6, 72],
      ],
    },
  ],
};
