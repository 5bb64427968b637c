import { expect, it } from 'vitest';
import { floorMap } from './homography.ts';
import { framePoint } from './points.ts';

// computed; OpenCV's findHomography or a general linear solver gives the same
const pixels = [
  framePoint(528.889, 693.333),
  framePoint(751.111, 693.333),
  framePoint(730.909, 632.727),
  framePoint(549.091, 632.727),
];
const floor = [
  { x: -0.3, z: 2.7 },
  { x: 0.3, z: 2.7 },
  { x: 0.3, z: 3.3 },
  { x: -0.3, z: 3.3 },
];

it('lays a foot on the floor: 15.00° turned out, 0.260 m long', () => {
  const map = floorMap(pixels, floor);
  const heel = map?.(framePoint(656.3934, 655.082));
  const toe = map?.(framePoint(681.9074, 681.5596));
  if (!heel || !toe) throw new Error('the floor is not determined');
  const across = toe.x - heel.x;
  const towards = heel.z - toe.z;
  expect((Math.atan2(across, towards) * 180) / Math.PI).toBeCloseTo(15, 2);
  expect(Math.hypot(across, towards)).toBeCloseTo(0.26, 4);
});

it('gives back the four points it is made from', () => {
  const map = floorMap(pixels, floor);
  for (const [i, pixel] of pixels.entries()) {
    expect(map?.(pixel)?.x).toBeCloseTo(floor[i]?.x ?? NaN, 6);
    expect(map?.(pixel)?.z).toBeCloseTo(floor[i]?.z ?? NaN, 6);
  }
});

it('knows nothing at and above the horizon', () => {
  expect(floorMap(pixels, floor)?.(framePoint(640, 100))).toBeNull();
});

it('refuses points that do not determine a floor', () => {
  const inLine = [0, 1, 2, 3].map((i) => framePoint(100 * i, 500));
  expect(floorMap(inLine, floor)).toBeNull();
  expect(floorMap(pixels.slice(0, 3), floor)).toBeNull();
  expect(floorMap([...pixels.slice(0, 3), framePoint(NaN, 1)], floor)).toBeNull();
});
