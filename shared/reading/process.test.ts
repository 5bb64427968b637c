import { describe, expect, it } from 'vitest';
import { turnProcess } from './process.ts';
import type { SeenLift } from './process-frames.ts';
import type { Belief, Scatter } from './process-matrices.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';

const segment = { own: 32, slipShared: 0.9, slipPerRep: 0.4, perRep: 1.1 };
const belief: Belief = { thigh: segment, pelvis: segment, wholeBody: 4, stance: 1 };
const scatter: Scatter = { factor: 1, zeroThigh: [0.2, 0.2, 0.2], zeroPelvis: [0.2, 0.2, 0.2] };

interface Making {
  readonly rep?: number;
  readonly variance?: number;
  readonly tracked?: boolean;
  /** So many frames at each lift. */
  readonly each?: number;
  readonly liftVariance?: number;
  readonly byTie?: readonly number[];
}

/** A rise whose parts bend at 60°: 0.1° and 0.2° per degree of lift from there on. */
const rise = ({
  rep = 0,
  variance = 1,
  tracked = false,
  each = 1,
  liftVariance = 0.25,
  byTie = [],
}: Making = {}): readonly SeenLift[] =>
  Array.from({ length: 16 * each }, (_, n): SeenLift => {
    const i = Math.floor(n / each);
    const lift = 25 + 5 * i;
    const past = Math.max(0, lift - 60);
    return {
      rep,
      lift,
      liftVariance,
      byTie,
      thigh: 0.1 * past,
      thighVariance: variance,
      pelvis: 0.2 * past,
      pelvisVariance: variance,
      time: 100 * i,
      tracked,
    };
  });

const windowOf = (seen: readonly SeenLift[], believing: Belief = belief) => {
  const process = turnProcess(seen, believing, scatter, STANDARD_GATES);
  if (!process) throw new Error('no answer');
  return process.change(60, 90);
};

describe('the regression over all reps', () => {
  it('finds the change and its parts where the marks are good', () => {
    const firm: Belief = {
      ...belief,
      thigh: { ...segment, slipShared: 1e-4, slipPerRep: 1e-4, perRep: 1e-4 },
      pelvis: { ...segment, slipShared: 1e-4, slipPerRep: 1e-4, perRep: 1e-4 },
      wholeBody: 0,
    };
    const { mean, thigh, pelvis } = windowOf(rise({ variance: 0.01 }), firm);
    expect(thigh.mean).toBeCloseTo(3, 0);
    expect(pelvis.mean).toBeCloseTo(6, 0);
    expect(mean).toBeCloseTo(thigh.mean + pelvis.mean, 12);
    expect(Math.abs(mean - 9)).toBeLessThan(0.5);
  });

  it('is no surer of the tie of two clips from more frames, and takes both parts as off together', () => {
    const tied = (each: number, byTie: readonly number[]) =>
      windowOf(rise({ each, liftVariance: 0, variance: 0.01, byTie })).random;
    const byTieAlone = (each: number) => tied(each, [2]) - tied(each, []);
    expect(byTieAlone(1)).toBeGreaterThan(0);
    expect(byTieAlone(4) / byTieAlone(1)).toBeGreaterThan(0.9);
    // the same error in each frame for itself is averaged away
    const alone = (each: number) =>
      windowOf(rise({ each, liftVariance: 4, variance: 0.01 })).random -
      windowOf(rise({ each, liftVariance: 0, variance: 0.01 })).random;
    expect(alone(4) / alone(1)).toBeLessThan(0.5);
  });

  it('believes the prior where the marks say nothing', () => {
    const { mean, variance } = windowOf(rise({ variance: 1e6 }));
    expect(Math.abs(mean)).toBeLessThan(0.01);
    expect(variance).toBeCloseTo(64, 1);
  });

  it('is surer with better marks, with another rep, and never surer than its slips', () => {
    const one = windowOf(rise()).variance;
    expect(windowOf(rise({ variance: 4 })).variance).toBeGreaterThan(one);
    const two = windowOf([...rise(), ...rise({ rep: 1 })]).variance;
    expect(two).toBeLessThan(one);
    // both slips' shared part, as far as the prior leaves it
    expect(two).toBeGreaterThan((2 * 0.9 * 64) / (64 + 2 * 0.9));
  });

  it('is less sure of tracked marks, whose errors hang together', () => {
    const byHand = windowOf(rise({ variance: 9 }));
    const tracked = windowOf(rise({ variance: 9, tracked: true }));
    expect(tracked.variance).toBeGreaterThan(1.2 * byHand.variance);
    expect(tracked.random).toBeGreaterThan(byHand.random);
  });

  it('turns its sign with the marks, and does not ask in which order they come', () => {
    const seen = [...rise(), ...rise({ rep: 1, variance: 2 })];
    const plain = windowOf(seen);
    const mirrored = windowOf(seen.map((s) => ({ ...s, thigh: -s.thigh, pelvis: -s.pelvis })));
    expect(mirrored.mean).toBeCloseTo(-plain.mean, 10);
    expect(mirrored.variance).toBeCloseTo(plain.variance, 10);
    const back = windowOf([...seen].reverse());
    expect(back.mean).toBeCloseTo(plain.mean, 8);
    expect(back.random).toBeCloseTo(plain.random, 8);
  });

  it('takes a turn of the whole body for what it is: no turn of the hip', () => {
    const whole = rise().map((s) => ({ ...s, thigh: s.pelvis, pelvis: -s.pelvis }));
    expect(Math.abs(windowOf(whole).mean)).toBeLessThan(0.1);
  });

  it('splits its error: what marking again would change is the smaller part', () => {
    const { random, variance } = windowOf(rise());
    expect(random).toBeGreaterThan(0);
    expect(random).toBeLessThan(variance);
  });

  it('has no answer where a frame has no number', () => {
    const [first, ...rest] = rise();
    if (!first) throw new Error('no frame');
    expect(
      turnProcess([{ ...first, thighVariance: NaN }, ...rest], belief, scatter, STANDARD_GATES),
    ).toBeNull();
  });
});
