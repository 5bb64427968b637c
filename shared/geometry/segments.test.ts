import { expect, it } from 'vitest';
import { framePoint } from './points.ts';
import { fromHorizontal, jointAngle, jointAngleSpread } from './segments.ts';
import { degrees } from './units.ts';

// Winter, Biomechanics and Motor Control of Human Movement, table A.1, frame 1, cm with y up:
// thigh 82.80°, shank 39.32°, knee flexion 43.47° (second-hand, computed)
const hip = framePoint(44.94, -78.58);
const knee = framePoint(41.0, -47.4);
const ankle = framePoint(9.31, -21.44);

it('gives the thigh and shank of a published gait frame', () => {
  expect(fromHorizontal(knee, hip)).toBeCloseTo(82.8, 2);
  expect(fromHorizontal(ankle, knee)).toBeCloseTo(39.32, 2);
  expect(180 - (jointAngle(hip, knee, ankle) ?? NaN)).toBeCloseTo(43.47, 1);
});

it('reads a segment alike from both ends', () => {
  expect(fromHorizontal(hip, knee)).toBeCloseTo(fromHorizontal(knee, hip) ?? NaN, 9);
});

it('has no angle where points coincide', () => {
  expect(fromHorizontal(hip, hip)).toBeNull();
  expect(jointAngle(hip, hip, ankle)).toBeNull();
});

it('propagates 2 px on 300 and 250 px at a right angle to 0.844° (computed; Monte Carlo 0.845)', () => {
  expect(jointAngleSpread(300, 250, degrees(90), 2)).toBeCloseTo(0.844, 3);
});
