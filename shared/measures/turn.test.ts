import { describe, expect, it } from 'vitest';
import { madeCamera, madeMarks } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import {
  LANDMARK_SETS,
  type LandmarkSetId,
  type Marks,
  type Side,
} from '#shared/landmarks/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { frameValues } from './frame-values.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from './inputs.ts';
import { levelFrame } from './level.ts';
import type { Setting } from './measure.ts';
import { isRig, rigOf } from './rig.ts';
import { settingOf } from './setting.ts';

const still = { lift: degrees(0), femur: degrees(0), pelvis: degrees(0) };

const input = (marks: Marks) => ({ frame: frameIndex(0), time: milliseconds(0), marks });

const setting = (side: Side, set: LandmarkSetId, over: Partial<CameraInput> = {}): Setting => {
  const camera = { ...madeCamera(), ...over };
  const rig = rigOf(camera, { bodyHeightMm: 1720 }, side);
  if (!isRig(rig)) throw new Error(rig.code);
  const quiet = levelFrame(input(madeMarks(side, still)), camera, ASSUMED_MARK_ERROR);
  return settingOf(rig, [quiet, quiet, quiet], set);
};

const value = (id: string, marks: Marks, from: Setting) =>
  frameValues(input(marks), from, ASSUMED_MARK_ERROR).find(({ measure }) => measure.id === id)
    ?.value;

describe.each(LANDMARK_SETS)('turn with %s', (set) => {
  it('is inward on the right and outward on the left where the pelvis turns to the right over fixed feet', () => {
    // textbook of dance anatomy and kinesiology (seen): 10° to the right → right hip internal
    // rotation 10, left hip external rotation 10
    const pose = { ...still, pelvis: degrees(-10) };
    const right = value('turn', madeMarks('right', pose), setting('right', set))?.value;
    const left = value('turn', madeMarks('left', pose), setting('left', set))?.value;
    expect(Math.abs((right ?? NaN) + 10)).toBeLessThan(0.8);
    expect(Math.abs((left ?? NaN) - 10)).toBeLessThan(0.8);
  });

  it('is the sum of its parts', () => {
    const marks = madeMarks('left', { ...still, pelvis: degrees(-8), femur: degrees(5) });
    const from = setting('left', set);
    const part = (id: string): number => value(id, marks, from)?.value ?? NaN;
    expect(part('pelvis-part') + part('thigh-part')).toBeCloseTo(part('turn'), 9);
    expect(Math.abs(part('pelvis-part') - 8)).toBeLessThan(0.8);
    expect(Math.abs(part('thigh-part') - 5)).toBeLessThan(0.8);
  });
});

describe('a turn that cannot be given', () => {
  const marks = madeMarks('left', still);

  it('names the hidden landmark', () => {
    const covered: Marks = { ...marks, 'asis-lifted': { hidden: true } };
    expect(value('turn', covered, setting('left', 'belt'))?.missing).toEqual({
      code: 'landmark-hidden',
      landmarks: ['asis-lifted'],
    });
  });

  it('names the landmark that was not marked', () => {
    const { 'belt-tip': _tip, ...rest } = marks;
    expect(value('turn', rest, setting('left', 'belt'))?.missing).toEqual({
      code: 'landmark-not-marked',
      landmarks: ['belt-tip'],
    });
    expect(value('lift', rest, setting('left', 'belt'))?.missing).toBeNull();
  });

  it('names the pointer whose length is unknown', () => {
    const without = setting('left', 'belt+thigh', { thighPointerMm: null });
    expect(value('turn', marks, without)?.missing?.code).toBe('thigh-pointer-length-missing');
    const beltless = setting('left', 'belt', { beltPointerMm: 0 });
    expect(value('turn', marks, beltless)?.missing?.code).toBe('belt-pointer-length-missing');
  });
});

describe('scale and distance', () => {
  it('are asked for by name', () => {
    const rig = (over: Partial<CameraInput>) =>
      rigOf({ ...madeCamera(), ...over }, { bodyHeightMm: null }, 'left');
    expect(rig({ mmPerPx: null })).toEqual({ code: 'scale-missing' });
    expect(rig({ mmPerPx: NaN })).toEqual({ code: 'scale-missing' });
    expect(rig({ distanceMm: null })).toEqual({ code: 'distance-missing' });
  });
});

describe('the ± beside one frame', () => {
  it('is smaller with each pointer', () => {
    const marks = madeMarks('left', { ...still, lift: degrees(70) });
    const [bare, belt, both] = LANDMARK_SETS.map(
      (set) => value('turn', marks, setting('left', set))?.halfWidth ?? NaN,
    );
    expect(belt).toBeLessThan(bare ?? NaN);
    expect(both).toBeLessThan((belt ?? NaN) / 2);
  });

  it('is at least what the model and the quiet stance alone give', () => {
    const marks = madeMarks('left', still);
    // three quiet frames: frame variance × (1 + 1/3), and 1.6° of the model
    const both = value('turn', marks, setting('left', 'belt+thigh'))?.halfWidth ?? NaN;
    const femur = (1.5 * 1.2 ** 2) / (170 / 2) ** 2;
    const pelvis = (1.2 ** 2 + 2.4 ** 2 / 2) / (130 / 2) ** 2;
    const variance = (femur + pelvis) * (180 / Math.PI) ** 2;
    expect(both).toBeCloseTo(1.96 * Math.sqrt(variance * (4 / 3) + 1.6 ** 2), 1);
  });
});
