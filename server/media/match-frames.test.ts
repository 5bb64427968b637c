import { describe, expect, it } from 'vitest';
import { tableOf } from './frame-table.ts';
import { matchFrames } from './match-frames.ts';

const clock = { num: 1, den: 600 };
/** an MP4 copy counts on a multiple of the original's clock */
const copy = (...ticks: number[]) =>
  tableOf(
    ticks.map((tick) => tick * 32),
    { num: 1, den: 19200 },
  );
const promised = [100, 120, 141, 160, 180];

describe('decoded against promised frames', () => {
  it.each([
    ['all there', copy(0, 20, 41, 60, 80), { first: 0, lost: [] }],
    ['the end is lost', copy(0, 20, 41), { first: 0, lost: [3, 4] }],
    ['the middle is lost', copy(0, 20, 60, 80), { first: 0, lost: [2] }],
    ['the first frames are lost', copy(0, 19, 39), { first: 2, lost: [] }],
  ])('%s', (_, frames, match) => {
    expect(matchFrames(promised, clock, frames)).toEqual(match);
  });

  it.each([
    ['a frame one tick off', copy(0, 20, 40, 60, 80)],
    ['a frame that nobody promised', copy(0, 20, 41, 60, 80, 100)],
    ['a start that is not 0', copy(1, 21, 42, 61, 81)],
    ['an instant between two ticks', tableOf([0, 641], { num: 1, den: 19200 })],
    ['no frame', copy()],
  ])('%s matches nothing', (_, frames) => {
    expect(matchFrames(promised, clock, frames)).toBeNull();
  });
});
