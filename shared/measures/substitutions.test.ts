import { describe, expect, it } from 'vitest';
import { madeCamera, madeMarks, type Pose } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkId, Marks, Side } from '#shared/landmarks/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { frameValues } from './frame-values.ts';
import { ASSUMED_MARK_ERROR } from './inputs.ts';
import { levelFrame } from './level.ts';
import { averageShares } from './reference-values.ts';
import { measureById, MEASURES } from './registry.ts';
import { isRig, rigOf } from './rig.ts';
import { settingOf } from './setting.ts';

const still: Pose = { lift: degrees(0), femur: degrees(0), pelvis: degrees(0) };
const camera = madeCamera();
const input = (marks: Marks) => ({ frame: frameIndex(0), time: milliseconds(0), marks });

const valuesOf = (side: Side, marks: Marks, bodyHeightMm: number | null = 1720) => {
  const rig = rigOf(camera, { bodyHeightMm }, side);
  if (!isRig(rig)) throw new Error(rig.code);
  const quiet = levelFrame(input(madeMarks(side, still)), camera, ASSUMED_MARK_ERROR);
  const setting = settingOf(rig, [quiet, quiet, quiet], 'bare');
  const values = frameValues(input(marks), setting, ASSUMED_MARK_ERROR);
  return (id: string) => values.find(({ measure }) => measure.id === id)?.value;
};

/** The same marks with one of them moved, px. */
const moved = (marks: Marks, id: LandmarkId, du: number, dv: number): Marks => {
  const mark = marks[id];
  if (!mark || mark.hidden) throw new Error(`${id} is not placed`);
  return { ...marks, [id]: { ...mark, point: framePoint(mark.point.u + du, mark.point.v + dv) } };
};

describe.each(['left', 'right'] as const)('standing on the %s', (side) => {
  const marks = madeMarks(side, still);
  const towards = side === 'left' ? 1 : -1;
  const start = valuesOf(side, marks);

  it('is nought in a straight stance, but for a knee-cap nearer to the lens', () => {
    for (const id of ['trunk-side-bend', 'pelvic-obliquity', 'frontal-plane-projection'])
      expect(Math.abs(start(id)?.value ?? NaN)).toBeLessThan(0.5);
  });

  it('counts a trunk that leans to the support side as plus', () => {
    const bent = madeMarks(side, { ...still, lean: degrees(towards * 10) });
    expect(valuesOf(side, bent)('trunk-side-bend')?.value).toBeCloseTo(10, 6);
  });

  it('counts a hike of the lifted side as plus', () => {
    const hiked = madeMarks(side, { ...still, hikeMm: 10 });
    const value = valuesOf(side, hiked)('pelvic-obliquity')?.value ?? NaN;
    expect(value).toBeCloseTo((Math.atan2(20, 240) * 180) / Math.PI, 6);
  });

  it('counts a drop of the lifted side as adduction of the support hip', () => {
    const dropped = madeMarks(side, { ...still, hikeMm: -10 });
    const change =
      (valuesOf(side, dropped)('support-hip-adduction')?.value ?? NaN) -
      (start('support-hip-adduction')?.value ?? NaN);
    expect(change).toBeGreaterThan(3);
  });

  it('counts a knee that falls inward as valgus', () => {
    const inward = moved(marks, 'kneecap', -towards * 10, 0);
    expect(valuesOf(side, inward)('frontal-plane-projection')?.value).toBeGreaterThan(4);
  });

  it('counts toes that point away from the midline as turn-out', () => {
    const outward = moved(marks, 'toe-support', towards * 10, 0);
    const change =
      (valuesOf(side, outward)('foot-turn-out')?.value ?? NaN) -
      (start('foot-turn-out')?.value ?? NaN);
    expect(change).toBeGreaterThan(5);
  });

  it('gives the heel in millimetres over the quiet stance', () => {
    const raised = moved(marks, 'heel-support', 0, -10);
    expect(valuesOf(side, raised)('heel-rise')?.value).toBeCloseTo(20, 6);
  });

  it('counts a foot that swings to the midline as plus, near a level thigh only', () => {
    const level = madeMarks(side, { ...still, lift: degrees(90) });
    const swung = moved(level, 'ankle-lifted', towards * 20, 0);
    expect(valuesOf(side, swung)('lifted-shank-swing')?.value).toBeGreaterThan(3);
    expect(start('lifted-shank-swing')?.missing).toEqual({
      code: 'only-between-lifts',
      from: 75,
      to: 105,
    });
  });

  it('counts a knee that drifts across as plus', () => {
    const across = moved(marks, 'lifted-knee', towards * 15, 0);
    const change =
      (valuesOf(side, across)('lifted-knee-drift')?.value ?? NaN) -
      (start('lifted-knee-drift')?.value ?? NaN);
    expect(change).toBeCloseTo(30, 6);
  });

  it('asks for the body height that foot turn-out needs', () => {
    expect(valuesOf(side, marks, null)('foot-turn-out')?.missing?.code).toBe('body-height-missing');
  });
});

describe('the registry', () => {
  it('names each measure once and fully', () => {
    expect(new Set(MEASURES.map(({ id }) => id)).size).toBe(MEASURES.length);
    for (const { label, sign, source, views } of MEASURES) {
      expect(label).not.toBe('');
      expect(sign).toMatch(/^plus: /);
      expect(source).not.toBe('');
      expect(views.length).toBeGreaterThan(0);
    }
    expect(measureById('turn')?.unit).toBe('degrees');
    expect(measureById('nothing')).toBeNull();
  });

  it('holds the smallest changes of the specification', () => {
    const smallest = (id: string) => measureById(id)?.smallestChange;
    expect(smallest('trunk-side-bend')).toBe(2.5);
    expect(smallest('pelvic-obliquity')).toBe(4);
    expect(smallest('support-hip-adduction')).toBe(5.5);
    expect(smallest('frontal-plane-projection')).toBe(5);
    expect(smallest('foot-turn-out')).toBe(4);
    expect(smallest('heel-rise')).toBe(8);
  });
});

it('explains an average lift of 90° as 16.29° of pelvis and 73.71° of hip', () => {
  // Murray et al. 2002, Clin Biomech 17:147–151: 18.1 % (seen)
  const { pelvis, hip } = averageShares(degrees(90));
  expect(pelvis).toBeCloseTo(16.29, 9);
  expect(hip).toBeCloseTo(73.71, 9);
});
