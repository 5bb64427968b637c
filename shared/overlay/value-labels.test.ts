import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { Mark, Marks, Side, View } from '#shared/landmarks/types.ts';
import { type FrameValues, liftArc, valueLabels } from './value-labels.ts';

const at = (u: number, v: number): Mark => ({
  hidden: false,
  point: framePoint(u, v),
  scale: 1,
  source: 'hand',
  looked: true,
});
const values = (over: Partial<FrameValues> = {}): FrameValues => ({
  lift: degrees(74),
  liftHalfWidth: degrees(2),
  turn: degrees(6),
  turnHalfWidth: degrees(3),
  provisional: false,
  ...over,
});
const marks: Marks = {
  'lifted-knee': at(400, 700),
  'knee-lateral': at(450, 720),
  'asis-support': at(600, 500),
};
const labels = (
  over: Partial<FrameValues>,
  view: View = 'front',
  side: Side = 'left',
  on = marks,
) => valueLabels(values(over), on, view, side);

describe('the words beside a mark', () => {
  it('stand on the outer side of each leg, whichever it is and from wherever it is seen', () => {
    const sides = (view: View, side: Side) => labels({}, view, side).map(({ towards }) => towards);
    expect(sides('front', 'left')).toEqual(['left', 'right']);
    expect(sides('front', 'right')).toEqual(['right', 'left']);
    expect(sides('back', 'left')).toEqual(['right', 'left']);
    expect(sides('back', 'right')).toEqual(['left', 'right']);
  });

  it('are given with their ± where it is known', () => {
    expect(labels({}).map(({ text }) => text)[0]).toBe('lift 74° ± 2');
    expect(labels({ liftHalfWidth: null })[0]?.text).toBe('lift 74°');
  });

  it('say under 20° from the front only that it is less, without a ±', () => {
    expect(labels({ lift: degrees(12) })[0]?.text).toBe('lift < 20°');
    expect(labels({ lift: degrees(12) }, 'lifted-side')[0]?.text).toBe('lift 12° ± 2');
  });

  it('stand at the knee that the view shows', () => {
    expect(labels({})[0]?.at).toEqual({ u: 400, v: 700 });
    expect(labels({}, 'support-side')[0]?.at).toEqual({ u: 450, v: 720 });
  });

  it('stand at the edge of the pelvis where it is marked, else at the ASIS', () => {
    const edge = (outline: Mark) =>
      labels({}, 'front', 'left', { ...marks, 'outline-support': outline })[1]?.at;
    expect(edge(at(650, 510))).toEqual({ u: 650, v: 510 });
    expect(edge({ hidden: true })).toEqual({ u: 600, v: 500 });
  });

  it('are not written of what is unknown, not marked or hidden', () => {
    expect(labels({ lift: null, turn: null })).toEqual([]);
    expect(labels({}, 'front', 'left', {})).toEqual([]);
    const hidden: Mark = { hidden: true };
    const covered: Marks = { 'lifted-knee': hidden, 'asis-support': hidden };
    expect(labels({}, 'front', 'left', covered)).toEqual([]);
  });

  it('say that they rest on marks nobody has looked at', () => {
    const [lift, turn] = labels({ provisional: true });
    expect([lift?.state, turn?.state]).toEqual(['tracked', 'tracked']);
    expect(turn?.text).toMatch(/, provisional$/);
  });
});

describe('the arc of lift in a side clip', () => {
  const leg = (u: number, v: number): Marks => ({
    trochanter: at(500, 500),
    'knee-lateral': at(500 + u, 500 + v),
  });
  const arcOf = (on: Marks) => liftArc(on, 'lifted-side')[1];

  it('goes from the plumb to the thigh, on either side of it', () => {
    expect(arcOf(leg(300, 0))).toMatchObject({ from: 180, to: 90, radius: 135 });
    expect(arcOf(leg(-300, 0))).toMatchObject({ from: 180, to: 270 });
  });

  it('is not drawn without a thigh, nor from elsewhere', () => {
    expect(liftArc(leg(300, 0), 'front')).toEqual([]);
    expect(liftArc(leg(300, 0), 'support-side')).toEqual([]);
    expect(liftArc(leg(0, 0), 'lifted-side')).toEqual([]);
    expect(liftArc({ trochanter: at(1, 1) }, 'lifted-side')).toEqual([]);
    expect(liftArc({ 'knee-lateral': at(1, 1) }, 'lifted-side')).toEqual([]);
    for (const id of ['trochanter', 'knee-lateral'] as const)
      expect(liftArc({ ...leg(300, 0), [id]: { hidden: true } }, 'lifted-side')).toEqual([]);
  });
});
