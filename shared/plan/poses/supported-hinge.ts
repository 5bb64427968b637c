import type { ExerciseDrawing } from '../figure/drawing.ts';

export const supportedHinge: ExerciseDrawing = {
  label:
    'Both hands on a wall. First upright on the {support} leg, the toes of the {lifted} foot behind. Then the hip is pushed back over the {support} leg and the trunk bends forward, the hands still on the wall.',
  positions: [
    {
      name: 'tall',
      pose: {
        hip: [-3, 91],
        trunk: 6,
        near: { ankle: [-6, 8] },
        far: { ankle: [-32, 15], foot: 35 },
        nearArm: { hand: [59, 122], elbow: 'back' },
        farArm: { hand: [59, 126], elbow: 'back' },
      },
      props: [{ kind: 'wall', at: 64 }],
    },
    {
      name: 'hip back',
      pose: {
        hip: [-36, 82],
        trunk: 62,
        near: { ankle: [-6, 8] },
        far: { ankle: [-48, 15], foot: 35 },
        nearArm: { hand: [59, 106], elbow: 'back' },
        farArm: { hand: [59, 110], elbow: 'back' },
      },
      props: [{ kind: 'wall', at: 64 }],
      arrow: [
        [-52, 90],
        [-74, 90],
      ],
    },
  ],
};
