import { describe, expect, it } from 'vitest';
import { MADE_LIFTS, madeRep } from '#shared/evaluate/made-rep.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from '#shared/measures/inputs.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { RepInput } from '#shared/course/types.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { deriveReading } from './derive.ts';
import { nextFrames, type UnmarkedFrame } from './next-frame.ts';
import type { ReadingInput, ReadingResult } from './types.ts';

/** What a rep lacks is asked for by name, and the frames that would bring it are offered. */

const whole = madeRep('left', (lift) => 0.15 * Math.max(0, lift - 60), { id: 'a' });

const read = (rep: RepInput, over: Partial<ReadingInput> = {}): ReadingResult =>
  deriveReading({
    engine: 1,
    supportSide: 'left',
    set: 'belt',
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules: STANDARD_RULES,
    reps: [rep],
    ...over,
  });

const keep = (wanted: (lift: number, index: number) => boolean): RepInput => ({
  ...whole,
  frames: whole.frames.filter((_, i) => wanted(MADE_LIFTS[i] ?? NaN, i)),
});
const withCamera = (over: Partial<CameraInput>): RepInput => ({
  ...whole,
  camera: { ...whole.camera, ...over },
});
const without = (rep: RepInput, id: LandmarkId): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame) => {
    const { [id]: _gone, ...marks } = frame.marks;
    return { ...frame, marks };
  }),
});
const unmarkedIn = (rep: RepInput): readonly UnmarkedFrame[] =>
  whole.frames
    .filter(({ frame }) => !rep.frames.some((each) => each.frame === frame))
    .map(({ frame, time }) => ({ rep: 'a', frame, time }));
const settle = (rep: RepInput) => read(rep).settle;

describe('what is asked for', () => {
  it('is the scale, the distance or the length of a pointer', () => {
    expect(settle(withCamera({ mmPerPx: null }))).toContainEqual({ code: 'give-scale' });
    expect(settle(withCamera({ distanceMm: null }))).toContainEqual({ code: 'give-distance' });
    expect(settle(withCamera({ beltPointerMm: null }))).toContainEqual({
      code: 'give-pointer-length',
      pointer: 'belt',
    });
    const both = read(withCamera({ thighPointerMm: null }), { set: 'belt+thigh' });
    expect(both.settle).toContainEqual({ code: 'give-pointer-length', pointer: 'thigh' });
  });

  it('is a still start where many frames are marked and the foot is never seen to leave', () => {
    const floating = without(whole, 'ankle-lifted');
    expect(settle(floating)).toContainEqual({ code: 'stand-still-first' });
    const few = { ...floating, frames: floating.frames.slice(0, 4) };
    expect(settle(few)).not.toContainEqual({ code: 'stand-still-first' });
  });

  it('is a higher lift where 85° were not reached', () => {
    const low = keep((lift, i) => i < 35 && lift <= 75);
    const asked = settle({ ...low, frames: [...low.frames] });
    const higher = asked.find(({ code }) => code === 'lift-higher');
    expect(higher).toMatchObject({ needed: 85 });
    expect(Math.abs((higher && 'reached' in higher ? higher.reached : NaN) - 75)).toBeLessThan(3);
  });

  it.each([
    ['few-near-60', 60, (lift: number) => lift < 47 || lift > 73],
    ['few-near-90', 90, (lift: number) => lift < 77 || lift > 103],
    ['few-across-window', 75, (lift: number) => lift <= 50 || lift === 60 || lift >= 100],
  ] as const)('are frames near %s, the nearest to %d° first', (code, middle, wanted) => {
    const rep = keep((lift, i) => i < 12 || i > 34 || wanted(lift));
    const result = read(rep);
    expect(result.reps[0]?.why.map((fault) => fault.code)).toContain(code);
    expect(result.settle.some((each) => each.code === 'mark-frames')).toBe(true);
    const offers = nextFrames(result, unmarkedIn(rep));
    expect(offers.length).toBeGreaterThan(0);
    const away = offers.map(({ lift }) => Math.abs(lift - middle));
    expect(away).toEqual(away.toSorted((a, b) => a - b));
    expect(away[0]).toBeLessThan(5);
  });
});

it('no frame is offered where none would help', () => {
  const unscaled = read(withCamera({ mmPerPx: null }));
  expect(nextFrames(unscaled, unmarkedIn(keep((_, i) => i < 14)))).toEqual([]);
});

describe('a frame that would lower the uncertainty', () => {
  const rep = keep((_, i) => i < 14 || i % 2 === 0);
  const unmarked = unmarkedIn(rep);

  it('belongs to a rep of the reading and lies in its rise over 25°', () => {
    const result = read(rep, { set: 'bare' });
    const foreign = unmarked.map((frame) => ({ ...frame, rep: 'another' }));
    expect(nextFrames(result, foreign)).toEqual([]);
    for (const { lift } of nextFrames(result, unmarked)) expect(lift).toBeGreaterThanOrEqual(25);
  });

  it('is offered or not under the assumption too, by the same rule', () => {
    const assumed = read(rep, { thighTurnsLittle: true });
    expect(assumed.thighTurnsLittle).toBe(true);
    const offers = nextFrames(assumed, unmarked);
    for (const { halfWidthNow, halfWidthThen } of offers)
      expect(halfWidthThen).toBeLessThan(halfWidthNow ?? NaN);
    expect(nextFrames({ ...assumed, set: null }, unmarked).length).toBeGreaterThanOrEqual(
      offers.length,
    );
  });

  it('has the weight of its neighbours, or is not offered', () => {
    const result = read(rep, { set: 'bare' });
    const weightless = {
      ...result,
      reps: result.reps.map((each) => ({
        ...each,
        frames: each.frames.map((frame) => ({ ...frame, weight: null })),
      })),
    };
    expect(nextFrames(result, unmarked).length).toBeGreaterThan(0);
    expect(nextFrames(weightless, unmarked)).toEqual([]);
  });
});

describe('a smeared picture', () => {
  const smear = (rep: RepInput) =>
    read(rep).warnings.find(({ warning }) => warning.code === 'smear')?.warning;
  const exposed: RepInput = { ...whole, camera: { ...whole.camera, exposureMs: 33 } };

  it('is warned of with the mark that moved most while the shutter was open', () => {
    expect(smear(exposed)).toMatchObject({ code: 'smear' });
    expect(smear({ ...exposed, camera: { ...exposed.camera, exposureMs: 0.01 } })).toBeUndefined();
  });

  it('is judged from marks that both neighbours carry', () => {
    const lifted = without(exposed, 'lifted-knee');
    const frames = exposed.frames.map((frame, i) => (i % 2 ? frame : (lifted.frames[i] ?? frame)));
    expect(smear({ ...exposed, frames })).not.toMatchObject({ landmark: 'lifted-knee' });
  });
});
