import type { ExerciseDrawing } from '../figure/drawing.ts';

export const staggeredHinge: ExerciseDrawing = {
  label:
    'The {support} foot flat in front, the {lifted} toes behind, a weight in the {lifted} hand. First upright, then the hip goes back and the weight comes down along the inside of the {support} shin.',
  positions: [
    {
      name: 'tall',
      pose: {
        hip: [-2, 90],
        trunk: 4,
        near: { ankle: [4, 8] },
        far: { ankle: [-26, 15], foot: 35 },
        nearArm: { hand: [-4, 98], elbow: 'back' },
        farArm: { hand: [23, 88], elbow: 'back' },
      },
      load: 'far',
    },
    {
      name: 'hip back',
      pose: {
        hip: [-26, 82],
        trunk: 62,
        near: { ankle: [4, 8] },
        far: { ankle: [-38, 15], foot: 35 },
        nearArm: { hand: [-20, 92], elbow: 'back' },
        farArm: { hand: [30, 50], elbow: 'back' },
      },
      load: 'far',
      arrow: [
        [-42, 90],
        [-64, 90],
      ],
    },
  ],
};
