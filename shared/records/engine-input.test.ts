import { describe, expect, it } from 'vitest';
import type { Boundaries } from '#shared/contracts/reps.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import {
  cameraOf,
  engineMarks,
  frameInputs,
  type MeasuredClip,
  type RepFacts,
  repInputOf,
  timesOf,
} from './engine-input.ts';

const clip: MeasuredClip = {
  width: 1080,
  height: 1920,
  geometry: {
    scale: null,
    distanceMm: 3000,
    lensHeightMm: 900,
    beltPointerMm: 130,
    thighPointerMm: 115,
    plumb: null,
    floorLine: null,
    shutter: null,
  },
  mmPerPx: 2,
  frameRate: { perSecond: 60, variable: false, minPerSecond: 60, maxPerSecond: 60 },
  mirrored: false,
  cameraStood: 'front',
};

const point = (u: number, over: Partial<Extract<MarkValue, { to: 'point' }>> = {}): MarkValue => ({
  to: 'point',
  point: framePoint(u, 400),
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
  ...over,
});

const FOUND: Boundaries = {
  quietStart: null,
  quietEnd: { frame: 1, by: 'found' },
  footOff: { frame: 1, by: 'hand' },
  top: { frame: 99, by: 'hand' },
  topEnd: { frame: 2, by: 'hand' },
  footDown: null,
};

const facts: RepFacts = {
  rep: { id: 'r', supportSide: 'right', view: 'front', boundaries: FOUND, excluded: 'hopped' },
  clip,
  times: [0, 16, 33].map(milliseconds),
  marks: new Map([
    [frameIndex(2), { kneecap: point(20) }],
    [frameIndex(0), { kneecap: point(10) }],
  ]),
  bodyHeightMm: 1720,
};

describe('the times of a clip', () => {
  it('come exactly from the ticks of its time base', () => {
    const ticks = [0, 1001, 2002];
    expect(timesOf({ count: 3, ticks, timeBase: { num: 1, den: 30_000 } })).toEqual(
      ticks.map((tick) => tick / 30),
    );
  });
});

describe('the camera', () => {
  it('is unknown until the size of the picture is', () => {
    expect(cameraOf({ ...clip, width: null }, 'front')).toBeNull();
    expect(cameraOf({ ...clip, height: null }, 'front')).toBeNull();
    expect(repInputOf({ ...facts, clip: { ...clip, width: null } })).toBeNull();
  });

  it('takes the thigh pointer to the axis of the femur, 55 mm behind the skin', () => {
    expect(cameraOf(clip, 'front')).toMatchObject({ beltPointerMm: 130, thighPointerMm: 170 });
    const without = { ...clip, geometry: { ...clip.geometry, thighPointerMm: null } };
    expect(cameraOf(without, 'front')?.thighPointerMm).toBeNull();
  });

  it('reads the tilt of the plumb line, positive with its lower end to the right', () => {
    const plumb = { top: { u: 500, v: 100 }, bottom: { u: 600, v: 1100 } };
    const leaning = { ...clip, geometry: { ...clip.geometry, plumb } };
    expect(cameraOf(leaning, 'front')?.plumbTilt).toBeCloseTo(
      (Math.atan2(100, 1000) * 180) / Math.PI,
      12,
    );
    expect(cameraOf(clip, 'front')?.plumbTilt).toBeNull();
  });

  it('knows no frame rate where the clip has none', () => {
    expect(cameraOf(clip, 'front')?.framesPerSecond).toBe(60);
    expect(cameraOf({ ...clip, frameRate: null }, 'front')?.framesPerSecond).toBeNull();
  });

  it.each([
    ['athlete-left', false, 'image-left'],
    ['athlete-right', false, 'image-right'],
    ['athlete-left', true, 'image-left'],
    ['athlete-right', true, 'image-right'],
    ['front', false, null],
    ['back', true, null],
  ] as const)(
    'stood at %s, mirrored %s: with its mirroring taken out, the toes point to %s',
    (cameraStood, mirrored, toes) => {
      expect(cameraOf({ ...clip, cameraStood, mirrored }, 'lifted-side')?.toes).toBe(toes);
    },
  );
});

describe('the marks of a frame', () => {
  it('cost certainty on a coarser picture and gain none on a finer one', () => {
    const marks = engineMarks(
      {
        kneecap: point(1, { pictureLongEdge: 960 }),
        'belt-tip': point(2, { pictureLongEdge: 3840, source: 'tracked', looked: false }),
        'lifted-knee': { to: 'hidden' },
      },
      1920,
    );
    expect(marks).toEqual({
      kneecap: { hidden: false, point: { u: 1, v: 400 }, scale: 2, source: 'hand', looked: true },
      'belt-tip': {
        hidden: false,
        point: { u: 2, v: 400 },
        scale: 1,
        source: 'tracked',
        looked: false,
      },
      'lifted-knee': { hidden: true },
    });
  });

  it('stand in the order of the clip; a frame beyond its end is left out', () => {
    const marks = new Map([...facts.marks, [frameIndex(3), { kneecap: point(30) }]]);
    const frames = frameInputs(marks, facts.times, 1920);
    expect(frames.map(({ frame, time }) => [frame, time])).toEqual([
      [0, 0],
      [2, 33],
    ]);
  });
});

describe('a rep', () => {
  it('takes over what a hand moved, and only where the clip has that frame', () => {
    const input = repInputOf(facts);
    expect(input?.moved).toEqual({ footOff: 16, lowerFrom: 33 });
    expect(input).toMatchObject({
      id: 'r',
      supportSide: 'right',
      athlete: { bodyHeightMm: 1720 },
      excluded: 'hopped',
      labels: null,
      sharedQuiet: null,
    });
    expect(input?.frames).toHaveLength(2);
  });
});
