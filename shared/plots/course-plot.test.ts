import { describe, expect, it } from 'vitest';
import { courseScale, turnRange } from './course-scale.ts';
import { runsOf, turnsToHold, wedgePath } from './course-shapes.ts';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';

const point = (lift: number, turn: number, carried = true) => ({
  lift,
  turn,
  low: turn - 1,
  high: turn + 1,
  carried,
});

describe('turnRange', () => {
  it('never shows less than −10° to +20°', () => {
    expect(turnRange([])).toEqual([-10, 20]);
    expect(turnRange([3, 7])).toEqual([-10, 20]);
  });
  it('grows in whole steps and passes over what is not a number', () => {
    expect(turnRange([-13.2, 21, Number.NaN])).toEqual([-15, 25]);
  });
});

describe('courseScale', () => {
  it('puts out on top and more lift to the right', () => {
    const scale = courseScale(700, 372, [], STANDARD_GATES);
    expect(scale.y(20)).toBe(scale.top);
    expect(scale.y(-10)).toBe(scale.bottom);
    expect(scale.x(90)).toBeGreaterThan(scale.x(60));
    expect(scale.xTicks).toEqual([15, 30, 45, 60, 75, 90, 105]);
  });
  it('has a tick for each gate and none that runs into it', () => {
    const scale = courseScale(700, 372, [], { from: degrees(50), to: degrees(80) });
    expect(scale.xTicks).toEqual([15, 30, 50, 60, 80, 90, 105]);
  });
  it('says less where there is little room, but always 60 and 90', () => {
    const scale = courseScale(328, 296, [], STANDARD_GATES);
    expect(scale.compact).toBe(true);
    expect(scale.xTicks).toEqual([30, 60, 90]);
    expect(scale.yTicks).toEqual([-10, 0, 10, 20]);
  });
});

describe('runsOf', () => {
  it('breaks a curve where no marked frame carries it, without a hole', () => {
    const curve = [point(60, 0), point(70, 1), point(80, 2, false), point(90, 3), point(95, 4)];
    expect(runsOf(curve).map((run) => [run.carried, run.points.map((each) => each.lift)])).toEqual([
      [true, [60, 70]],
      [false, [70, 80, 90]],
      [true, [90, 95]],
    ]);
  });
  it('has none for fewer than two points', () => {
    expect(runsOf([point(60, 0)])).toEqual([]);
  });
});

describe('wedgePath', () => {
  it('starts at the course’s own value at 60°', () => {
    const scale = courseScale(700, 372, [], STANDARD_GATES);
    const path = wedgePath(3, [-1, -12], scale);
    expect(path.startsWith(`M${scale.x(60)},${scale.y(3)}L`)).toBe(true);
    expect(path.endsWith(`${scale.x(90)},${scale.y(-9)}Z`)).toBe(true);
  });
});

describe('turnsToHold', () => {
  const wide = { ...point(30, -1), low: -45, high: 43 };
  it('holds the line, and its band from gate to gate alone', () => {
    const curve = [wide, point(60, 1), point(90, 8), { ...point(105, 10), low: -9, high: 29 }];
    const held = [...turnsToHold(curve, STANDARD_GATES)];
    expect(held).toEqual([-1, 1, 0, 2, 8, 7, 9, 10, -11]);
    expect(turnRange(held)).toEqual([-15, 20]);
  });
  it('asks for no wedge where the course does not reach the lower gate', () => {
    expect([...turnsToHold([wide], STANDARD_GATES)]).toEqual([-1]);
  });
});
