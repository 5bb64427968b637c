import { describe, expect, it } from 'vitest';
import { anglesOf } from './angles.ts';
import { BODIES } from './bodies.ts';
import { landmarksOf } from './landmarks.ts';
import { poseSkeleton } from './skeleton.ts';
import type { Stance } from './stance.ts';
import { dot, length, sub } from './vec.ts';

const QUIET: Stance = {
  rep: 0,
  support: 'right',
  lift: 0,
  shift: 0,
  pelvisYaw: 0,
  femurYaw: 0,
  trunkYaw: 0,
  obliquity: 0,
  pelvisTilt: 0,
  trunkLean: 0,
  footTurnOut: 8,
  swayMm: [0, 0],
};
const raised = (more: Partial<Stance>): Stance => ({ ...QUIET, shift: 1, ...more });
const bodies = Object.entries(BODIES);
const LIFTS = [0, 8, 25, 60, 90, 112];

describe.each(bodies)('the skeleton of the %s', (_name, body) => {
  it.each(LIFTS)('keeps its bone lengths at %d° of lift', (lift) => {
    const { support, lifted } = poseSkeleton(body, raised({ lift, obliquity: 5, pelvisYaw: 6 }));
    for (const leg of [support, lifted]) {
      expect(length(sub(leg.hip, leg.knee))).toBeCloseTo(body.thigh, 6);
      expect(length(sub(leg.knee, leg.ankle))).toBeCloseTo(body.shank, 6);
    }
  });

  it.each(LIFTS)('keeps both feet on or above the floor at %d° of lift', (lift) => {
    const { support, lifted } = poseSkeleton(body, raised({ lift, obliquity: 2 }));
    expect(support.ankle).toEqual([0, -body.stanceHalfWidth, body.ankleHeight]);
    expect(lifted.ankle[2]).toBeGreaterThan(body.ankleHeight - 1);
  });

  it('shows the angles it was asked for', () => {
    const asked = raised({
      lift: 90,
      pelvisYaw: 7,
      femurYaw: -4,
      obliquity: 6,
      pelvisTilt: 8,
      trunkLean: 3,
    });
    const angles = anglesOf(poseSkeleton(body, asked));
    expect(angles.lift).toBeCloseTo(90, 1);
    expect(angles.yawPelvis).toBeCloseTo(7, 6);
    expect(angles.yawFemur).toBeCloseTo(-4, 6);
    // standing on the right: external = pelvis turned to the left of the femur
    expect(angles.turn).toBeCloseTo(11, 6);
    expect(angles.pelvisTilt).toBeCloseTo(8, 6);
    expect(angles.trunkLean).toBeCloseTo(3, 1);
    expect(angles.footTurnOut).toBeCloseTo(8, 6);
    expect(Math.abs(angles.obliquity - 6)).toBeLessThan(0.6);
  });

  it('mirrors left and right', () => {
    const right = anglesOf(poseSkeleton(body, raised({ lift: 70, pelvisYaw: 5, femurYaw: -2 })));
    const left = anglesOf(
      poseSkeleton(body, raised({ support: 'left', lift: 70, pelvisYaw: -5, femurYaw: 2 })),
    );
    expect(left.turn).toBeCloseTo(right.turn, 9);
    expect(left.lift).toBeCloseTo(right.lift, 9);
  });
});

describe('landmarks', () => {
  const bones = poseSkeleton(BODIES.woman, raised({ lift: 75, pelvisYaw: 6, obliquity: 4 }));
  const places = landmarksOf(bones, { belt: 140, thigh: 125 });
  const place = (id: Parameters<typeof places.get>[0]) => places.get(id) ?? [NaN, NaN, NaN];

  it('put the belt pointer square to the ASIS line, its tip 140 mm ahead of the middle', () => {
    const line = sub(place('asis-support'), place('asis-lifted'));
    const stick = sub(place('belt-tip'), bones.asisMiddle);
    expect(length(stick)).toBeCloseTo(140, 9);
    expect(dot(line, stick)).toBeCloseTo(0, 6);
  });

  it("put the thigh pointer's tip 55 mm and its own length ahead of the strap's middle", () => {
    const [inner, outer] = [place('strap-inner'), place('strap-outer')];
    const middle = [0, 1, 2].map((i) => ((inner[i] ?? NaN) + (outer[i] ?? NaN)) / 2);
    const tip = place('thigh-tip');
    expect(Math.hypot(...middle.map((m, i) => m - (tip[i] ?? NaN)))).toBeCloseTo(180, 9);
  });

  it('put the hip centre 14 % inward and 34.5 % below the ASIS', () => {
    const down = sub(place('asis-lifted'), bones.lifted.hip);
    expect(dot(down, bones.pelvis.up)).toBeCloseTo(0.345 * BODIES.woman.asisWidth, 6);
    expect(dot(down, bones.pelvis.left)).toBeCloseTo(0.14 * BODIES.woman.asisWidth, 6);
  });

  it('are absent where nothing is worn', () => {
    const bare = landmarksOf(bones, { belt: null, thigh: null });
    expect(bare.has('belt-tip') || bare.has('thigh-tip') || bare.has('strap-inner')).toBe(false);
    expect(bare.has('outline-support')).toBe(true);
  });
});
