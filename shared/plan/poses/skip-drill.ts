import type { ExerciseDrawing } from '../figure/drawing.ts';

export const skipDrill: ExerciseDrawing = {
  label:
    'Skipping: on the ball of the {support} foot with the {lifted} knee coming up, then a small hop off the {support} foot with the {lifted} knee at 90°.',
  scale: 0.8,
  positions: [
    {
      name: 'short contact',
      pose: {
        hip: [-8, 90],
        trunk: 5,
        near: { ankle: [-12, 12], foot: 18 },
        far: { ankle: [12, 40], foot: 10 },
        nearArm: { hand: [20, 120], elbow: 'back' },
        farArm: { hand: [-24, 102], elbow: 'back' },
      },
    },
    {
      name: 'small hop',
      pose: {
        hip: [-6, 112],
        trunk: 2,
        near: { ankle: [-14, 30], foot: 60 },
        far: { ankle: [32, 71], foot: 0 },
        nearArm: { hand: [26, 150], elbow: 'back' },
        farArm: { hand: [-24, 122], elbow: 'back' },
      },
      arrow: [
        [54, 40],
        [54, 66],
      ],
    },
  ],
};
