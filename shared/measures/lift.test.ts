import { describe, expect, it } from 'vitest';
import { madeCamera, madeMarks } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkId, Mark, Marks } from '#shared/landmarks/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from './inputs.ts';
import { type LevelFrame, levelFrame } from './level.ts';
import { lift, liftHalfWidth, liftOf } from './lift.ts';
import { thighAgainstTrunk } from './lift-from-side.ts';
import type { Setting } from './measure.ts';
import { pelvicTilt, supportHipExtension } from './pelvic-tilt.ts';
import { propagate } from './propagate.ts';
import { isRig, rigOf } from './rig.ts';
import { settingOf } from './setting.ts';

const pose = (at: number) => ({ lift: degrees(at), femur: degrees(0), pelvis: degrees(0) });

const level = (marks: Marks, camera: CameraInput): LevelFrame =>
  levelFrame({ frame: frameIndex(0), time: milliseconds(0), marks }, camera, ASSUMED_MARK_ERROR);

const settingFor = (camera: CameraInput, quiet: Marks): Setting => {
  const rig = rigOf(camera, { bodyHeightMm: null }, 'left');
  if (!isRig(rig)) throw new Error(rig.code);
  const frame = level(quiet, camera);
  return settingOf(rig, [frame, frame, frame], 'bare');
};

describe('lift from the front', () => {
  const camera = madeCamera();
  const from = settingFor(camera, madeMarks('left', pose(0)));

  it.each([45, 60, 75, 90, 105])('gives %d° within 2°', (truth) => {
    const value = liftOf(level(madeMarks('left', pose(truth)), camera), from);
    expect(Math.abs((value as number) - truth)).toBeLessThan(2);
  });

  it('stays numeric where it is too low to be shown', () => {
    expect(liftOf(level(madeMarks('left', pose(3)), camera), from)).toBeTypeOf('number');
  });

  it('is ± 2° from its model with the lens height and ± 7° without, marks on top', () => {
    const frame = level(madeMarks('left', pose(90)), camera);
    const known = lift.value(frame, from).halfWidth ?? NaN;
    const unknown = lift.value(frame, {
      ...from,
      rig: { ...from.rig, lensHeightMm: null },
    }).halfWidth;
    expect(known).toBeGreaterThan(2);
    expect(known).toBeLessThan(4);
    expect(unknown).toBeCloseTo(Math.sqrt(known ** 2 - 4 + 49), 9);
  });

  it.each(['lifted-knee', 'asis-lifted', 'asis-support'] as const)(
    'follows the error of %s as its derivative says',
    (id) => {
      const frame = level(madeMarks('left', pose(70)), camera);
      const alone: LevelFrame = {
        ...frame,
        marks: Object.fromEntries(
          Object.entries(frame.marks).map(([each, mark]) => [
            each,
            { ...mark, error: each === id ? 2 : 0 },
          ]),
        ),
      };
      const expected = propagate(alone, [id], (each) => liftOf(each, from) as number);
      const spread = Math.sqrt(liftHalfWidth(alone, from) ** 2 - 2 ** 2) / 1.96;
      // 200 draws know a spread to one part in twenty
      expect(Math.abs(spread / expected - 1)).toBeLessThan(0.15);
    },
  );

  it('is not there without a quiet stance', () => {
    const empty = settingOf(from.rig, [], 'bare');
    expect(liftOf(level(madeMarks('left', pose(60)), camera), empty)).toEqual({
      code: 'no-quiet-stance',
    });
  });

  it('cannot be seen from behind', () => {
    const back = madeCamera('back');
    expect(
      liftOf(
        level(madeMarks('left', pose(60)), back),
        settingFor(back, madeMarks('left', pose(0))),
      ),
    ).toEqual({ code: 'view-cannot-show-it', view: 'back' });
  });
});

describe('from the side', () => {
  const mark = (u: number, v: number): Mark => ({
    hidden: false,
    point: framePoint(u, v),
    scale: 1,
    source: 'hand',
    looked: true,
  });
  const leg = (u: number, v: number, extra: Partial<Record<LandmarkId, Mark>> = {}): Marks => ({
    trochanter: mark(500, 800),
    'knee-lateral': mark(500 + u, 800 + v),
    acromion: mark(500, 500),
    ...extra,
  });
  const toTheRight: CameraInput = { ...madeCamera('lifted-side'), toes: 'image-right' };

  it('is positive towards the toes, whichever way they point', () => {
    const left: CameraInput = { ...toTheRight, toes: 'image-left' };
    const raised = (camera: CameraInput, u: number) =>
      liftOf(level(leg(u, 0), camera), settingFor(camera, leg(0, 300)));
    expect(raised(toTheRight, 300)).toBeCloseTo(90, 9);
    expect(raised(left, -300)).toBeCloseTo(90, 9);
  });

  it('asks which way the toes point', () => {
    const camera: CameraInput = { ...toTheRight, toes: null };
    expect(liftOf(level(leg(300, 0), camera), settingFor(camera, leg(0, 300)))).toEqual({
      code: 'toe-direction-missing',
    });
  });

  it('counts a trunk that leans forward into the thigh', () => {
    const from = settingFor(toTheRight, leg(0, 300));
    const upright = thighAgainstTrunk.value(level(leg(300, 0), toTheRight), from);
    expect(upright.value).toBeCloseTo(90, 9);
    const leaning = leg(300, 0, { acromion: mark(500 + 300 * Math.tan(Math.PI / 18), 500) });
    expect(thighAgainstTrunk.value(level(leaning, toTheRight), from).value).toBeCloseTo(100, 6);
  });

  it('gives pelvic tilt and hip extension of the support side', () => {
    const camera: CameraInput = { ...madeCamera('support-side'), toes: 'image-right' };
    const pelvis = { asis: mark(560, 720), psis: mark(440, 700) };
    const marks = leg(-20, 300, pelvis);
    const from = settingFor(camera, marks);
    const tilt = pelvicTilt.value(level(marks, camera), from);
    expect(tilt.value).toBeCloseTo(9.462, 3);
    // thigh 3.814° behind the vertical, pelvis 9.462° forward
    expect(supportHipExtension.value(level(marks, camera), from).value).toBeCloseTo(-5.648, 3);
  });
});
