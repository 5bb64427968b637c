import { describe, expect, it } from 'vitest';
import { madeFront, madeLiftAt, type MadeMotion, madeSide } from '#shared/evaluate/made-pair.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import { liftScale } from '#src/ui/plots/lift-scale.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { liftCurve, sideReps, topHalfWidth } from './lift-curves.ts';

const MOTION: MadeMotion = {
  side: 'right',
  stillMs: 1200,
  upMs: 1800,
  holdMs: 400,
  highest: 108,
  turnAt: () => 0,
};
const START = 2475;
const side = madeSide(MOTION, { startMs: START, stepMs: 25, scatterPx: 1, seed: 4 });
const front = madeFront(MOTION, { startMs: 310, stepMs: 1000 / 30, scatterPx: 1, seed: 3 });
const { reps } = deriveReading(
  {
    engine: 2,
    supportSide: 'right',
    set: null,
    thighTurnsLittle: false,
    markError: ASSUMED_MARK_ERROR,
    ownSystematic: null,
    rules: STANDARD_RULES,
    reps: [front, side, { ...side, id: 'left out', excluded: 'hopped' }],
  },
  20,
);

describe('the lift of a side clip', () => {
  it('is drawn of side clips that nobody has left out, and of no other', () => {
    expect(sideReps(reps).map(({ id }) => id)).toEqual(['side']);
  });

  it('runs from foot off, near the true lift, as near as its band says', () => {
    const [rep] = sideReps(reps);
    if (!rep) throw new Error('no side rep');
    const { fromFootOff, points } = liftCurve(rep);
    expect(fromFootOff).toBe(true);
    expect(points.filter(({ startsRun }) => startsRun)).toHaveLength(1);
    const footOff = Number(rep.phases?.boundaries.footOff);
    // foot off counts once the foot is 25 mm up
    expect(footOff - START).toBeGreaterThan(MOTION.stillMs);
    expect(footOff - START).toBeLessThan(MOTION.stillMs + 900);
    const inside = points.filter(({ time, line, halfWidth }) => {
      const truth = madeLiftAt(MOTION, footOff + 1000 * time - START);
      return Math.abs(line - truth) <= (halfWidth ?? 0);
    });
    expect(inside.length / points.length).toBeGreaterThanOrEqual(0.95);
    expect(Math.max(...points.map(({ lift }) => lift))).toBeGreaterThan(104);
    expect(topHalfWidth(rep)).toBeGreaterThanOrEqual(2);
  });

  it('breaks where the marks do, and starts at the first of them where no foot off is seen', () => {
    const [rep] = sideReps(reps);
    if (!rep) throw new Error('no side rep');
    const rising = rep.frames.findIndex(({ lift }) => (lift ?? 0) > 30);
    const gap = { ...rep, frames: rep.frames.filter((_, i) => i < rising || i > rising + 14) };
    expect(liftCurve(gap).points.filter(({ startsRun }) => startsRun)).toHaveLength(2);
    const unseen = liftCurve({ ...rep, phases: null });
    expect(unseen.fromFootOff).toBe(false);
    expect(unseen.points[0]?.time).toBe(0);
  });
});

describe('the scale of lift over time', () => {
  const curve = (lift: number) => ({
    fromFootOff: true,
    points: [
      { time: -1, lift: 0, line: 0, halfWidth: 2, startsRun: true, hollow: false },
      { time: 2, lift, line: lift, halfWidth: 3, startsRun: false, hollow: false },
    ],
  });
  it('holds every value with its band, and 60° and 90° even where nothing reaches them', () => {
    const low = liftScale(600, 300, [curve(40)]);
    expect(low.yTicks).toEqual([0, 30, 60, 90]);
    expect(low.y(105)).toBe(low.top);
    const high = liftScale(300, 300, [curve(128)]);
    expect(high.y(131)).toBe(high.top);
    expect(high.x(-1)).toBe(high.left);
    expect(high.x(2)).toBe(high.right);
    expect(high.yTicks).toEqual([0, 30, 60, 90, 120]);
  });
});
