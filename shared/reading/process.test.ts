import { describe, expect, it } from 'vitest';
import { turnProcess } from './process.ts';
import type { SeenLift } from './process-frames.ts';
import type { Belief, Scatter } from './process-matrices.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';

const segment = { own: 32, slipShared: 0.9, slipPerRep: 0.4, perRep: 1.1 };
const belief: Belief = {
  thigh: segment,
  pelvis: segment,
  across: { own: 0, perRep: 0 },
  gated: 0,
  wholeBody: 4,
  stance: 1,
};
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

  it('believes that thigh and pelvis share a turn as far as it is told so', () => {
    // the thigh is hardly seen: what the pelvis does tells of it
    const seen = rise().map((s) => ({ ...s, thigh: 0, thighVariance: 1e4 }));
    const shared = { ...belief, across: { own: 16, perRep: 0.5 } };
    expect(Math.abs(windowOf(seen).thigh.mean)).toBeLessThan(0.3);
    const { mean, thigh, pelvis, variance } = windowOf(seen, shared);
    expect(thigh.mean).toBeGreaterThan(1);
    expect(thigh.mean + pelvis.mean).toBeCloseTo(mean, 12);
    expect(variance).toBeGreaterThan(0);
    const blind = windowOf(rise({ variance: 1e8 }), shared);
    expect(blind.variance).toBeCloseTo(2 * 32 + 2 * 16, 1);
  });

  it('finds a turn between the gates more easily where it believes in such turns', () => {
    const gated = { ...belief, gated: 1 };
    const steep = rise({ variance: 4 });
    expect(windowOf(steep, gated).mean).toBeGreaterThan(windowOf(steep).mean);
  });

  it('finds a large turn likelier where it believes in one', () => {
    const large = rise().map((s) => ({ ...s, thigh: 6 * s.thigh, pelvis: 6 * s.pelvis }));
    const of = (seen: readonly SeenLift[], own: number): number =>
      turnProcess(
        seen,
        { ...belief, thigh: { ...segment, own }, pelvis: { ...segment, own } },
        scatter,
        STANDARD_GATES,
      )?.logLikelihood ?? NaN;
    expect(of(large, 100)).toBeGreaterThan(of(large, 1));
    const still = large.map((s) => ({ ...s, thigh: 0, pelvis: 0 }));
    expect(of(still, 100)).toBeLessThan(of(still, 1));
  });

  it('has no answer where a frame has no number', () => {
    const [first, ...rest] = rise();
    if (!first) throw new Error('no frame');
    expect(
      turnProcess([{ ...first, thighVariance: NaN }, ...rest], belief, scatter, STANDARD_GATES),
    ).toBeNull();
  });
});
