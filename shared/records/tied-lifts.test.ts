import { describe, expect, it } from 'vitest';
import type { RepInput } from '#shared/course/types.ts';
import { madeFront, type MadeMotion, madeSide } from '#shared/evaluate/made-pair.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { canBePair, tieOf, type Tying, withTiedLift } from './tied-lifts.ts';

const MOTION: MadeMotion = {
  side: 'left',
  stillMs: 1200,
  upMs: 1800,
  holdMs: 400,
  highest: 108,
  turnAt: () => 0,
};
const front = madeFront(MOTION, { startMs: 310, stepMs: 1000 / 30, scatterPx: 0, seed: 3 });
const side = madeSide(MOTION, { startMs: 2475, stepMs: 25, scatterPx: 0, seed: 4 });

const of = (input: RepInput | null, clipId: string, change: Partial<Tying> = {}): Tying => ({
  input,
  clipId,
  liftFrom: null,
  clap: null,
  ...change,
});
const named = of(front, 'a', { liftFrom: 'side' });

describe('a rep that takes the lift of another clip', () => {
  it('has it in its input, and nothing else is changed', () => {
    const { input, tieFault } = withTiedLift(named, [named, of(side, 'b')]);
    expect(tieFault).toBeNull();
    expect(input?.liftFrom?.from).toBe('side');
    expect({ ...input, liftFrom: undefined }).toEqual({ ...front, liftFrom: undefined });
  });

  it('is the same when asked again of what was tied before', () => {
    const all = [named, of(side, 'b')];
    const once = withTiedLift(named, all);
    expect(withTiedLift(once, [once, of(side, 'b')])).toEqual(once);
  });

  it('keeps its own where it names none, or where the two are no pair', () => {
    expect(tieOf(of(front, 'a'), [of(side, 'b')])).toBeNull();
    const right = madeSide(
      { ...MOTION, side: 'right' },
      { ...{ startMs: 0, stepMs: 25 }, scatterPx: 0, seed: 1 },
    );
    for (const other of [
      of(side, 'a'),
      of(right, 'b'),
      of(null, 'b'),
      of({ ...front, id: 'side' }, 'b'),
    ])
      expect(withTiedLift(named, [named, other])).toMatchObject({
        input: front,
        tieFault: { code: 'not-a-pair' },
      });
    expect(canBePair(of(side, 'b'), of(front, 'a'))).toBe(false);
  });

  it('says what both clips lack', () => {
    const unmarked = of({ ...side, frames: [] }, 'b');
    expect(tieOf(named, [unmarked])).toEqual({ code: 'few-shared-events', have: [] });
    const clap = milliseconds(500);
    const apart = tieOf({ ...named, clap }, [of(side, 'b', { clap })]);
    expect(apart).toMatchObject({ code: 'durations-differ', events: ['clap', 'foot-off'] });
  });
});
