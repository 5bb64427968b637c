import type { ExerciseDrawing } from '../figure/drawing.ts';

export const marchDrill: ExerciseDrawing = {
  label:
    'Marching: on the {support} leg with the {lifted} knee at 90°, the arms swinging against the legs; then a step forward onto the {lifted} leg with the {support} knee at 90°.',
  positions: [
    {
      name: 'tall, pause',
      pose: {
        hip: [-10, 92],
        trunk: 2,
        near: { ankle: [-12, 8] },
        far: { ankle: [28, 51], foot: 5 },
        nearArm: { hand: [22, 128], elbow: 'back' },
        farArm: { hand: [-26, 100], elbow: 'back' },
      },
      arrow: [
        [44, 34],
        [62, 34],
      ],
    },
    {
      name: 'step, pause',
      pose: {
        hip: [-4, 92],
        trunk: 2,
        near: { ankle: [34, 51], foot: 5 },
        far: { ankle: [-6, 8] },
        nearArm: { hand: [-22, 100], elbow: 'back' },
        farArm: { hand: [28, 128], elbow: 'back' },
      },
      arrow: [
        [50, 34],
        [68, 34],
      ],
    },
  ],
};
