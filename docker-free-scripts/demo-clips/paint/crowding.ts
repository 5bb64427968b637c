import type { Skeleton } from '../model/skeleton.ts';
import { PART } from '../figure/paints.ts';
import { mix, type Vec } from '../model/vec.ts';
import type { Surfaces } from './surfaces.ts';

/** A ball standing for a piece of the person, in the room; it takes light from what lies near it. */
export interface Blocker {
  readonly at: Vec;
  readonly radius: number;
  readonly part: number;
}

/** Balls along the trunk and legs, enough for the soft darkness where limbs meet. */
export const blockersOf = (bones: Skeleton, place: (point: Vec) => Vec): readonly Blocker[] => {
  const size = bones.body.height / 1680;
  const ball = (at: Vec, radius: number, part: number): Blocker => ({
    at: place(at),
    radius: radius * size,
    part,
  });
  const legs = [bones.support, bones.lifted].flatMap((leg, which) => {
    const part = which === 0 ? PART.supportLeg : PART.liftedLeg;
    return [
      ...[0.15, 0.4, 0.65, 0.9].map((t) => ball(mix(leg.hip, leg.knee, t), 82 - 30 * t, part)),
      ...[0.2, 0.45, 0.7, 0.95].map((t) => ball(mix(leg.knee, leg.ankle, t), 56 - 24 * t, part)),
      ball([leg.ankle[0] + 20, leg.ankle[1], leg.ankle[2] - 34], 40, part),
      ball(
        [
          leg.ankle[0] + 95 * leg.foot.forward[0],
          leg.ankle[1] + 95 * leg.foot.forward[1],
          leg.ankle[2] - 44 + 95 * leg.foot.forward[2],
        ],
        36,
        part,
      ),
    ];
  });
  const trunk = [-0.02, 0.2, 0.45, 0.7, 0.88].map((t) =>
    ball(mix(bones.hipMiddle, bones.acromionMiddle, t), t < 0.1 ? 125 : 112, PART.trunk),
  );
  return [...legs, ...trunk];
};

/** How much of a ball's share of the sky is taken as dark. */
const WEIGHT = 0.8;
const MOST = 0.85;

/**
 * Light left at a point (x, y, z) with normal (nx, ny, nz) among the balls of other parts than its
 * own: 1 is open, 0 is shut.
 */
export const opennessAt = (
  x: number,
  y: number,
  z: number,
  nx: number,
  ny: number,
  nz: number,
  blockers: readonly Blocker[],
  part: number,
): number => {
  let open = 1;
  for (const ball of blockers) {
    if (ball.part === part) continue;
    const dx = ball.at[0] - x;
    const dy = ball.at[1] - y;
    const dz = ball.at[2] - z;
    const far2 = dx * dx + dy * dy + dz * dz;
    const size2 = ball.radius * ball.radius;
    if (far2 > 25 * size2) continue;
    const facing = (nx * dx + ny * dy + nz * dz) / Math.sqrt(far2);
    if (facing > -0.2)
      open *= 1 - Math.min(MOST, (0.2 + facing) * WEIGHT * (size2 / Math.max(far2, size2)));
  }
  return open;
};

/** Darkens every point of the person by the limbs around it; the kit stays bright. */
export const shadeCrowding = (surfaces: Surfaces, blockers: readonly Blocker[]): void => {
  const { points, normals, parts, openness } = surfaces;
  for (let p = 0; p < surfaces.pointCount; p += 1) {
    const part = parts[p] as number;
    openness[p] =
      part === PART.kit
        ? 1
        : opennessAt(
            points[3 * p] as number,
            points[3 * p + 1] as number,
            points[3 * p + 2] as number,
            normals[3 * p] as number,
            normals[3 * p + 1] as number,
            normals[3 * p + 2] as number,
            blockers,
            part,
          );
  }
};
