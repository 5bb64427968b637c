import { expect, it } from 'vitest';
import { stagePoint } from '#shared/geometry/points.ts';
import { hitRadii } from './hit-radius.ts';

it('gives a lone mark a target of 44 px', () => {
  expect(hitRadii([stagePoint(10, 10)], false)).toEqual([22]);
});

it('shares the room between neighbours, down to a least size', () => {
  const marks = [stagePoint(0, 0), stagePoint(30, 0), stagePoint(34, 0)];
  expect(hitRadii(marks, false)).toEqual([15, 9, 9]);
});

it('leaves the room beside a mark to the landmark asked for', () => {
  expect(hitRadii([stagePoint(0, 0), stagePoint(90, 0)], true)).toEqual([8, 8]);
});
