import { describe, expect, it } from 'vitest';
import { blend } from './blend.ts';
import { stateOf } from './certainty.ts';
import type { Seen } from './follower.ts';

const seen = (x: number, confidence: number): Seen => ({
  place: { x, y: 0 },
  confidence,
  state: stateOf(confidence),
});
const lost: Seen = { place: null, confidence: 0, state: 'lost' };

describe('blend', () => {
  it('lies nearer to the way whose keyframe is nearer', () => {
    expect(blend(seen(10, 1), seen(12, 1), 0.25).place).toEqual({ x: 10.5, y: 0 });
  });

  it('runs into both keyframes', () => {
    expect(blend(seen(10, 0.6), seen(12, 1), 0).place?.x).toBe(10);
    expect(blend(seen(10, 1), seen(12, 0.6), 1).place?.x).toBe(12);
  });

  it('is surer than either where both agree', () => {
    const { confidence, state } = blend(seen(10, 0.4), seen(10.5, 0.4), 0.5);
    expect(confidence).toBeCloseTo(0.64, 12);
    expect(state).toBe('sure');
  });

  it('is never sure where they contradict, and takes the likelier', () => {
    const found = blend(seen(10, 0.9), seen(40, 1), 0.3);
    expect(found.place?.x).toBe(10);
    expect(found.state).toBe('unsure');
  });

  it('takes the one that is not lost, less surely', () => {
    expect(blend(lost, seen(40, 1), 0.3)).toEqual({
      place: { x: 40, y: 0 },
      confidence: 0.8,
      state: 'sure',
    });
    expect(blend(seen(10, 0.55), lost, 0.3).state).toBe('unsure');
  });

  it('is lost where both are', () => {
    expect(blend(lost, lost, 0.5)).toEqual(lost);
  });
});
