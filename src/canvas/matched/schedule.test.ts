import { expect, it } from 'vitest';
import type { Matched } from '#shared/course/match-lifts.ts';
import { degrees } from '#shared/geometry/units.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { scheduleOf } from './schedule.ts';

const moment = (first: number, second: number, part: Matched['part'] = 'rise'): Matched => ({
  part,
  first: { frame: frameIndex(first), lift: degrees(60) },
  second: { frame: frameIndex(second), lift: degrees(60) },
});
const times = (every: number) => Array.from({ length: 100 }, (_, n) => milliseconds(n * every));

it('runs on the mean of both clocks, always forward, without a long pause at the top', () => {
  const moments = [moment(0, 0), moment(1, 0), moment(2, 1), moment(2, 1), moment(60, 40, 'fall')];
  expect(scheduleOf(moments, times(10), times(20))).toEqual([0, 5, 20, 21, 221]);
});

it('has nothing to say of nothing', () => {
  expect(scheduleOf([], times(10), times(10))).toEqual([]);
});
