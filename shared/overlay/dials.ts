import { framePoint, type FramePoint } from '#shared/geometry/points.ts';
import { type Degrees, degrees, toRadians } from '#shared/geometry/units.ts';
import type { Side } from '#shared/landmarks/types.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { Label, OverlayRole, OverlayState, Primitive } from './types.ts';

/** A small drawing of its own, with its own box; u to the right, v down, true to scale. */
export interface Dial {
  readonly width: number;
  readonly height: number;
  readonly primitives: readonly Primitive[];
}

const at = (from: FramePoint, length: number, right: number, down: number): FramePoint =>
  framePoint(from.u + length * right, from.v + length * down);
const say = (
  point: FramePoint,
  text: string,
  towards: Label['towards'],
  role: OverlayRole = 'note',
): Label => ({ kind: 'label', at: point, text, towards, role, state: 'placed' });

/**
 * Lift as seen from the side: hip, plumb, thigh, ticks at both gates. The camera of a front clip
 * stands on the right. Dashed while provisional.
 */
export const liftDial = (lift: Degrees, provisional: boolean, gates: Gates): Dial => {
  const hip = framePoint(34, 30);
  const thigh = 62;
  const away = (angle: Degrees, length: number) =>
    at(hip, length, Math.sin(toRadians(angle)), Math.cos(toRadians(angle)));
  const state: OverlayState = provisional ? 'tracked' : 'placed';
  const knee = away(lift, thigh);
  return {
    width: 150,
    height: 126,
    primitives: [
      {
        kind: 'line',
        from: hip,
        to: at(hip, thigh + 14, 0, 1),
        role: 'note',
        state: 'tracked',
      },
      ...[gates.from, gates.to].flatMap((gate): Primitive[] => [
        {
          kind: 'line',
          from: away(gate, thigh + 6),
          to: away(gate, thigh + 16),
          role: 'note',
          state: 'placed',
        },
        say(away(gate, thigh + 20), `${gate}°`, 'right'),
      ]),
      {
        kind: 'arc',
        centre: hip,
        radius: 26,
        from: degrees(180 - lift),
        to: degrees(180),
        role: 'lifted',
        state,
      },
      { kind: 'line', from: hip, to: knee, role: 'lifted', state },
      { kind: 'diamond', at: knee, role: 'lifted', state, landmark: 'lifted-knee' },
      { kind: 'ring', at: hip, radius: 3, role: 'note', state: 'placed', landmark: null },
      say(framePoint(8, 12), 'from the side', 'right'),
      say(framePoint(144, 120), 'camera →', 'left'),
    ],
  };
};

export interface TurnDialInput {
  readonly supportSide: Side;
  /** Parts of the turn against the quiet stance; they add up to it. */
  readonly pelvisPart: Degrees;
  readonly thighPart: Degrees;
  readonly provisional: boolean;
}

/**
 * Turn as seen from above, the camera below: the pelvis as a bar with its forward pointer, the
 * support thigh's forward direction starting at the support hip. Dotted lines are this person's
 * quiet stance. The person faces the camera, so their left is the picture's right.
 */
export const turnDial = ({
  supportSide,
  pelvisPart,
  thighPart,
  provisional,
}: TurnDialInput): Dial => {
  const sigma = supportSide === 'left' ? 1 : -1;
  // turn = σ(ψ_femur − ψ_pelvis); a yaw is positive towards the athlete's left
  const pelvisYaw = degrees(-sigma * pelvisPart);
  const thighYaw = degrees(sigma * thighPart);
  const state: OverlayState = provisional ? 'tracked' : 'placed';
  const middle = framePoint(75, 44);
  const half = 34;
  const forward = (yaw: Degrees, from: FramePoint, length: number) =>
    at(from, length, Math.sin(toRadians(yaw)), Math.cos(toRadians(yaw)));
  // the athlete's left end of the pelvis, and its right end
  const end = (sign: 1 | -1, yaw: Degrees) =>
    at(middle, half * sign, Math.cos(toRadians(yaw)), -Math.sin(toRadians(yaw)));
  const hip = end(sigma, pelvisYaw);
  const zero = degrees(0);
  const knee = forward(thighYaw, hip, 46);
  const tip = forward(pelvisYaw, middle, 34);
  return {
    width: 150,
    height: 126,
    primitives: [
      {
        kind: 'line',
        from: middle,
        to: forward(zero, middle, 52),
        role: 'note',
        state: 'tracked',
      },
      { kind: 'line', from: hip, to: forward(zero, hip, 58), role: 'note', state: 'tracked' },
      {
        kind: 'line',
        from: end(-1, pelvisYaw),
        to: end(1, pelvisYaw),
        role: 'midline',
        state: 'placed',
      },
      { kind: 'line', from: middle, to: tip, role: 'midline', state },
      { kind: 'bracket', at: tip, role: 'midline', state, landmark: null },
      { kind: 'line', from: hip, to: knee, role: 'support', state },
      { kind: 'ring', at: knee, radius: null, role: 'support', state, landmark: null },
      say(framePoint(75, 12), 'from above', 'centre'),
      say(framePoint(4, 30), 'right', 'right'),
      say(framePoint(146, 30), 'left', 'left'),
      say(framePoint(75, 122), 'camera ↓', 'centre'),
    ],
  };
};
