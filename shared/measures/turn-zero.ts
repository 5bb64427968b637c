import type { Radians } from '#shared/geometry/units.ts';
import { radians } from '#shared/geometry/units.ts';
import { LEAST_QUIET } from './reference.ts';
import { femurYaw, isYaw, pelvisYaw, type YawSetting } from './turn-parts.ts';

/** Where femur and pelvis point at quiet stance, and what that mean's variance is, radians². */
export interface TurnZero {
  readonly femur: Radians;
  readonly pelvis: Radians;
  readonly femurVariance: number;
  readonly pelvisVariance: number;
  readonly frames: number;
}

/** Mean over the quiet frames that carry both parts, at least three; null with fewer. */
export const turnZeroOf = (setting: YawSetting): TurnZero | null => {
  let femur = 0;
  let pelvis = 0;
  let femurVariance = 0;
  let pelvisVariance = 0;
  let frames = 0;
  for (const frame of setting.reference.frames) {
    const f = femurYaw(frame, setting);
    const p = pelvisYaw(frame, setting);
    if (!isYaw(f) || !isYaw(p)) continue;
    if (!Number.isFinite(f.yaw + p.yaw + f.variance + p.variance)) continue;
    femur += f.yaw;
    pelvis += p.yaw;
    femurVariance += f.variance;
    pelvisVariance += p.variance;
    frames += 1;
  }
  if (frames < LEAST_QUIET) return null;
  return {
    femur: radians(femur / frames),
    pelvis: radians(pelvis / frames),
    femurVariance: femurVariance / frames / frames,
    pelvisVariance: pelvisVariance / frames / frames,
    frames,
  };
};
