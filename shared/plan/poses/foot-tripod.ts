import type { ExerciseDrawing } from '../figure/drawing.ts';

export const footTripod: ExerciseDrawing = {
  label:
    'Somebody stands on both feet beside a chair, most of the weight on the {support} leg. Beside it the {support} foot from above with its three points: ball of the big toe, ball of the little toe, heel.',
  positions: [
    {
      name: 'weight over it',
      pose: {
        hip: [2, 92],
        trunk: 2,
        near: { ankle: [0, 8] },
        far: { ankle: [13, 8] },
        nearArm: { hand: [44, 96], elbow: 'back' },
        farArm: { hand: [8, 86] },
      },
      props: [{ kind: 'chair', at: 46 }],
    },
    { name: 'three points', sole: true },
  ],
};
