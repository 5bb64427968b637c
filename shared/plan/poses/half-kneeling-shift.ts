import type { ExerciseDrawing } from '../figure/drawing.ts';

export const halfKneelingShift: ExerciseDrawing = {
  label:
    'Half kneeling: the {lifted} knee down on a cushion, the {support} foot flat in front, the {lifted} hand on a stick. Then the pelvis shifts forward over the {support} leg while the trunk stays tall.',
  positions: [
    {
      name: 'tall',
      pose: {
        hip: [-12, 62],
        trunk: 0,
        near: { ankle: [26, 8] },
        far: { ankle: [-52, 12], foot: 165 },
        nearArm: { hand: [-10, 68], elbow: 'back' },
        farArm: { hand: [34, 88], elbow: 'back' },
      },
      props: [
        { kind: 'cushion', at: -12 },
        { kind: 'stick', at: 36, height: 112 },
      ],
    },
    {
      name: 'shift',
      pose: {
        hip: [2, 60],
        trunk: 0,
        near: { ankle: [26, 8] },
        far: { ankle: [-50, 12], foot: 165 },
        nearArm: { hand: [4, 66], elbow: 'back' },
        farArm: { hand: [34, 88], elbow: 'back' },
      },
      props: [
        { kind: 'cushion', at: -12 },
        { kind: 'stick', at: 36, height: 112 },
      ],
      arrow: [
        [-30, 64],
        [-12, 64],
      ],
    },
  ],
};
