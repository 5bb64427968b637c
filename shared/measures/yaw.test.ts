import { expect, it } from 'vitest';
import { rotateAbout } from '#shared/geometry/points.ts';
import { degrees, toDegrees } from '#shared/geometry/units.ts';
import { bellHipCentre, harringtonHipCentre, hipCentre, hipMiddle } from './hip-centre.ts';
import { turnFromWidth, yaw } from './yaw.ts';

const FAR = 1e9;

it('reads a knee-cap 10 mm off the middle of a 50 mm knee as 11.54°, 12.94 mm as 15.00° (definition)', () => {
  expect(toDegrees(yaw(0, 10, 50, FAR, 0))).toBeCloseTo(11.54, 2);
  expect(toDegrees(yaw(0, 12.94, 50, FAR, 0))).toBeCloseTo(15.0, 2);
  expect(toDegrees(yaw(0, -10, 50, FAR, 0))).toBeCloseTo(-11.54, 2);
});

it('does not see a turn in a stick that points at the lens from beside the axis', () => {
  // 130 mm stick parallel to the axis, 300 mm beside it, 3 m away, focal 1500 px
  const far = (1500 * 300) / 3000;
  const near = (1500 * 300) / (3000 - 130);
  expect(toDegrees(yaw(far, near, (1500 * 130) / 3000, 1500, 0))).toBeCloseTo(0, 1);
});

it('stays a number where marks lie further apart than the stick is long', () => {
  expect(toDegrees(yaw(0, 500, 50, FAR, 0))).toBeCloseTo(78.52, 2);
});

it('takes the size of a turn from a width and never its sign (definition)', () => {
  expect(toDegrees(turnFromWidth(0.866025, 1)?.size ?? yaw(0, 0, 1, 1, 0))).toBeCloseTo(30, 3);
  expect(toDegrees(turnFromWidth(0.99, 1)?.size ?? yaw(0, 0, 1, 1, 0))).toBeCloseTo(8.11, 2);
  expect(turnFromWidth(1.2, 1)).toEqual({ size: 0, wider: true });
  expect(turnFromWidth(1, 0)).toBeNull();
  expect(turnFromWidth(NaN, 1)).toBeNull();
});

it('gives the published hip centres', () => {
  // Harrington et al. 2007, J Biomech 40:595–602, width 238, depth 150 (formula second-hand)
  const harrington = harringtonHipCentre(238, 150);
  expect(harrington.behind).toBeCloseTo(45.9, 6);
  expect(harrington.below).toBeCloseTo(82.3, 6);
  expect(harrington.outward).toBeCloseTo(85.84, 6);
  // Bell et al. 1989, 22 % behind, 30 % below, 14 % inward (seen)
  const bell = bellHipCentre(238);
  expect(bell.behind).toBeCloseTo(52.36, 6);
  expect(bell.below).toBeCloseTo(71.4, 6);
  expect(bell.inward).toBeCloseTo(33.32, 6);
});

it('puts hip centres inward and below on both sides, however the pelvis leans', () => {
  const left = { u: 600, v: 500 };
  const right = { u: 500, v: 500 };
  expect(hipCentre(right, left, 100)).toEqual({ u: 514, v: 534.5 });
  expect(hipCentre(left, right, 100)).toEqual({ u: 586, v: 534.5 });
  expect(hipMiddle(left, right, 100)).toEqual({ u: 550, v: 534.5 });
  const raised = hipCentre({ u: 500, v: 480 }, left, 100);
  const level = hipCentre(right, left, 100);
  expect(raised.v).toBeLessThan(level.v);
});

it.each([-60, -15, 15, 60])(
  'turns hip centres with a pelvis that leans by %d° in the picture',
  (by) => {
    const left = { u: 600, v: 500 };
    const right = { u: 500, v: 500 };
    const about = { u: 540, v: 960 };
    const lean = (point: typeof left) => rotateAbout(point, about, degrees(by));
    for (const [own, other] of [
      [left, right],
      [right, left],
    ] as const) {
      const expected = lean(hipCentre(own, other, 100));
      const found = hipCentre(lean(own), lean(other), 100);
      expect(found.u).toBeCloseTo(expected.u, 9);
      expect(found.v).toBeCloseTo(expected.v, 9);
    }
    const middle = lean(hipMiddle(left, right, 100));
    expect(hipMiddle(lean(left), lean(right), 100).u).toBeCloseTo(middle.u, 9);
    expect(hipMiddle(lean(left), lean(right), 100).v).toBeCloseTo(middle.v, 9);
  },
);
