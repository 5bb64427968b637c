import type { ExerciseDrawing } from '../figure/drawing.ts';

export const wallMarch: ExerciseDrawing = {
  label:
    'Leaning into a wall as one line, both hands on it, on the ball of the {support} foot. Then the {lifted} knee lifts to 90° and stays for two breaths.',
  positions: [
    {
      name: 'one line',
      pose: {
        hip: [2, 82],
        trunk: 28,
        near: { ankle: [-38, 14], foot: 25 },
        far: { ankle: [-26, 14], foot: 25 },
        nearArm: { hand: [67, 120], elbow: 'back' },
        farArm: { hand: [67, 124], elbow: 'back' },
      },
      props: [{ kind: 'wall', at: 72 }],
    },
    {
      name: 'knee to 90°',
      pose: {
        hip: [2, 82],
        trunk: 28,
        near: { ankle: [-38, 14], foot: 25 },
        far: { ankle: [22, 26], foot: 15 },
        nearArm: { hand: [67, 120], elbow: 'back' },
        farArm: { hand: [67, 124], elbow: 'back' },
      },
      props: [{ kind: 'wall', at: 72 }],
      arrow: [
        [52, 26],
        [52, 46],
      ],
    },
  ],
};
