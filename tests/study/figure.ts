import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { Body } from './body.ts';
import type { Pose } from './movement.ts';
import type { Skin } from './skin.ts';
import { after, apply, middle, pitched, plus, rolled, times, type Vector, yawed } from './space.ts';

export type Figure = Readonly<Partial<Record<LandmarkId, Vector>>>;

/**
 * Every mark of one pose in the athlete's space, built up from the planted ankle: leg, pelvis, lifted
 * leg. Skin, belt and strap turn away from their bones.
 */
export const figureOf = (body: Body, pose: Pose, skin: Skin, sigma: 1 | -1): Figure => {
  const { lift, turn, femurPart } = pose;
  const support = (ahead: number, outward: number, above: number): Vector => [
    ahead,
    sigma * outward,
    above,
  ];
  // the planted leg leans with the pelvis, about the ankle
  const leg = body.shank + body.thigh;
  const lean = -(sigma * Math.asin(pose.shift / leg) * 180) / Math.PI;
  const tilted = rolled(lean);
  const ankle = support(0, body.hipHalf, body.ankleHeight);
  const knee = plus(ankle, apply(tilted, [0, 0, body.shank]));
  const hip = plus(ankle, apply(tilted, [0, 0, leg]));
  const slipped = (yaw: number, slip: number): number => yaw + sigma * slip;

  const femur = after(tilted, yawed(pose.femurYaw));
  const surface = after(tilted, yawed(slipped(pose.femurYaw, skin.knee(lift, femurPart))));
  const strap = plus(knee, apply(femur, [0, 0, body.strapAbove]));
  const pointer = after(
    tilted,
    yawed(slipped(pose.femurYaw, skin.strap(lift, femurPart)) + body.thighYaw),
  );

  // hike first: the pelvis's direction is that of its forward axis, which a hike does not move
  const raised = after(pitched(-pose.backTilt), rolled(-sigma * pose.hike));
  const pelvis = after(yawed(pose.pelvisYaw), raised);
  const centre = plus(hip, times(apply(pelvis, support(0, body.hipHalf, 0)), -1));
  const onPelvis = (at: Vector): Vector => plus(centre, apply(pelvis, at));
  const asis = (outward: number): Vector =>
    onPelvis(support(body.asisAhead, outward, body.asisAbove));
  const half = body.asisWidth / 2;
  const belt = after(
    yawed(slipped(pose.pelvisYaw, -skin.belt(lift, turn - femurPart))),
    after(raised, yawed(body.beltYaw)),
  );
  const outline = after(
    yawed(slipped(pose.pelvisYaw, -skin.outline(lift, turn - femurPart))),
    raised,
  );
  const hull = (outward: number): Vector =>
    plus(middle(asis(half), asis(-half)), apply(outline, support(-body.outlineBehind, outward, 0)));

  const liftedHip = onPelvis(support(0, -body.hipHalf, 0));
  const raise = (lift * Math.PI) / 180;
  const liftedKnee = plus(
    liftedHip,
    apply(yawed(pose.pelvisYaw / 2), [
      body.thigh * Math.sin(raise),
      0,
      -body.thigh * Math.cos(raise),
    ]),
  );
  return {
    'asis-support': asis(half),
    'asis-lifted': asis(-half),
    'outline-support': hull(body.outlineHalf),
    'outline-lifted': hull(-body.outlineHalf),
    'belt-tip': plus(
      middle(asis(half), asis(-half)),
      apply(belt, [body.beltPointer, body.beltAside, body.beltAbove]),
    ),
    'lifted-knee': liftedKnee,
    // the shank hangs under the knee, a little behind
    'ankle-lifted': plus(liftedKnee, [
      -0.3 * body.shank * Math.sin(raise),
      0,
      -body.shank * Math.sqrt(1 - 0.09 * Math.sin(raise) ** 2),
    ]),
    'ankle-support': ankle,
    kneecap: plus(knee, apply(surface, [body.kneecapAhead, 0, body.kneecapAbove])),
    'knee-inner': plus(knee, apply(surface, support(0, -body.kneeWidth / 2, 0))),
    'knee-outer': plus(knee, apply(surface, support(0, body.kneeWidth / 2, 0))),
    'thigh-tip': plus(strap, apply(pointer, [body.strapRadius + body.thighPointer, 0, 0])),
    // the edges of a round thigh stay where the lens sees them
    'strap-inner': plus(strap, support(0, -body.strapRadius, 0)),
    'strap-outer': plus(strap, support(0, body.strapRadius, 0)),
  };
};
