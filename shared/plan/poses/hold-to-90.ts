import type { ExerciseDrawing } from '../figure/drawing.ts';

export const holdTo90: ExerciseDrawing = {
  label:
    'On the {support} leg beside a wall, a finger on it. The {lifted} knee pauses at a mark at 60°, then goes on to a mark at 90°, the thigh level, and stays there.',
  positions: [
    {
      name: 'pause at 60°',
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
        { kind: 'mark', at: [62, 92], text: '90°' },
      ],
    },
    {
      name: 'hold at 90°',
      pose: {
        hip: [2, 92],
        trunk: 1,
        near: { ankle: [0, 8] },
        far: { ankle: [38, 51], foot: 8 },
        nearArm: { hand: [57, 128], elbow: 'back' },
        farArm: { hand: [6, 86], elbow: 'back' },
      },
      props: [
        { kind: 'wall', at: 62 },
        { kind: 'mark', at: [62, 70], text: '60°' },
        { kind: 'mark', at: [62, 92], text: '90°' },
      ],
    },
  ],
};
