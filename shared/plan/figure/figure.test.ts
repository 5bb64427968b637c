import { describe, expect, it } from 'vitest';
import { EXERCISES, exerciseOf, type ExerciseId } from '../library.ts';
import { DRAWINGS } from '../drawings.ts';
import { BODY, jointsOf, type Joints, type LimbJoints } from './body.ts';
import { FRAME, inFrame, labelOf, type Position } from './drawing.ts';
import { outlineOf, toeOf } from './outline.ts';
import { reach, type Spot } from './reach.ts';

const distance = ([x, y]: Spot, [u, v]: Spot) => Math.hypot(x - u, y - v);

/** Every position with a figure in it. */
const POSITIONS = EXERCISES.flatMap(({ id }) =>
  DRAWINGS[id].positions.flatMap((position) =>
    'sole' in position ? [] : [{ name: `${id}: ${position.name}`, id, position }],
  ),
);
const spotsOf = (joints: Joints): Spot[] => [
  joints.hip,
  joints.shoulder,
  ...[joints.near, joints.far].flatMap(({ joint, end, foot }) => [joint, end, toeOf(end, foot)]),
  ...[joints.nearArm, joints.farArm].flatMap(({ joint, end }) => [joint, end]),
];
const wallOf = ({ props = [] }: Position) =>
  props.flatMap((prop) => (prop.kind === 'wall' ? [prop.at] : []))[0];

describe('reach', () => {
  it('bends to the side that is asked for, by the lengths of its parts', () => {
    // 3, 4, 5: a right angle at the joint
    const [up] = reach([0, 0], [5, 0], [3, 4], 1);
    const [down, end] = reach([0, 0], [5, 0], [3, 4], -1);
    expect(up[0]).toBeCloseTo(1.8, 9);
    expect(up[1]).toBeCloseTo(2.4, 9);
    expect(down[1]).toBeCloseTo(-2.4, 9);
    expect(distance(end, [5, 0])).toBeCloseTo(0, 9);
  });

  it('straightens towards what is too far, and folds no further than it can', () => {
    expect(reach([0, 0], [0, -20], [3, 4], 1)[1]).toEqual([expect.closeTo(0, 9), -7]);
    expect(distance([0, 0], reach([0, 0], [0.1, 0], [3, 4], 1)[1])).toBeCloseTo(1, 9);
  });
});

describe('each drawing', () => {
  it.each(POSITIONS)('$name: bones have their lengths', ({ position }) => {
    const joints = jointsOf(position.pose);
    const bones = ({ root, joint, end }: LimbJoints) => [
      distance(root, joint),
      distance(joint, end),
    ];
    for (const leg of [joints.near, joints.far])
      expect(bones(leg)).toEqual([expect.closeTo(BODY.thigh, 6), expect.closeTo(BODY.shank, 6)]);
    for (const arm of [joints.nearArm, joints.farArm])
      expect(bones(arm)).toEqual([
        expect.closeTo(BODY.upperArm, 6),
        expect.closeTo(BODY.forearm, 6),
      ]);
    expect(distance(joints.hip, joints.shoulder)).toBeCloseTo(BODY.trunk, 6);
  });

  it.each(POSITIONS)('$name: feet reach where they stand, nothing sinks in', ({ position }) => {
    const { pose, props = [] } = position;
    const joints = jointsOf(pose);
    for (const leg of ['near', 'far'] as const)
      expect(distance(joints[leg].end, pose[leg].ankle), leg).toBeLessThan(1.5);
    const step = props.find((prop) => prop.kind === 'step');
    for (const [, up] of spotsOf(joints)) expect(up).toBeGreaterThan(0);
    // whoever does not hop stands on the floor or on a step, or lies
    const lowest = Math.min(joints.near.end[1], joints.far.end[1]);
    if (!position.name.includes('hop'))
      expect(lowest).toBeLessThanOrEqual(20 + (step?.height ?? 0));
    if (step) expect(joints.near.end[1]).toBeGreaterThanOrEqual(step.height);
  });

  it.each(POSITIONS)(
    '$name: stays in its frame, and on this side of a wall',
    ({ id, position }) => {
      const joints = jointsOf(position.pose);
      const place = inFrame(DRAWINGS[id], false);
      for (const spot of [...spotsOf(joints), joints.head]) {
        const [x, y] = place(spot);
        expect(x).toBeGreaterThan(2);
        expect(x).toBeLessThan(FRAME.width - 2);
        expect(y).toBeGreaterThan(16);
        const wall = wallOf(position);
        if (wall !== undefined) expect(spot[0]).toBeLessThanOrEqual(wall);
      }
    },
  );

  it.each(POSITIONS)(
    '$name: shows the weight in the hand that its rule names',
    ({ id, position }) => {
      const { load } = exerciseOf(id).side;
      if (position.load) expect(position.load).toBe(load === 'lifted' ? 'far' : 'near');
      const looks = outlineOf(jointsOf(position.pose), inFrame({}, false), 0.86, position.load);
      expect(looks.some(({ look }) => look === 'load')).toBe(position.load !== undefined);
      expect(looks.map(({ path }) => path).join('')).not.toContain('NaN');
    },
  );

  it('turns with the side, and says so', () => {
    const hip: Spot = [10, 90];
    const [right] = inFrame({}, false)(hip);
    const [left] = inFrame({}, true)(hip);
    expect(right + left).toBeCloseTo(FRAME.width, 9);
    const near = outlineOf(
      jointsOf({
        hip,
        trunk: 0,
        near: { ankle: [0, 8] },
        far: { ankle: [4, 8] },
        nearArm: { hand: [0, 90] },
        farArm: { hand: [0, 90] },
      }),
      inFrame({}, false),
      0.86,
      'near',
    );
    expect(near.filter(({ look }) => look === 'load')).toHaveLength(3);
    for (const { id } of EXERCISES as readonly { id: ExerciseId }[]) {
      const label = labelOf(DRAWINGS[id], 'left', 'right');
      expect(label).toMatch(/left/);
      expect(label).toMatch(/[.]$/);
      expect(label).not.toMatch(/[{}]/);
    }
  });
});
