import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { distanceEffect, lensEffect, plumbEffect, pointersEffect, scaleEffect } from './effect.ts';

describe('what the set-up makes measurable', () => {
  it('scale from a rod', () => {
    const scale = {
      from: 'rod' as const,
      a: framePoint(100, 100),
      b: framePoint(100, 600),
      lengthMm: 1000,
    };
    expect(scaleEffect(scale)).toEqual({ text: '2.00 mm per pixel', kind: 'done' });
    expect(scaleEffect({ ...scale, lengthMm: 2000 }).kind).toBe('wait');
    expect(scaleEffect({ ...scale, b: scale.a }).kind).toBe('bad');
    expect(scaleEffect(null).kind).toBe('bad');
  });

  it('distance and lens height', () => {
    expect(distanceEffect(null).kind).toBe('bad');
    expect(distanceEffect(1500).kind).toBe('wait');
    expect(distanceEffect(3000)).toEqual({ text: '3.00 m', kind: 'done' });
    expect(lensEffect(null).text).toContain('± 7°');
    expect(lensEffect(950).text).toContain('± 2°');
  });

  it('pointers', () => {
    const text = (belt: number | null, thigh: number | null) =>
      pointersEffect({ beltPointerMm: belt, thighPointerMm: thigh }).text;
    expect(text(null, 120)).toContain('16°');
    expect(text(140, null)).toContain('13.5°');
    expect(text(140, 120)).toContain('5.5°');
  });

  it('plumb line', () => {
    expect(plumbEffect(null).kind).toBe('done');
    const leaning = { top: framePoint(100, 100), bottom: framePoint(200, 1100) };
    expect(plumbEffect(leaning)).toEqual({
      text: 'The picture leans by 5.7°; every mark is turned back by that.',
      kind: 'wait',
    });
  });
});
