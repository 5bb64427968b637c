import { describe, expect, it } from 'vitest';
import { turnAt } from './at-lift.ts';

const point = (lift: number, turn: number) => ({ lift, turn });

describe('turnAt', () => {
  it('reads between points, and nothing beyond them', () => {
    const curve = [point(60, 2), point(70, 4)];
    expect(turnAt(curve, 60)).toBe(2);
    expect(turnAt(curve, 65)).toBe(3);
    expect(turnAt(curve, 71)).toBeNull();
  });
});
