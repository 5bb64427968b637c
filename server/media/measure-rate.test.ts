import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measureRate, typicalRate } from './measure-rate.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const at = (count: number, interval: number) =>
  Array.from({ length: count }, (_, frame) => Math.round(frame * interval));

describe('the measured frame rate', () => {
  it.each([
    [at(120, 512), 15360, { numerator: 30, denominator: 1 }],
    [at(120, 3003), 90000, { numerator: 30000, denominator: 1001 }],
    [at(300, 2.5), 600, { numerator: 240, denominator: 1 }],
    // whole milliseconds: 0, 33, 67, 100, …
    [at(90, 1000 / 30), 1000, { numerator: 30, denominator: 1 }],
    [at(500, (1001 / 60000) * 1000), 1000, { numerator: 60000, denominator: 1001 }],
    // a rate of nobody's: the mean, exact
    [at(20, 7), 100, { numerator: 100, denominator: 7 }],
  ])('is constant where one rate explains every instant', (ticks, den, rate) => {
    expect(measureRate(ticks, { num: 1, den })).toEqual({ kind: 'constant', rate });
  });

  it('varies where no rate does, with the longest, median and shortest distance', () => {
    const rate = measureRate([0, 33, 66, 99, 149, 174], { num: 1, den: 1000 });
    expect(rate).toEqual({ kind: 'variable', min: 20, median: 1000 / 33, max: 40 });
    expect(typicalRate(rate)).toBe(1000 / 33);
  });

  it('calls one dropped frame variable', () => {
    const ticks = at(60, 512).filter((_, frame) => frame !== 30);
    expect(measureRate(ticks, { num: 1, den: 15360 }).kind).toBe('variable');
  });

  it('does not depend on where the clock starts', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 5000 }), { minLength: 1, maxLength: 60 }),
        fc.integer({ min: -1e9, max: 1e9 }),
        (gaps, start) => {
          const ticks = gaps.reduce((all, gap) => [...all, (all.at(-1) ?? 0) + gap], [0]);
          const timeBase = { num: 1, den: 90000 };
          expect(
            measureRate(
              ticks.map((tick) => tick + start),
              timeBase,
            ),
          ).toEqual(measureRate(ticks, timeBase));
        },
      ),
    );
  });

  it('is not made up for a single frame', () => {
    expect(() => measureRate([0], { num: 1, den: 600 })).toThrow(RangeError);
  });
});
