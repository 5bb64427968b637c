import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { milliseconds } from '#shared/timing/units.ts';
import type { RepInput } from '#shared/course/types.ts';
import { STANDARD_GATES, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { deriveReading } from './derive.ts';
import { liftAt, nextFrames, type UnmarkedFrame } from './next-frame.ts';
import { type PlannedFrame, plannedVariance } from './planned.ts';
import type { ReadingResult } from './types.ts';

const whole = madeRep('left', (lift) => 0.15 * Math.max(0, lift - 60), { id: 'a' });

const read = (rep: RepInput, set: 'bare' | 'belt+thigh' = 'bare'): ReadingResult =>
  deriveReading({
    engine: 1,
    supportSide: 'left',
    set,
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules: STANDARD_RULES,
    reps: [rep],
  });

/** Keeps the frames a chooser likes; the others are the unmarked ones. */
const split = (keep: (index: number) => boolean) => {
  const rep: RepInput = { ...whole, frames: whole.frames.filter((_, i) => keep(i)) };
  const unmarked = whole.frames.flatMap(({ frame, time }, i): readonly UnmarkedFrame[] =>
    keep(i) ? [] : [{ rep: 'a', frame, time }],
  );
  return { rep, unmarked };
};

describe('planning', () => {
  const planned = (frames: readonly PlannedFrame[]) => plannedVariance(frames, STANDARD_GATES);
  const at = (lift: number, weight = 0.01) => ({ lift: degrees(lift), weight });
  const spread = [30, 40, 50, 60, 75, 90, 100].map((lift) => at(lift));

  it('values marks at the ends of the window more than in its middle', () => {
    const with_ = (lift: number) => planned([...spread, at(lift)]) ?? NaN;
    expect(with_(60)).toBeLessThan(with_(75));
    expect(with_(90)).toBeLessThan(with_(75));
    expect(with_(75)).toBeLessThanOrEqual(planned(spread) ?? NaN);
  });

  it('halves the variance with twice the weight', () => {
    const once = planned(spread) ?? NaN;
    const twice = planned(spread.map(({ lift }) => ({ lift, weight: 0.02 }))) ?? NaN;
    expect(Math.abs(twice / once - 0.5)).toBeLessThan(0.01);
  });

  it('knows nothing of no frames', () => {
    expect(planned([])).toBeNull();
  });
});

describe('the frame offered next', () => {
  // every second frame of the rise is marked
  const { rep, unmarked } = split((i) => i < 14 || i % 2 === 0);
  const result = read(rep);
  const offers = nextFrames(result, unmarked);

  it('is the one that lowers the uncertainty most', () => {
    expect(result.line).toBe(2);
    expect(offers.length).toBeGreaterThan(5);
    const best = offers[0];
    expect(best?.why).toBe('lowers-uncertainty');
    expect(best?.halfWidthThen).toBeLessThan(best?.halfWidthNow ?? NaN);
    for (const offer of offers)
      expect(offer.halfWidthThen).toBeGreaterThanOrEqual(best?.halfWidthThen ?? NaN);
  });

  it('starts from the ± the reading shows', () => {
    expect(offers[0]?.halfWidthNow).toBeCloseTo(1.96 * (result.figures?.uC ?? NaN), 9);
  });

  it('promises what marking it brings', () => {
    const best = offers[0];
    const chosen = new Set(rep.frames.map(({ frame }) => frame));
    const marked: RepInput = {
      ...rep,
      frames: whole.frames.filter(({ frame }) => chosen.has(frame) || frame === best?.frame),
    };
    const after = read(marked).figures;
    const before = result.figures;
    if (!after || !before || !best) throw new Error('no figures');
    // s of the fit and d move a little too: compare the random part's relative gain
    expect(after.uR / before.uR).toBeLessThan(1);
    expect(Math.abs(1.96 * after.uC - (best.halfWidthThen ?? NaN))).toBeLessThan(0.5);
  });

  it('is none where the reading cannot change any more', () => {
    const settled = madeRep('left', (lift) => 0.8 * Math.max(0, lift - 60), { id: 'a' });
    const kept: RepInput = {
      ...settled,
      frames: settled.frames.filter((_, i) => i < 14 || i % 2 === 0),
    };
    const sure = read(kept, 'belt+thigh');
    expect(sure.code).toBe('early-turn-out');
    expect(nextFrames(sure, unmarked)).toEqual([]);
  });

  it('is what a rep lacks while it cannot be read', () => {
    const lacking = split((i) => i < 14 || (i > 16 && i % 2 === 0 && (i < 29 || i > 33)));
    const unread = read(lacking.rep);
    expect(unread.figures).toBeNull();
    const codes = unread.reps[0]?.why.map(({ code }) => code) ?? [];
    expect(codes.some((code) => code.startsWith('few-'))).toBe(true);
    const [first] = nextFrames(unread, lacking.unmarked);
    expect(first?.why).toBe('rep-needs-it');
    expect(first?.halfWidthNow).toBeNull();
  });

  it('is none of a rep without marks', () => {
    const nothing = read({ ...whole, frames: [] });
    expect(nextFrames(nothing, unmarked)).toEqual([]);
  });
});

describe('a lift between marked frames', () => {
  const frames = read(whole).reps[0]?.frames ?? [];
  const rising = frames.filter(({ phase }) => phase === 'rise');

  it('lies on the line between its neighbours', () => {
    const [a, b] = rising;
    if (!a || !b || a.lift === null || b.lift === null) throw new Error('no rise');
    const middle = milliseconds((a.time + b.time) / 2);
    expect(liftAt(frames, middle)).toBeCloseTo((a.lift + b.lift) / 2, 9);
  });

  it('is unknown outside the rise', () => {
    expect(liftAt(frames, milliseconds(-100))).toBeNull();
    expect(liftAt(frames, milliseconds(1e6))).toBeNull();
    expect(liftAt([], milliseconds(0))).toBeNull();
  });
});
