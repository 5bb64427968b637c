import { describe, expect, it } from 'vitest';
import type { Rep } from '#shared/contracts/reps.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { aRep } from '#tests/support/records.ts';
import { momentsOf, roomOf } from './moments.ts';

const TIMES = Array.from({ length: 101 }, (_, n) => milliseconds(n * 20));
const REP: Rep = {
  ...aRep(1),
  startFrame: 10,
  endFrame: 90,
  boundaries: {
    quietStart: null,
    quietEnd: null,
    // what an earlier look found is found anew
    footOff: { frame: 12, by: 'found' },
    top: { frame: 60, by: 'hand' },
    topEnd: null,
    footDown: null,
  },
};
const PHASES = {
  boundaries: {
    quietFrom: milliseconds(200),
    quietTo: milliseconds(611),
    footOff: milliseconds(805),
    top: milliseconds(1500),
    lowerFrom: null,
    footDown: milliseconds(9999),
  },
  moved: [],
  footOffHalfGap: null,
  byFrame: [],
};

describe('moments of a rep', () => {
  const moments = momentsOf(REP, PHASES, TIMES);
  it('are those the marks show, and those a hand has moved', () => {
    expect(moments).toEqual([
      { moment: 'quietStart', frame: 10, byHand: false },
      { moment: 'quietEnd', frame: 31, byHand: false },
      { moment: 'footOff', frame: 40, byHand: false },
      { moment: 'top', frame: 60, byHand: true },
      { moment: 'footDown', frame: 90, byHand: false },
    ]);
  });

  it('stay in their order and inside the rep', () => {
    expect(roomOf(moments, 'footOff', REP)).toEqual({ from: 31, to: 60 });
    expect(roomOf(moments, 'quietStart', REP)).toEqual({ from: 10, to: 31 });
    expect(roomOf(moments, 'topEnd', REP)).toEqual({ from: 60, to: 90 });
    expect(roomOf([{ moment: 'top', frame: frameIndex(50), byHand: true }], 'top', REP)).toEqual({
      from: 10,
      to: 90,
    });
  });

  it('are only the moved ones before anything is measured', () => {
    expect(momentsOf(REP, null, TIMES).map((each) => each.moment)).toEqual(['top']);
  });
});
