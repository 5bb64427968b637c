import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { ASSUMED_MARK_ERROR } from './inputs.ts';
import { tiedLiftAt, tiedUncertainty, withMarkError } from './tied-lift.ts';

const sample = (time: number, lift: number, u = 1, byTie: readonly [number, number] = [0, 2]) => ({
  time: milliseconds(time),
  lift: degrees(lift),
  u: degrees(u),
  byTie: byTie.map(degrees),
});
const tied = {
  from: 'side',
  samples: [sample(0, 10), sample(200, 30, 3, [1, 0]), sample(460, 90)],
};
const at = (time: number) => tiedLiftAt(tied, milliseconds(time));

describe('lift of a side clip at a time of the front clip', () => {
  it('lies straight between the marked frames around it, its uncertainty too', () => {
    expect(at(0)).toEqual({ lift: 10, u: 1, byTie: [0, 2] });
    expect(at(50)).toEqual({ lift: 15, u: 1.5, byTie: [0.25, 1.5] });
    expect(at(200)).toEqual({ lift: 30, u: 3, byTie: [1, 0] });
    expect(at(460)).toEqual({ lift: 90, u: 1, byTie: [0, 2] });
  });

  it('is not known outside them or across more than 250 ms', () => {
    expect(at(-1)).toBeNull();
    expect(at(461)).toBeNull();
    expect(at(300)).toBeNull();
    expect(at(NaN)).toBeNull();
    expect(tiedLiftAt({ from: 'side', samples: [] }, milliseconds(0))).toBeNull();
  });

  it('is as sure as its marks and the tie together', () => {
    const value = { lift: degrees(40), u: degrees(2), byTie: [degrees(-3), degrees(6)] };
    expect(tiedUncertainty(value)).toBeCloseTo(7, 12);
  });

  it('takes the typical error of whoever marks; the tie stays as it is', () => {
    const own = withMarkError(tied, { anatomicalPx: 1.5, doublyMarkedFrames: 24 });
    expect(own.samples[1]).toEqual({ ...tied.samples[1], u: 1.5 });
    expect(withMarkError(tied, ASSUMED_MARK_ERROR)).toBe(tied);
  });
});
