import { expect, it } from 'vitest';
import { stagePoint } from '#shared/geometry/points.ts';
import { hitRadii } from './hit-radius.ts';

it('gives a lone mark a target of 44 px', () => {
  expect(hitRadii([stagePoint(10, 10)])).toEqual([22]);
});

it('shares the room between neighbours, down to a least size', () => {
  expect(hitRadii([stagePoint(0, 0), stagePoint(30, 0), stagePoint(34, 0)])).toEqual([15, 9, 9]);
});
