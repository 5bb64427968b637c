import { midpoint } from '#shared/geometry/points.ts';
import type { Radians } from '#shared/geometry/units.ts';
import type { LandmarkId, LandmarkSetId } from '#shared/landmarks/types.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { CONSTANTS } from './constants.ts';
import type { LevelFrame, LevelMark } from './level.ts';
import type { Reference } from './reference.ts';
import type { Missing } from './missing.ts';
import { lacks } from './need.ts';
import type { Rig } from './rig.ts';
import { yaw, yawLever } from './yaw.ts';

/** Direction of a segment seen from above and the variance of it within one frame, radians². */
export interface SegmentYaw {
  readonly yaw: Radians;
  readonly variance: number;
}

/** What a segment's direction depends on besides its frame. */
export interface YawSetting {
  readonly rig: Rig;
  readonly reference: Reference;
  readonly set: LandmarkSetId;
}

/** Landmarks the turn itself needs: lift is apart. */
export const turnLandmarks = (set: LandmarkSetId): readonly LandmarkId[] =>
  landmarksOf(set).filter(
    (id) => id !== 'lifted-knee' && id !== 'ankle-support' && id !== 'ankle-lifted',
  );

export const pelvisLandmarks = (set: LandmarkSetId): readonly LandmarkId[] =>
  set === 'bare'
    ? ['asis-support', 'asis-lifted', 'outline-support', 'outline-lifted']
    : ['asis-support', 'asis-lifted', 'belt-tip'];

export const femurLandmarks = (set: LandmarkSetId): readonly LandmarkId[] =>
  set === 'belt+thigh'
    ? ['thigh-tip', 'strap-inner', 'strap-outer']
    : ['kneecap', 'knee-inner', 'knee-outer'];

/** Two ends whose middle is the far point, the near point, and the length between, px. */
const segment = (
  a: LevelMark,
  b: LevelMark,
  near: LevelMark,
  length: number,
  rig: Rig,
): SegmentYaw => {
  const angle = yaw((a.u + b.u) / 2, near.u, length, rig.focal, rig.centre);
  const across = near.error ** 2 + (a.error ** 2 + b.error ** 2) / 4;
  return {
    yaw: angle,
    variance: across / yawLever(angle, near.u, length, rig.focal, rig.centre),
  };
};

/** Near end in front of the middle of the far ones, px: half a knee's width, or the pointer. */
export const femurLength = ({ set, rig, reference }: YawSetting): number | null => {
  if (set === 'belt+thigh') return rig.thighPointerPx;
  return reference.kneeWidth === null ? null : reference.kneeWidth / 2;
};

export const femurYaw = (frame: LevelFrame, setting: YawSetting): SegmentYaw | Missing => {
  const { set, rig } = setting;
  const needed = femurLandmarks(set);
  const lack = lacks(frame, needed);
  if (lack) return lack;
  if (set === 'belt+thigh' && rig.thighPointerPx === null)
    return { code: 'thigh-pointer-length-missing' };
  const [near, a, b] = needed.map((id) => frame.marks[id]);
  const length = femurLength(setting);
  if (length === null) return { code: 'no-quiet-stance' };
  return near && a && b ? segment(a, b, near, length, rig) : { code: 'marks-coincide' };
};

export const pelvisYaw = (frame: LevelFrame, setting: YawSetting): SegmentYaw | Missing => {
  const { set, rig } = setting;
  const lack = lacks(frame, pelvisLandmarks(set));
  if (lack) return lack;
  const { 'asis-support': support, 'asis-lifted': lifted } = frame.marks;
  if (!support || !lifted) return { code: 'marks-coincide' };
  if (set !== 'bare') {
    const tip = frame.marks['belt-tip'];
    if (rig.beltPointerPx === null) return { code: 'belt-pointer-length-missing' };
    return tip ? segment(support, lifted, tip, rig.beltPointerPx, rig) : { code: 'marks-coincide' };
  }
  const { 'outline-support': a, 'outline-lifted': b } = frame.marks;
  if (!a || !b) return { code: 'marks-coincide' };
  const near = midpoint(support, lifted);
  const length = rig.outlineDepthPx;
  const angle = yaw((a.u + b.u) / 2, near.u, length, rig.focal, rig.centre);
  const across = (support.error ** 2 + lifted.error ** 2) / 4 + (a.error ** 2 + b.error ** 2) / 4;
  // the golden results take the line of sight at the left ASIS, not at the middle of both
  const left = rig.side === 'left' ? support : lifted;
  return {
    yaw: angle,
    variance: across / yawLever(angle, left.u, length, rig.focal, rig.centre),
  };
};

export const isYaw = (result: SegmentYaw | Missing): result is SegmentYaw => 'yaw' in result;

/** Largest weight of a frame, 1/degrees²: below this variance frames count alike. */
export const frameWeight = (varianceDegrees2: number): number =>
  1 / Math.max(varianceDegrees2, CONSTANTS.leastVariance.value);
