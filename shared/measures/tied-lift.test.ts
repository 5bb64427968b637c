import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { tiedLiftAt } from './tied-lift.ts';

const sample = (time: number, lift: number, u = 1) => ({
  time: milliseconds(time),
  lift: degrees(lift),
  u: degrees(u),
});
const tied = { from: 'side', samples: [sample(0, 10), sample(200, 30, 3), sample(460, 90)] };
const at = (time: number) => tiedLiftAt(tied, milliseconds(time));

describe('lift of a side clip at a time of the front clip', () => {
  it('lies straight between the marked frames around it, its uncertainty too', () => {
    expect(at(0)).toEqual({ lift: 10, u: 1 });
    expect(at(50)).toEqual({ lift: 15, u: 1.5 });
    expect(at(200)).toEqual({ lift: 30, u: 3 });
    expect(at(460)).toEqual({ lift: 90, u: 1 });
  });

  it('is not known outside them or across more than 250 ms', () => {
    expect(at(-1)).toBeNull();
    expect(at(461)).toBeNull();
    expect(at(300)).toBeNull();
    expect(at(NaN)).toBeNull();
    expect(tiedLiftAt({ from: 'side', samples: [] }, milliseconds(0))).toBeNull();
  });
});
