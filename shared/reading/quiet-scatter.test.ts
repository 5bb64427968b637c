import { describe, expect, it } from 'vitest';
import type { LandmarkId, Mark } from '#shared/landmarks/types.ts';
import { normalDraws } from '#shared/measures/draws.ts';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { readingInputOf } from '#shared/evaluate/trial.ts';
import type { RepInput } from '#shared/course/types.ts';
import { assess } from './assess.ts';
import { quietScatter } from './quiet-scatter.ts';

const SET = 'belt+thigh';

/** The rep with every mark moved by so many times its assumed error, from one seed. */
const shaken = (rep: RepInput, times: number, source: 'hand' | 'tracked' = 'hand'): RepInput => {
  const next = normalDraws(3);
  const moved = (id: string, mark: Mark): Mark => {
    if (mark.hidden) return mark;
    const pointer = /belt|thigh|strap/.test(id);
    const size = times * 0.8 * (pointer ? 1.5 : 3);
    const point = { u: mark.point.u + size * next(), v: mark.point.v + size * next() };
    return { ...mark, source, point: point };
  };
  return {
    ...rep,
    frames: rep.frames.map((frame) => ({
      ...frame,
      marks: Object.fromEntries(
        Object.entries(frame.marks).map(([id, mark]) => [id as LandmarkId, moved(id, mark)]),
      ),
    })),
  };
};

const scattered = (reps: readonly RepInput[]) => {
  const input = readingInputOf({ id: 'made', supportSide: 'left', reps }, SET, 3);
  return quietScatter(assess(input, 1, 2).reps.flatMap(({ used }) => used ?? []));
};

const plain = madeRep('left', (lift) => 0.2 * Math.max(0, lift - 60));

describe('what marks scatter while a person stands still', () => {
  it('grows with the square of their error', () => {
    const once = scattered([shaken(plain, 1)]);
    const twice = scattered([shaken(plain, 2)]);
    expect(once.free).toBeGreaterThan(10);
    expect(once.squares / once.free).toBeGreaterThan(0.5);
    expect(once.squares / once.free).toBeLessThan(1.6);
    expect(twice.squares / twice.free / (once.squares / once.free)).toBeCloseTo(4, 0);
  });

  it('says nothing where marks were carried over from frame to frame', () => {
    const [first] = shaken(plain, 1).frames;
    const stance = plain.frames
      .slice(0, 5)
      .map((frame) => ({ ...frame, marks: first?.marks ?? {} }));
    expect(scattered([{ ...plain, sharedQuiet: stance }])).toEqual({ squares: 0, free: 0 });
  });

  it('counts for more where marks are tracked: what they err together does not show', () => {
    const byHand = scattered([shaken(plain, 1)]);
    const tracked = scattered([shaken(plain, 1, 'tracked')]);
    // a tracked mark's error is assumed 1.7 times as large
    expect(tracked.squares * 1.7 ** 2).toBeGreaterThan(byHand.squares);
  });

  it('counts a quiet stance that reps share once', () => {
    const rep = shaken(plain, 1);
    const stance = rep.frames.slice(0, 5);
    const sharing = (id: string): RepInput => ({ ...rep, id, sharedQuiet: stance });
    expect(scattered([sharing('0'), sharing('1')])).toEqual(scattered([sharing('0')]));
    expect(scattered([rep, { ...rep, id: '1' }]).free).toBe(2 * scattered([rep]).free);
  });
});
