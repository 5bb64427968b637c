import { describe, expect, it } from 'vitest';
import { madeCamera, madeMarks } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkId, Mark, Marks, View } from '#shared/landmarks/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from './inputs.ts';
import { type LevelFrame, levelFrame } from './level.ts';
import { lift, liftHalfWidth, liftOf } from './lift.ts';
import { measured, type Measure, type Setting } from './measure.ts';
import { propagate } from './propagate.ts';
import { MEASURES, measureById } from './registry.ts';
import { isRig, rigOf } from './rig.ts';
import { settingOf } from './setting.ts';

/** What a measure says, unknown, where its frame, its view or its quiet stance is not enough. */

const mark = (u: number, v: number): Mark => ({
  hidden: false,
  point: framePoint(u, v),
  scale: 1,
  source: 'hand',
  looked: true,
});

const front = madeMarks('left', { lift: degrees(90), femur: degrees(0), pelvis: degrees(0) });
const still = madeMarks('left', { lift: degrees(0), femur: degrees(0), pelvis: degrees(0) });
const side: Marks = {
  trochanter: mark(500, 800),
  'knee-lateral': mark(700, 1000),
  acromion: mark(520, 500),
  asis: mark(560, 720),
  psis: mark(440, 700),
};

const cameraOf = (view: View, over: Partial<CameraInput> = {}): CameraInput => ({
  ...madeCamera(view),
  toes: 'image-right',
  ...over,
});

const level = (marks: Marks, camera: CameraInput): LevelFrame =>
  levelFrame({ frame: frameIndex(0), time: milliseconds(0), marks }, camera, ASSUMED_MARK_ERROR);

const settingFor = (camera: CameraInput, quiet: Marks | null): Setting => {
  const rig = rigOf(camera, { bodyHeightMm: 1720 }, 'left');
  if (!isRig(rig)) throw new Error(rig.code);
  const frame = quiet && level(quiet, camera);
  return settingOf(rig, frame ? [frame, frame, frame] : [], 'bare');
};

const marksFor = (view: View): Marks => (view === 'front' || view === 'back' ? front : side);
const quietFor = (view: View): Marks => (marksFor(view) === front ? still : side);
const valueOf = (measure: Measure, camera: CameraInput, marks: Marks, quiet: Marks | null) =>
  measure.value(level(marks, camera), settingFor(camera, quiet));

const without = (marks: Marks, id: LandmarkId): Marks => {
  const { [id]: _gone, ...rest } = marks;
  return rest;
};

const INSTANCES = MEASURES.flatMap((measure) =>
  measure.views.map((view) => ({ name: `${measure.id} from the ${view}`, measure, view })),
);

describe.each(INSTANCES)('$name', ({ measure, view }) => {
  const camera = cameraOf(view);
  const marks = marksFor(view);
  const quiet = quietFor(view);

  it('has a finite value and ± where everything is marked', () => {
    const { value, halfWidth } = valueOf(measure, camera, marks, quiet);
    expect(Number.isFinite(value)).toBe(true);
    expect(halfWidth).toBeGreaterThan(0);
  });

  it('names each landmark that is not marked', () => {
    for (const id of measure.landmarks('bare', view))
      expect(valueOf(measure, camera, without(marks, id), quiet).missing).toEqual({
        code: 'landmark-not-marked',
        landmarks: [id],
      });
  });

  it('names each landmark that is hidden', () => {
    for (const id of measure.landmarks('bare', view)) {
      const covered: Marks = { ...marks, [id]: { hidden: true } };
      expect(valueOf(measure, camera, covered, quiet).missing).toEqual({
        code: 'landmark-hidden',
        landmarks: [id],
      });
    }
  });

  it('is either independent of the quiet stance or says that it lacks one', () => {
    const { value, missing } = valueOf(measure, camera, marks, null);
    if (measure.zero === 'quiet stance') expect(missing).toEqual({ code: 'no-quiet-stance' });
    else if (missing) expect(missing.code).toBe('no-quiet-stance');
    else expect(value).toBe(valueOf(measure, camera, marks, quiet).value);
  });
});

describe('a view that cannot show a measure', () => {
  const views: readonly View[] = ['front', 'back', 'lifted-side', 'support-side'];
  it.each(MEASURES.map(({ id }) => id))('is named for %s, or its marks are', (id) => {
    const measure = measureById(id);
    if (!measure) throw new Error(id);
    for (const view of views.filter((each) => !measure.views.includes(each))) {
      const marks = { ...front, ...side };
      const { value, missing } = valueOf(measure, cameraOf(view), marks, marks);
      // thigh against trunk is asked of side clips alone and looks at its marks only
      if (id !== 'thigh-against-trunk') {
        expect(value).toBeNull();
        expect(missing).toEqual({ code: 'view-cannot-show-it', view });
      }
    }
  });
});

describe('the views of a measure', () => {
  // specification: the front shows turn, the lifted side lift, the support side the pelvis
  it.each([
    ['lift', ['front', 'lifted-side', 'support-side']],
    ['turn', ['front']],
    ['thigh-against-trunk', ['lifted-side', 'support-side']],
    ['pelvic-tilt', ['support-side']],
    ['support-hip-extension', ['support-side']],
    ['heel-rise', ['front', 'back']],
  ])('of %s are %j', (id, views) => {
    expect(measureById(id)?.views).toEqual(views);
  });
});

describe('the direction of the toes', () => {
  it.each(['lift', 'thigh-against-trunk', 'support-hip-extension'])('is asked for by %s', (id) => {
    const camera = cameraOf('support-side', { toes: null });
    const measure = measureById(id) ?? lift;
    expect(valueOf(measure, camera, side, side).missing).toEqual({
      code: 'toe-direction-missing',
    });
    expect(liftHalfWidth(level(side, camera), settingFor(camera, side))).toBeGreaterThan(2);
  });
});

describe('a number that cannot be', () => {
  it('never leaves a measure', () => {
    expect(measured(NaN, 1).missing).toEqual({ code: 'marks-coincide' });
    expect(measured(1, Infinity).missing).toEqual({ code: 'marks-coincide' });
    expect(measured(1, null)).toEqual({ value: 1, halfWidth: null, missing: null });
  });

  it('is said to come of both ASIS on one point', () => {
    const camera = cameraOf('front');
    const support = front['asis-support'];
    const one: Marks = support ? { ...front, 'asis-lifted': support } : front;
    const from = settingFor(camera, front);
    expect(liftOf(level(one, camera), from)).toEqual({ code: 'marks-coincide' });
    expect(liftHalfWidth(level(without(front, 'lifted-knee'), camera), from)).toBeNaN();
  });

  it('has no error from a mark that is not there', () => {
    const frame = level(front, cameraOf('front'));
    const known = propagate(frame, ['kneecap'], ({ marks }) => marks.kneecap?.u ?? NaN);
    expect(known).toBeCloseTo(2.4, 9);
    expect(propagate(frame, ['kneecap', 'psis'], ({ marks }) => marks.kneecap?.u ?? NaN)).toBe(
      known,
    );
  });
});

describe('a quiet stance of fewer than three frames', () => {
  it('gives no lengths and no zero', () => {
    const camera = cameraOf('front');
    const { rig } = settingFor(camera, front);
    const frame = level(front, camera);
    const two = settingOf(rig, [frame, frame], 'bare');
    expect(two.reference).toMatchObject({ width: null, kneeWidth: null, thigh: null });
    expect(two.turnZero).toBeNull();
    const three = settingOf(rig, [frame, frame, frame], 'bare');
    expect(three.reference.width).toBeCloseTo(120, 9);
    expect(three.turnZero?.frames).toBe(3);
  });

  it('has its horizon at the lens height above the floor, or at the ASIS without one', () => {
    const camera = cameraOf('front');
    // the made lens looks level at v = 960
    expect(settingFor(camera, still).reference.horizon).toBeCloseTo(960, 9);
    const unknown = settingFor({ ...camera, lensHeightMm: null }, still);
    expect(unknown.reference.horizon).toBeCloseTo(960 - 30, 9);
    expect(settingFor(camera, without(still, 'ankle-support')).reference.horizon).toBeNull();
    const neither = settingFor({ ...camera, lensHeightMm: null }, without(still, 'asis-lifted'));
    expect(neither.reference.horizon).toBeNull();
  });
});

describe('a quiet frame without the marks of a measure', () => {
  const camera = cameraOf('lifted-side');
  const raised = level(side, camera);
  const { rig } = settingFor(camera, side);
  const hanging = level({ ...side, 'knee-lateral': mark(500, 1083) }, camera);
  const blank = level(without(side, 'trochanter'), camera);

  it('does not count for the lift from the side, which needs three that do', () => {
    const three = settingOf(rig, [hanging, hanging, hanging], 'bare');
    const more = settingOf(rig, [hanging, blank, hanging, hanging], 'bare');
    // the knee lies 200 px ahead of the hip and 200 px under it
    expect(liftOf(raised, three)).toBeCloseTo(45, 9);
    expect(liftOf(raised, more)).toBeCloseTo(45, 9);
    const two = settingOf(rig, [hanging, blank, hanging], 'bare');
    expect(liftOf(raised, two)).toEqual({ code: 'no-quiet-stance' });
  });

  it('has no ± of its own', () => {
    const three = settingOf(rig, [hanging, hanging, hanging], 'bare');
    expect(liftHalfWidth(blank, three)).toBeNaN();
    const frontal = settingFor(cameraOf('front'), null);
    expect(liftHalfWidth(level(front, cameraOf('front')), frontal)).toBeNaN();
  });
});
