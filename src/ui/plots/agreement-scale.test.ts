import { describe, expect, it } from 'vitest';
import { agreementScale, ticksIn } from './agreement-scale.ts';

describe('the scale of a plot of agreement', () => {
  it('has zero in the middle and all values inside', () => {
    const scale = agreementScale(600, 280, [-4, 12], [-9, 3]);
    expect(scale.y(0)).toBe((scale.top + scale.bottom) / 2);
    expect(scale.y(-9)).toBeLessThan(scale.bottom);
    expect(scale.y(3)).toBeGreaterThan(scale.top);
    expect(scale.x(-4)).toBeGreaterThan(scale.left);
    expect(scale.x(12)).toBeLessThan(scale.right);
    expect(scale.yTicks).toContain(0);
  });

  it('keeps a span where all values are one', () => {
    const scale = agreementScale(390, 240, [5, 5], [0]);
    expect(scale.x(5)).toBeCloseTo((scale.left + scale.right) / 2);
    expect(Number.isFinite(scale.y(0))).toBe(true);
    expect(scale.compact).toBe(true);
  });

  it('has at most seven round ticks', () => {
    expect(ticksIn(-1.2, 1.3)).toEqual([-1, -0.5, 0, 0.5, 1]);
    expect(ticksIn(-37, 41)).toEqual([-20, 0, 20, 40]);
    expect(ticksIn(0, 5000).length).toBeGreaterThan(0);
  });
});
