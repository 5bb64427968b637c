import { expect, it } from 'vitest';
import { framePoint, meanPoint, midpoint, plumbTilt, rotateAbout } from './points.ts';
import { degrees, radians, toDegrees, toRadians } from './units.ts';

it('keeps an angle through both units', () => {
  expect(toDegrees(radians(Math.PI / 3))).toBeCloseTo(60, 12);
  expect(toDegrees(toRadians(degrees(-17.3)))).toBeCloseTo(-17.3, 12);
});

it('has no mean of no points', () => {
  expect(meanPoint([])).toBeNull();
  expect(meanPoint([framePoint(0, 2), framePoint(4, 0)])).toEqual(framePoint(2, 1));
  expect(midpoint(framePoint(0, 2), framePoint(4, 0))).toEqual(framePoint(2, 1));
});

it('makes a leaning plumb line vertical when all is rotated by its lean', () => {
  const top = framePoint(500, 200);
  const bottom = framePoint(540, 1200);
  const lean = plumbTilt(top, bottom);
  expect(lean).toBeCloseTo(2.2906, 4);
  expect(plumbTilt(bottom, top)).toBeCloseTo(2.2906, 4);
  const centre = framePoint(540, 960);
  const a = rotateAbout(top, centre, lean ?? degrees(0));
  const b = rotateAbout(bottom, centre, lean ?? degrees(0));
  expect(a.u).toBeCloseTo(b.u, 9);
  expect(b.v - a.v).toBeCloseTo(Math.hypot(40, 1000), 9);
});

it('does not know the lean of a single point', () => {
  expect(plumbTilt(framePoint(3, 3), framePoint(3, 3))).toBeNull();
});
