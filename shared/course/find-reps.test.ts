import { describe, expect, it } from 'vitest';
import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import type { Side } from '#shared/landmarks/types.ts';
import type { FrameInput } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { CLIP_NAMES, loadTruth } from '#tests/fixtures/clips/truth.ts';
import { goldenClip } from '#tests/support/golden.ts';
import type { AnkleTracks } from './ankle-lifts.ts';
import { findReps, type FoundRep, type NoReps } from './find-reps.ts';

const MM_PER_PX = 2;
const FPS = 60;

/** A foot that leaves the floor: seconds, mm. It rises for 40 % of the time, rests for 20 %, comes down. */
interface Up {
  readonly side: Side;
  readonly from: number;
  readonly to: number;
  readonly mm: number;
}
interface Made {
  readonly seconds: number;
  readonly ups: readonly Up[];
  readonly noisePx?: number;
  readonly seed?: number;
  /** Seconds in which one ankle, or the camera's hold, is lost. */
  readonly gaps?: readonly { readonly side: Side; readonly from: number; readonly to: number }[];
  /** Slow sinking of the whole picture, px a second. */
  readonly sinking?: number;
}

const smooth = (x: number): number => {
  const t = Math.max(0, Math.min(1, x));
  return t * t * (3 - 2 * t);
};
const heightAt = ({ from, to, mm }: Up, time: number): number => {
  const x = (time - from) / (to - from);
  return x <= 0 || x >= 1 ? 0 : mm * smooth(x / 0.4) * (1 - smooth((x - 0.6) / 0.4));
};

/** A seeded standard normal draw. */
const drawing = (seed: number): (() => number) => {
  let state = seed >>> 0;
  const uniform = (): number => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 4_294_967_296;
  };
  return () => Array.from({ length: 12 }, uniform).reduce((sum, value) => sum + value, -6);
};

const made = ({ seconds, ups, noisePx = 0, seed = 1, gaps = [], sinking = 0 }: Made) => {
  const draw = drawing(seed);
  const times = Array.from({ length: Math.round(seconds * FPS) }, (_, i) =>
    milliseconds((i * 1000) / FPS),
  );
  const track = (side: Side, u: number): (FramePoint | null)[] =>
    times.map((ms) => {
      const time = ms / 1000;
      const [du, dv] = [noisePx * draw(), noisePx * draw()];
      if (gaps.some((gap) => gap.side === side && gap.from <= time && time < gap.to)) return null;
      const mm = ups.reduce((sum, up) => sum + (up.side === side ? heightAt(up, time) : 0), 0);
      return framePoint(u + du, 1700 + sinking * time - mm / MM_PER_PX + dv);
    });
  return { times, left: track('left', 640), right: track('right', 440) };
};

const found = (tracks: AnkleTracks, mmPerPx = MM_PER_PX): readonly FoundRep[] => {
  const reps = findReps(tracks, mmPerPx);
  if ('code' in reps) throw new Error(reps.code);
  return reps;
};
const refused = (tracks: AnkleTracks): NoReps => {
  const reps = findReps(tracks, MM_PER_PX);
  if (!('code' in reps)) throw new Error(`${reps.length} reps`);
  return reps;
};
/** The frame at which a made foot first stands 25 mm high, and the first under it again. */
const offOf = (up: Up): number => {
  let time = up.from;
  while (heightAt(up, time) <= 25) time += 1e-4;
  return Math.ceil(time * FPS);
};
const downOf = (up: Up): number => {
  let time = up.to;
  while (heightAt(up, time) <= 25) time -= 1e-4;
  return Math.ceil(time * FPS);
};
const near = (frame: number, wanted: number, by: number) =>
  expect(Math.abs(frame - wanted), `${frame} is not ${wanted} ± ${by}`).toBeLessThanOrEqual(by);

const LIFT: Up = { side: 'left', from: 3, to: 7, mm: 380 };

describe('a take of one lift', () => {
  it.each([
    ['without noise', 0, 0],
    ['with marks that tremble by a pixel', 1, 3],
    ['with marks that tremble by three pixels', 3, 6],
  ])('%s is a rep with its moments', (_name, noisePx, by) => {
    const [rep, ...more] = found(made({ seconds: 9, ups: [LIFT], noisePx }));
    expect(more).toEqual([]);
    if (!rep) throw new Error('no rep');
    expect(rep.supportSide).toBe('right');
    near(rep.footOff, offOf(LIFT), by);
    near(rep.footDown, downOf(LIFT), by);
    near(rep.top, 5 * FPS, 0.12 * 4 * FPS);
    near(rep.height, 380, 4 + 3 * MM_PER_PX * noisePx);
    expect(rep.quiet?.[0]).toBe(rep.startFrame);
    expect(rep.startFrame).toBeLessThan(FPS);
    expect(rep.quiet?.[1]).toBeLessThan(offOf(LIFT) - 0.5 * FPS);
    expect(rep.endFrame).toBeGreaterThan(rep.footDown + 10);
    expect(rep.endFrame).toBeLessThan(8 * FPS);
  });

  it('is found in the same place where the camera sinks', () => {
    const [rep] = found(made({ seconds: 9, ups: [LIFT], sinking: 4 }));
    near(rep?.footOff ?? 0, offOf(LIFT), 2);
    near(rep?.footDown ?? 0, downOf(LIFT), 2);
  });

  it('is found across gaps of the lifted ankle, at the top too', () => {
    const gaps = [
      { side: 'left', from: 1, to: 1.2 },
      { side: 'left', from: 4.8, to: 5.6 },
      { side: 'right', from: 6, to: 6.1 },
    ] as const;
    const [rep, ...more] = found(made({ seconds: 9, ups: [LIFT], gaps, noisePx: 1 }));
    expect(more).toEqual([]);
    near(rep?.footOff ?? 0, offOf(LIFT), 3);
    near(rep?.footDown ?? 0, downOf(LIFT), 3);
  });

  it('is found although the ankle is lost while it moves fast', () => {
    const gaps = [
      { side: 'left', from: 3.1, to: 3.8 },
      { side: 'left', from: 6.2, to: 6.95 },
    ] as const;
    const [rep, ...more] = found(made({ seconds: 9, ups: [LIFT], gaps, noisePx: 1 }));
    expect(more).toEqual([]);
    near(rep?.footOff ?? 0, offOf(LIFT), 0.6 * FPS);
    near(rep?.footDown ?? 0, downOf(LIFT), 0.6 * FPS);
  });

  it('has no quiet stance longer than three seconds', () => {
    const late = { ...LIFT, from: 8, to: 12 };
    const [rep] = found(made({ seconds: 14, ups: [late] }));
    near(rep?.startFrame ?? 0, (8 - 0.5 - 3) * FPS, 0.3 * FPS);
  });

  it('is one rep although the standing foot hops meanwhile', () => {
    const hop: Up = { side: 'right', from: 4.9, to: 5.2, mm: 90 };
    expect(found(made({ seconds: 9, ups: [LIFT, hop] }))).toHaveLength(1);
  });

  it('is one rep although the foot touches the floor for a moment', () => {
    const ups = [
      { ...LIFT, to: 4.5 },
      { ...LIFT, from: 4.35, to: 7 },
    ];
    expect(found(made({ seconds: 9, ups }))).toHaveLength(1);
  });
});

describe('a take of several lifts', () => {
  const lifts = (sides: readonly Side[], pause: number): Up[] =>
    sides.map((side, n) => ({ side, from: 2 + n * (3 + pause), to: 5 + n * (3 + pause), mm: 350 }));

  it.each([1, 2, 3])('with marks that tremble, seed %i: every lift is a rep', (seed) => {
    const ups = lifts(['left', 'left', 'right', 'left', 'right'], 1.6);
    const reps = found(made({ seconds: 25, ups, noisePx: 2, seed }));
    expect(reps.map((rep) => rep.supportSide)).toEqual(['right', 'right', 'left', 'right', 'left']);
    for (const [n, rep] of reps.entries()) {
      near(rep.footOff, offOf(ups[n] ?? LIFT), 4);
      near(rep.footDown, downOf(ups[n] ?? LIFT), 4);
      expect(rep.quiet).not.toBeNull();
      const next = reps[n + 1];
      if (next) expect(rep.endFrame).toBeLessThan(next.startFrame);
    }
  });

  it('marching: only the first has a quiet stance of its own, and spans do not overlap', () => {
    const reps = found(made({ seconds: 16, ups: lifts(['left', 'right', 'left', 'right'], 0.1) }));
    expect(reps.map((rep) => rep.supportSide)).toEqual(['right', 'left', 'right', 'left']);
    expect(reps.map((rep) => rep.quiet !== null)).toEqual([true, false, false, false]);
    for (const [n, rep] of reps.entries()) {
      expect(rep.startFrame).toBeLessThan(rep.footOff);
      const next = reps[n + 1];
      if (next) expect(rep.endFrame).toBeLessThan(next.startFrame);
    }
  });

  it('leaves out a lift that the clip cuts off', () => {
    const ups = [
      { ...LIFT, from: -1, to: 2 },
      { ...LIFT, from: 5, to: 8 },
      { ...LIFT, from: 10, to: 14 },
    ];
    const reps = found(made({ seconds: 12, ups }));
    expect(reps).toHaveLength(1);
    near(reps[0]?.footOff ?? 0, offOf(ups[1] ?? LIFT), 2);
  });

  it('passes over steps in place and taps of the toes', () => {
    const ups: Up[] = [
      { side: 'left', from: 1, to: 1.6, mm: 60 },
      { side: 'right', from: 1.8, to: 2.4, mm: 100 },
      { ...LIFT, from: 5, to: 9 },
    ];
    const reps = found(made({ seconds: 11, ups, noisePx: 1 }));
    expect(reps).toHaveLength(1);
    expect(reps[0]?.startFrame).toBeGreaterThan(2.4 * FPS);
  });
});

describe('no rep is proposed', () => {
  it('where nobody lifts a foot', () => {
    expect(refused(made({ seconds: 6, ups: [], noisePx: 2 }))).toMatchObject({ code: 'no-lift' });
  });

  it('where the weight shifts and the heel comes up', () => {
    const ups = [{ ...LIFT, mm: 45 }];
    const none = refused(made({ seconds: 9, ups }));
    expect(none.code).toBe('no-lift');
    if (none.code === 'no-lift') near(none.height, 45, 2);
  });

  it('where both feet hop', () => {
    const hops = [2, 3, 4].flatMap((from) =>
      (['left', 'right'] as const).map((side) => ({ side, from, to: from + 0.5, mm: 200 })),
    );
    expect(refused(made({ seconds: 6, ups: hops, noisePx: 1 })).code).toBe('no-lift');
  });

  it('where an ankle was hardly followed', () => {
    const gaps = [{ side: 'right' as const, from: 0.5, to: 9 }];
    const none = refused(made({ seconds: 9, ups: [LIFT], gaps }));
    expect(none.code).toBe('ankles-not-followed');
  });

  it('where no ankle is known at all', () => {
    const { times } = made({ seconds: 3, ups: [] });
    const unknown = times.map(() => null);
    expect(refused({ times, left: unknown, right: unknown })).toEqual({
      code: 'ankles-not-followed',
      known: 0,
      needed: 1000,
    });
    expect(refused({ times: [], left: [], right: [] }).code).toBe('ankles-not-followed');
  });

  it('where the clip begins and ends with a foot up', () => {
    const ups = [{ ...LIFT, from: -2, to: 2 }];
    expect(refused(made({ seconds: 4, ups }))).toEqual({ code: 'lifts-cut-off', count: 1 });
  });

  it('where a long gap hides how the foot left the floor', () => {
    const gaps = [{ side: 'left' as const, from: 2.5, to: 4.4 }];
    expect(refused(made({ seconds: 9, ups: [LIFT], gaps })).code).toBe('lifts-cut-off');
  });

  it('where nobody ever stands still before a lift', () => {
    const ups = Array.from({ length: 5 }, (_, n): Up => {
      const side = n % 2 === 0 ? 'left' : 'right';
      return { side, from: 0.1 + n * 1.6, to: 1.65 + n * 1.6, mm: 300 };
    });
    expect(refused(made({ seconds: 8.3, ups }))).toEqual({ code: 'never-still', count: 5 });
  });
});

describe('the demo clips', () => {
  it.each(CLIP_NAMES)('%s: every rep, its side and its moments', (name) => {
    const truth = loadTruth(name);
    const times = truth.frames.map(({ tMs }) => milliseconds(tMs));
    const of = (side: Side) =>
      truth.frames.map(({ marks, rep }) => {
        const support = truth.reps[rep]?.supportSide === side;
        const [u, v] = marks[support ? 'ankle-support' : 'ankle-lifted'] ?? [NaN, NaN];
        return framePoint(u, v);
      });
    const reps = found({ times, left: of('left'), right: of('right') }, truth.setUp.mmPerPx);
    expect(reps.map((rep) => rep.supportSide)).toEqual(truth.reps.map((rep) => rep.supportSide));
    const perSecond = 1000 / (times[1] ?? 1);
    for (const [n, rep] of reps.entries()) {
      const known = truth.reps[n];
      if (!known) continue;
      // the foot comes forward as it rises, which from the front looks lower
      near(rep.footOff, known.footOffFrame, 0.12 * perSecond);
      near(rep.footDown, known.footDownFrame, 0.12 * perSecond);
      near(rep.top, known.topFrame, 0.3 * perSecond);
      // the weight is back on both feet but for a trace
      expect(rep.startFrame).toBeGreaterThanOrEqual(known.firstFrame - 0.2 * perSecond);
      expect(rep.startFrame).toBeLessThanOrEqual(known.quietFrames[1] - 0.25 * perSecond);
      expect(rep.endFrame).toBeLessThanOrEqual(truth.reps[n + 1]?.quietFrames[1] ?? Infinity);
    }
  });
});

type Ankle = 'ankle-support' | 'ankle-lifted';
type Marked = readonly FrameInput[];

/** An ankle between marked frames, on a straight line. */
const between = (frames: Marked, id: Ankle, n: number): FramePoint | null => {
  const after = frames.findIndex(({ frame }) => frame >= n);
  const [a, b] = [frames[Math.max(0, after - 1)], frames[after]];
  const [p, q] = [a?.marks[id], b?.marks[id]];
  if (!a || !b || !p || !q || p.hidden || q.hidden) return null;
  const x = a === b ? 0 : (n - a.frame) / (b.frame - a.frame);
  return framePoint(
    p.point.u + x * (q.point.u - p.point.u),
    p.point.v + x * (q.point.v - p.point.v),
  );
};

// in the other four, five marks of a stance scatter by more than a stance sways, and nothing lies between them
describe.each([
  'g01_early_big_thigh',
  'g02_early_mid_3rep',
  'g04_expected_big',
  'g05_expected_single',
  'g06_flat',
  'g08_small_early',
  'g10_early_onset45',
  'g12_noise_free',
  'g13_before_60',
])('the golden trial %s', (name) => {
  const { trial, geometry } = goldenClip(name);
  const mmPerPx = geometry.scale?.from === 'typed' ? geometry.scale.mmPerPx : NaN;

  it.each(trial.reps.map((rep, n) => [n, rep] as const))('rep %i is found', (_n, rep) => {
    const [home] = rep.frames;
    if (!home) throw new Error('a rep without marks');
    // its last mark is of a foot still in the air: a second later it stands again
    const last = (rep.frames.at(-1)?.frame ?? 0) + 60;
    const stands = [last, last + 60].map((n) => ({ ...home, frame: frameIndex(n) }));
    const marked = [...rep.frames, ...stands];
    const all = Array.from({ length: last + 61 - home.frame }, (_, n) => home.frame + n);
    const track = (id: Ankle) => all.map((n) => between(marked, id, n));
    const tracks = { support: track('ankle-support'), lifted: track('ankle-lifted') };
    const standsLeft = rep.supportSide === 'left';
    const reps = found(
      {
        times: all.map((n) => milliseconds((n * 1000) / 60)),
        left: standsLeft ? tracks.support : tracks.lifted,
        right: standsLeft ? tracks.lifted : tracks.support,
      },
      mmPerPx,
    );
    expect(reps.map(({ supportSide }) => supportSide)).toEqual([rep.supportSide]);
  });
});
