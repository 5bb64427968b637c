import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import type { FramePhase, RepInput } from '#shared/course/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import type { MeasuredClip } from '#shared/records/engine-input.ts';
import {
  countHiddenOnce,
  inputOfMarking,
  marksByFrame,
  measuredTwice,
} from './compare-markings.ts';
import {
  doublyMarked,
  type FirstMark,
  isAnatomical,
  markedTwice,
  type PlacedMark,
} from './marked-twice.ts';

const mark = (over: Partial<FirstMark> = {}): FirstMark => ({
  frame: 3,
  landmark: 'kneecap',
  u: 100,
  v: 200,
  pictureLongEdge: 1920,
  byUser: 'coach',
  ...over,
});

describe('marks of both markings', () => {
  it('are paired by frame and landmark, with who placed the first', () => {
    const again = [mark({ u: 103, v: 196 }), mark({ frame: 4 }), mark({ landmark: 'belt-tip' })];
    expect(markedTwice([mark()], again, 1920)).toEqual([
      {
        frame: 3,
        landmark: 'kneecap',
        firstBy: 'coach',
        first: { u: 100, v: 200 },
        second: { u: 103, v: 196 },
        coarseness: 1,
      },
    ]);
  });

  it('say nothing of a place that one of them hid, did not mark, or does not know', () => {
    const hidden = { u: null, v: null };
    expect(markedTwice([mark()], [mark(hidden)], 1920)).toEqual([]);
    expect(markedTwice([mark(hidden)], [mark()], 1920)).toEqual([]);
    expect(markedTwice([mark()], [], 1920)).toEqual([]);
    const unknown = mark({ landmark: 'elbow' });
    expect(markedTwice([unknown], [unknown], 1920)).toEqual([]);
  });

  it('are as coarse as the coarser picture, and count at the fineness of the source', () => {
    const again = mark({ u: 104, pictureLongEdge: 480 });
    const twice = markedTwice([mark({ pictureLongEdge: 960 })], [again], 1920);
    expect(twice[0]?.coarseness).toBe(4);
    expect(doublyMarked('rep', twice)).toEqual([
      { frame: 'rep 3', first: { u: 25, v: 50 }, second: { u: 26, v: 50 } },
    ]);
    expect(markedTwice([mark()], [mark({ pictureLongEdge: 0 })], 1920)[0]?.coarseness).toBe(1);
  });

  it('of pointers and outlines have errors of their own', () => {
    expect(isAnatomical('kneecap')).toBe(true);
    expect(isAnatomical('belt-tip')).toBe(false);
    expect(isAnatomical('outline-lifted')).toBe(false);
  });

  it('that one hid and the other placed are counted', () => {
    const hidden = { u: null, v: null };
    expect(countHiddenOnce([mark()], [mark(hidden)])).toBe(1);
    expect(countHiddenOnce([mark(hidden)], [mark()])).toBe(1);
    expect(countHiddenOnce([mark(hidden)], [mark(hidden)])).toBe(0);
    expect(countHiddenOnce([mark()], [])).toBe(0);
  });

  it('are hidden, placed, or unknown by frame', () => {
    const frames = marksByFrame([
      mark(),
      mark({ landmark: 'belt-tip', u: null }),
      mark({ landmark: 'elbow' }),
    ]);
    expect([...frames.keys()]).toEqual([3]);
    expect(frames.get(frameIndex(3))).toMatchObject({
      kneecap: { to: 'point', point: { u: 100, v: 200 }, source: 'hand' },
      'belt-tip': { to: 'hidden' },
    });
  });
});

const made = madeRep('left', (lift) => 0.2 * Math.max(0, lift - 60));

/** The marks of a made rep as a second marking has them, each this far to the right. */
const placed = (off: number, frames: RepInput['frames'] = made.frames): PlacedMark[] =>
  frames.flatMap(({ frame, marks }) =>
    Object.entries(marks).map(([landmark, value]) => ({
      frame,
      landmark,
      u: value.hidden ? null : value.point.u + off,
      v: value.hidden ? null : value.point.v,
      pictureLongEdge: 1920,
    })),
  );

const clip: MeasuredClip = {
  width: made.camera.width,
  height: made.camera.height,
  geometry: {
    scale: null,
    distanceMm: made.camera.distanceMm,
    lensHeightMm: made.camera.lensHeightMm,
    beltPointerMm: made.camera.beltPointerMm,
    thighPointerMm: 115,
    plumb: null,
    floorLine: null,
    shutter: null,
  },
  mmPerPx: made.camera.mmPerPx,
  frameRate: null,
  mirrored: false,
  cameraStood: 'front',
};
const times: number[] = [];
for (const { frame, time } of made.frames) times[frame] = time;
const unknownMoments = {
  quietStart: null,
  quietEnd: null,
  footOff: null,
  top: null,
  topEnd: null,
  footDown: null,
};
const facts = {
  rep: {
    id: 'r',
    supportSide: 'left',
    view: 'front',
    boundaries: unknownMoments,
    excluded: 'pain',
  },
  clip,
  times: Array.from(times, (time) => milliseconds(time ?? NaN)),
  bodyHeightMm: null,
} as const;
const phases: Record<number, FramePhase> = Object.fromEntries(
  made.frames.map(({ frame }, i) => [frame, i < 12 ? 'quiet' : i < 38 ? 'rise' : 'lower']),
);

describe('the frames of a second marking', () => {
  it('are divided as the first marking was, and count although the rep is left out', () => {
    const input = inputOfMarking(facts, placed(0), phases);
    expect(input?.labels?.slice(11, 13)).toEqual(['quiet', 'rise']);
    expect(input?.excluded).toBeNull();
    expect(inputOfMarking(facts, placed(0), {})?.labels?.[0]).toBe('between');
    expect(
      inputOfMarking({ ...facts, clip: { ...clip, height: null } }, placed(0), phases),
    ).toBeNull();
  });

  it('give the same lift and turn from the same marks, and no turn of a quiet frame', () => {
    const input = inputOfMarking(facts, placed(0), phases);
    const twice = measuredTwice(input, input, 'belt', ASSUMED_MARK_ERROR);
    expect(twice).toHaveLength(made.frames.length);
    expect(twice[0]?.turn).toBeNull();
    const [a, b] = twice[30]?.turn ?? [];
    expect(a).toBeTypeOf('number');
    expect(b).toBe(a);
    expect(twice[30]?.lift?.[1]).toBe(twice[30]?.lift?.[0]);
  });

  it('are unknown where one of the markings cannot be measured', () => {
    const input = inputOfMarking(facts, placed(0), phases);
    expect(measuredTwice(null, input, 'belt', ASSUMED_MARK_ERROR)).toEqual([]);
    const noScale = input && { ...input, camera: { ...input.camera, mmPerPx: null } };
    for (const other of [null, noScale]) {
      const twice = measuredTwice(input, other, 'belt', ASSUMED_MARK_ERROR);
      expect(twice.every(({ lift, turn }) => lift === null && turn === null)).toBe(true);
    }
    const fewer = inputOfMarking(facts, placed(0, made.frames.slice(0, 20)), phases);
    expect(measuredTwice(input, fewer, 'belt', ASSUMED_MARK_ERROR)[30]?.lift).toBeNull();
  });
});
