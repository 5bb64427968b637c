import type { ExerciseDrawing } from '../figure/drawing.ts';

export const singleLegHinge: ExerciseDrawing = {
  label:
    'On the {support} leg alone, a weight in the {lifted} hand, the {support} hand on a wall. Then the hip goes back, the trunk bends forward and the {lifted} leg goes back in line with it.',
  positions: [
    {
      name: 'tall',
      pose: {
        hip: [2, 92],
        trunk: 3,
        near: { ankle: [0, 8] },
        far: { ankle: [-16, 18], foot: 20 },
        nearArm: { hand: [57, 126], elbow: 'back' },
        farArm: { hand: [21, 88], elbow: 'back' },
      },
      load: 'far',
      props: [{ kind: 'wall', at: 62 }],
    },
    {
      name: 'hip back',
      pose: {
        hip: [-26, 84],
        trunk: 62,
        near: { ankle: [-4, 8] },
        far: { ankle: [-72, 38], foot: 60 },
        nearArm: { hand: [57, 104], elbow: 'back' },
        farArm: { hand: [22, 52], elbow: 'back' },
      },
      load: 'far',
      props: [{ kind: 'wall', at: 62 }],
      arrow: [
        [-46, 98],
        [-66, 98],
      ],
    },
  ],
};
