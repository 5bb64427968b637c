import { describe, expect, it } from 'vitest';
import { CLIPS } from '../clips.ts';
import { makeTake } from '../model/take.ts';
import { phoneTick } from './timing.ts';

const clip = (name: string) => {
  const found = CLIPS.find((plan) => plan.name === name);
  if (found === undefined) throw new Error(`no clip ${name}`);
  return makeTake(found).timesMs;
};
const gaps = (times: readonly number[]): number[] =>
  times.slice(1).map((time, index) => time - (times[index] ?? NaN));

describe('the phone’s clock', () => {
  it('starts at nothing, always runs on, and is rarely even', () => {
    expect(phoneTick(0)).toBe(0);
    const steps = gaps(Array.from({ length: 900 }, (_, index) => phoneTick(index)));
    expect(Math.min(...steps)).toBeGreaterThan(0);
    expect(new Set(steps).size).toBeGreaterThan(3);
  });

  it('loses single pictures and two or three in a row', () => {
    const steps = gaps(clip('right-early'));
    expect(steps.filter((step) => step > 30)).not.toHaveLength(0);
    expect(Math.max(...steps)).toBeGreaterThan(28);
    expect(steps.filter((step) => step > 25).length).toBeLessThan(10);
  });
});

describe('the other clips', () => {
  it.each([
    ['left-expected', 1e-6],
    ['both-sides', 1e-6],
    // whole milliseconds: 33 or 34
    ['bare-still', 1],
  ])('%s runs evenly', (name, most) => {
    const steps = gaps(clip(name));
    expect(Math.max(...steps) - Math.min(...steps)).toBeLessThanOrEqual(most);
  });
});
