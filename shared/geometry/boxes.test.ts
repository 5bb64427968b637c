import { describe, expect, it } from 'vitest';
import { boxAround, boxWithin, grown } from './boxes.ts';

const box = { left: 10, top: 20, width: 30, height: 40 };

describe('boxes', () => {
  it('grow on every side', () => {
    expect(grown(box, 5)).toEqual({ left: 5, top: 15, width: 40, height: 50 });
  });

  it('are held together by the smallest box around both', () => {
    const other = { left: 0, top: 50, width: 20, height: 30 };
    const both = { left: 0, top: 20, width: 40, height: 60 };
    expect(boxAround(box, other)).toEqual(both);
    expect(boxAround(other, box)).toEqual(both);
  });

  it('end where the picture does, and are nothing outside of it', () => {
    const picture = { width: 30, height: 45 };
    expect(boxWithin(box, picture)).toEqual({ left: 10, top: 20, width: 20, height: 25 });
    expect(boxWithin(grown(box, 100), picture)).toEqual({ left: 0, top: 0, ...picture });
    expect(boxWithin({ ...box, left: 30 }, picture)).toBeNull();
    expect(boxWithin({ ...box, left: NaN }, picture)).toBeNull();
  });
});
