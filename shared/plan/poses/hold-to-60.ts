import type { ExerciseDrawing } from '../figure/drawing.ts';

export const holdTo60: ExerciseDrawing = {
  label:
    'On the {support} leg beside a wall, a finger on it. First both feet down, then the {lifted} knee lifts to a mark on the wall at 60° and stays there.',
  positions: [
    {
      name: 'weight over first',
      pose: {
        hip: [2, 92],
        trunk: 1,
        near: { ankle: [0, 8] },
        far: { ankle: [10, 8] },
        nearArm: { hand: [57, 128], elbow: 'back' },
        farArm: { hand: [6, 86], elbow: 'back' },
      },
      props: [
        { kind: 'wall', at: 62 },
        { kind: 'mark', at: [62, 70], text: '60°' },
      ],
    },
    {
      name: 'hold',
      pose: {
        hip: [2, 92],
        trunk: 1,
        near: { ankle: [0, 8] },
        far: { ankle: [32, 30], foot: 8 },
        nearArm: { hand: [57, 128], elbow: 'back' },
        farArm: { hand: [6, 86], elbow: 'back' },
      },
      props: [
        { kind: 'wall', at: 62 },
        { kind: 'mark', at: [62, 70], text: '60°' },
      ],
      arrow: [
        [46, 34],
        [46, 54],
      ],
    },
  ],
};
