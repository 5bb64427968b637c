import { Euler, Matrix4 } from 'three';
import { describe, expect, it } from 'vitest';
import { type Rotation, rightHipAngles } from './joint-rotation.ts';

// Wu et al. 2002, J Biomech 35:543–548; Grood & Suntay 1983, J Biomech Eng 105:136–144 (computed)
const cases: readonly (readonly [Rotation, readonly [number, number, number]])[] = [
  [
    [
      [0.870297, -0.492404, 0.011015],
      [0.484991, 0.852869, -0.193389],
      [0.085832, 0.173648, 0.98106],
    ],
    [30, 10, -5],
  ],
  [
    [
      [0.01213, -0.996195, -0.086308],
      [0.990268, 0, 0.139173],
      [-0.138644, -0.087156, 0.9865],
    ],
    [90, -5, 8],
  ],
];

describe.each(cases)('a right hip', (matrix, [flexion, adduction, internal]) => {
  it(`is read as flexion ${flexion}, adduction ${adduction}, internal rotation ${internal}`, () => {
    const angles = rightHipAngles(matrix);
    expect(angles.flexion).toBeCloseTo(flexion, 3);
    expect(angles.adduction).toBeCloseTo(adduction, 3);
    expect(angles.internalRotation).toBeCloseTo(internal, 3);
  });

  it('comes from the matrix another package builds for these angles', () => {
    const rad = Math.PI / 180;
    const euler = new Euler(adduction * rad, internal * rad, flexion * rad, 'ZXY');
    const e = new Matrix4().makeRotationFromEuler(euler).elements;
    const rows = [0, 1, 2].map((i) => [e[i], e[i + 4], e[i + 8]]);
    for (const [i, row] of rows.entries())
      for (const [j, value] of row.entries()) expect(value).toBeCloseTo(matrix[i]?.[j] ?? NaN, 5);
  });
});
