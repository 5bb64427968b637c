import type { ExerciseDrawing } from '../figure/drawing.ts';

export const splitSquat: ExerciseDrawing = {
  label:
    'A long step, the {support} foot flat in front, the {lifted} toes behind, a weight in the {lifted} hand, a chair within reach. Then straight down until the {support} thigh is nearly level, and up again.',
  positions: [
    {
      name: 'up',
      pose: {
        hip: [-10, 80],
        trunk: 4,
        near: { ankle: [20, 8] },
        far: { ankle: [-46, 16], foot: 45 },
        nearArm: { hand: [-12, 88], elbow: 'back' },
        farArm: { hand: [15, 124], elbow: 'back' },
      },
      load: 'far',
      props: [{ kind: 'chair', at: 56 }],
    },
    {
      name: 'down',
      pose: {
        hip: [-12, 50],
        trunk: 6,
        near: { ankle: [20, 8] },
        far: { ankle: [-48, 20], foot: 65 },
        nearArm: { hand: [-14, 58], elbow: 'back' },
        farArm: { hand: [14, 94], elbow: 'back' },
      },
      load: 'far',
      props: [{ kind: 'chair', at: 56 }],
      arrow: [
        [-52, 86],
        [-52, 64],
      ],
    },
  ],
};
