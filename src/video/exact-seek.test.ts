import { describe, expect, it } from 'vitest';
import type { Milliseconds } from '#shared/timing/units.ts';
import { presentedFrame } from './exact-seek.ts';

describe('presentedFrame', () => {
  const table = [0, 16.667, 33.333] as Milliseconds[];

  it('is the frame whose time the browser gives, also where it rounds down', () => {
    expect(presentedFrame(table, 0)).toBe(0);
    expect(presentedFrame(table, 0.016667)).toBe(1);
    expect(presentedFrame(table, 0.0166666)).toBe(1);
    expect(presentedFrame(table, 0.0333)).toBe(2);
  });

  it('is none before the first frame', () => {
    expect(presentedFrame(table, -0.5)).toBeNull();
  });
});
