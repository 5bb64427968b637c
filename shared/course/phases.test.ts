import { describe, expect, it } from 'vitest';
import { MADE_GAP_MS, MADE_LIFTS, madeRep } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { LandmarkId, Marks } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { courseOfRep, isCourse, type RepCourse } from './course-of-rep.ts';
import type { RepInput } from './types.ts';

const courseOf = (rep: RepInput): RepCourse => {
  const course = courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};

const rep = madeRep('left', () => 0);
const phasesOf = (input: RepInput) => courseOf(input).phases;
const at = (lift: number): number => MADE_LIFTS.indexOf(lift) * MADE_GAP_MS;

/** The same rep with marks of some frames moved, px. */
const shifted = (
  ids: readonly LandmarkId[],
  by: (index: number) => { readonly u: number; readonly v: number },
  input: RepInput = rep,
): RepInput => ({
  ...input,
  frames: input.frames.map((frame, i) => {
    const marks: Partial<Record<LandmarkId, Marks[LandmarkId]>> = { ...frame.marks };
    for (const id of ids) {
      const mark = marks[id];
      if (mark && !mark.hidden)
        marks[id] = { ...mark, point: framePoint(mark.point.u + by(i).u, mark.point.v + by(i).v) };
    }
    return { ...frame, marks };
  }),
});

describe('a whole rep', () => {
  const { boundaries, byFrame, footOffHalfGap, moved } = phasesOf(rep);

  it('starts quiet, and quiet ends before the foot is off', () => {
    // three frames more than the still ones lift the ankle by less than 15 mm
    expect(byFrame.slice(0, 12).every((phase) => phase === 'quiet')).toBe(true);
    expect(boundaries.quietFrom).toBe(0);
    expect(boundaries.quietTo).toBeLessThan(boundaries.footOff ?? NaN);
    expect(boundaries.quietTo).toBe(rep.frames[byFrame.lastIndexOf('quiet')]?.time);
  });

  it('finds foot off between the marks around 25 mm, ± half their gap', () => {
    // 25 mm of height at 20° of a 430 mm thigh, later in the picture as the foot comes nearer
    expect(boundaries.footOff).toBeGreaterThan(at(20));
    expect(boundaries.footOff).toBeLessThan(at(35));
    expect(footOffHalfGap).toBe(MADE_GAP_MS / 2);
  });

  it('ends the rise with the plateau and the lowering with foot down', () => {
    expect(boundaries.top).toBeGreaterThanOrEqual(at(111));
    expect(boundaries.lowerFrom).toBe(at(111) + 3 * MADE_GAP_MS);
    expect(boundaries.footDown).toBeGreaterThan(boundaries.lowerFrom ?? NaN);
    const seen = byFrame.filter((phase, i) => phase !== byFrame[i - 1]);
    expect(seen).toEqual(['quiet', 'rise', 'lower', 'between']);
    expect(moved).toEqual([]);
  });

  it('takes the mean of the two largest lifts as the highest', () => {
    expect(courseOf(rep).fMax).toBeGreaterThan(109);
    expect(courseOf(rep).fMax).toBeLessThan(115);
  });
});

describe('what is found', () => {
  it('gives way to what the coach moved', () => {
    const footOff = milliseconds(800);
    const lowerFrom = milliseconds(1500);
    const phases = phasesOf({ ...rep, moved: { footOff, lowerFrom } });
    expect(phases.boundaries.footOff).toBe(800);
    expect(phases.boundaries.lowerFrom).toBe(1500);
    expect(phases.moved).toEqual(['footOff', 'lowerFrom']);
    expect(phases.footOffHalfGap).toBeNull();
    for (const [i, { time }] of rep.frames.entries())
      if (phases.byFrame[i] === 'rise') {
        expect(time).toBeGreaterThanOrEqual(800);
        expect(time).toBeLessThanOrEqual(1500);
      }
  });

  it('takes quiet frames by hand as they are', () => {
    const phases = phasesOf({
      ...rep,
      moved: { quietFrom: milliseconds(100), quietTo: milliseconds(300) },
    });
    const quiet = rep.frames.filter((_, i) => phases.byFrame[i] === 'quiet');
    expect(quiet.map(({ time }) => time)).toEqual([100, 150, 200, 250, 300]);
  });

  it('is not foot off where the next mark does not confirm it', () => {
    const blip = shifted(['ankle-lifted'], (i) => ({ u: 0, v: i === 8 ? -40 : 0 }));
    expect(phasesOf(blip).boundaries.footOff).toBeCloseTo(
      phasesOf(rep).boundaries.footOff ?? NaN,
      0,
    );
  });

  it('ends quiet stance where the weight shifts', () => {
    // 20 mm to the support side from the sixth frame on, at 2 mm per pixel
    const swaying = shifted(['asis-support', 'asis-lifted'], (i) => ({ u: i >= 7 ? 10 : 0, v: 0 }));
    const { byFrame } = phasesOf(swaying);
    expect(byFrame.slice(0, 7).every((phase) => phase === 'quiet')).toBe(true);
    expect(byFrame[7]).toBe('between');
  });

  it('leaves frames that fall 8° under the highest out of the rise', () => {
    const dip = MADE_LIFTS.indexOf(60);
    const fallen = shifted(['lifted-knee'], (i) => ({ u: 0, v: i === dip ? 60 : 0 }));
    const { byFrame } = phasesOf(fallen);
    expect(byFrame[dip]).toBe('between');
    expect(byFrame[dip - 1]).toBe('rise');
    expect(byFrame[dip + 1]).toBe('rise');
  });

  it('is nothing without ankles', () => {
    const bare: RepInput = {
      ...rep,
      frames: rep.frames.map((frame) => {
        const { 'ankle-lifted': _gone, ...marks } = frame.marks;
        return { ...frame, marks };
      }),
    };
    const phases = phasesOf(bare);
    expect(phases.boundaries.footOff).toBeNull();
    expect(phases.byFrame.includes('rise')).toBe(false);
    expect(phases.byFrame.includes('quiet')).toBe(false);
  });
});

describe('reps in a row', () => {
  const first = rep.frames.slice(0, 10);
  const later: RepInput = { ...rep, frames: rep.frames.slice(20), sharedQuiet: first };

  it('share the quiet stance of their clip', () => {
    const course = courseOf(later);
    expect(course.phases.byFrame.includes('quiet')).toBe(false);
    expect(course.setting.reference.frames).toHaveLength(10);
    const rise = course.frames.filter(({ phase }) => phase === 'rise');
    expect(rise.length).toBeGreaterThan(15);
    expect(rise.every(({ turn }) => turn !== null)).toBe(true);
  });

  it('have no turn without one', () => {
    const course = courseOf({ ...later, sharedQuiet: null });
    expect(course.frames.every(({ turn }) => turn === null)).toBe(true);
  });
});

describe('phases known from elsewhere', () => {
  it('are taken as they are', () => {
    const labels = rep.frames.map((_, i) => (i < 5 ? 'quiet' : i < 30 ? 'rise' : 'lower'));
    const course = courseOf({ ...rep, labels });
    expect(course.phases.byFrame).toEqual(labels);
    expect(course.setting.reference.frames).toHaveLength(5);
    expect(course.phases.boundaries.lowerFrom).toBe(29 * MADE_GAP_MS);
  });

  it('have their quiet stance and their top where the labels and the marks put them', () => {
    const last = MADE_LIFTS.indexOf(90);
    const labels = rep.frames.map((_, i) => (i < 5 ? 'quiet' : i <= last ? 'rise' : 'lower'));
    const { boundaries } = phasesOf({ ...rep, labels });
    expect(boundaries.quietTo).toBe(4 * MADE_GAP_MS);
    // 90° stands alone: a highest lift needs a second frame
    expect(boundaries.top).toBe(at(85));
  });

  it('have their top in the first frame where nothing is higher', () => {
    const top = rep.frames.slice(MADE_LIFTS.indexOf(112), MADE_LIFTS.indexOf(112) + 8);
    const frames = [...top, ...rep.frames.slice(0, 5)].map((frame, i) => ({
      ...frame,
      time: milliseconds(i * MADE_GAP_MS),
    }));
    const labels = frames.map((_, i) => (i < top.length ? 'rise' : 'quiet'));
    expect(phasesOf({ ...rep, frames, labels }).boundaries.top).toBe(0);
  });
});

describe('too little', () => {
  it.each([0, 1, 2])('is no error with %d frames', (n) => {
    const course = courseOf({ ...rep, frames: rep.frames.slice(0, n) });
    expect(course.frames).toHaveLength(n);
    expect(course.fMax).toBeNull();
    expect(course.frames.every(({ turn }) => turn === null)).toBe(true);
  });
});
