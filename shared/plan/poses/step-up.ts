import type { ExerciseDrawing } from '../figure/drawing.ts';

export const stepUp: ExerciseDrawing = {
  label:
    'The whole {support} foot on a low step, a rail beside it, a weight in the {lifted} hand. Then up onto the {support} leg, the {lifted} knee lifting to 90° at the top.',
  scale: 0.78,
  positions: [
    {
      name: 'push',
      pose: {
        hip: [-24, 84],
        trunk: 14,
        near: { ankle: [2, 26] },
        far: { ankle: [-38, 10], foot: 12 },
        nearArm: { hand: [16, 112], elbow: 'back' },
        farArm: { hand: [14, 140], elbow: 'back' },
      },
      load: 'far',
      props: [
        { kind: 'step', from: -14, to: 44, height: 18 },
        { kind: 'rail', from: [-64, 94], to: [64, 126] },
      ],
      arrow: [
        [-54, 100],
        [-54, 124],
      ],
    },
    {
      name: 'knee to 90°',
      pose: {
        hip: [4, 110],
        trunk: 1,
        near: { ankle: [2, 26] },
        far: { ankle: [42, 68], foot: 8 },
        nearArm: { hand: [44, 122], elbow: 'back' },
        farArm: { hand: [28, 156], elbow: 'back' },
      },
      load: 'far',
      props: [
        { kind: 'step', from: -14, to: 44, height: 18 },
        { kind: 'rail', from: [-64, 94], to: [64, 126] },
      ],
    },
  ],
};
