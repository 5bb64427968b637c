import type { RepCourse } from '#shared/course/course-of-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { restsOnHollow } from '#shared/measures/need.ts';
import { canonicalText } from './canonical.ts';
import type { PlacedWarning, Warning } from './reasons.ts';

/** From our model, no source. */
export const WARNING_LIMITS = {
  offFront: 20,
  plumb: 3,
  nearMm: 2000,
  coarse: 2.5,
  framesPerSecond: 30,
  quietFrames: 5,
  smearPx: 3,
} as const;

/** Furthest a mark moves while the shutter is open, px, over the frames of the fit. */
const smearOf = (course: RepCourse, exposureMs: number): Warning | null => {
  let worst: { px: number; landmark: (typeof ids)[number] } | null = null;
  const ids = landmarksOf(course.set);
  for (const [i, now] of course.level.entries()) {
    const before = course.level[i - 1];
    if (!before || course.frames[i]?.phase !== 'rise') continue;
    for (const landmark of ids) {
      const a = before.marks[landmark];
      const b = now.marks[landmark];
      const gap = now.time - before.time;
      if (!a || !b || gap <= 0) continue;
      const px = (Math.hypot(b.u - a.u, b.v - a.v) / gap) * exposureMs;
      if (!worst || px > worst.px) worst = { px, landmark };
    }
  }
  return worst && worst.px > WARNING_LIMITS.smearPx ? { code: 'smear', ...worst } : null;
};

/** Frames of the fit or of quiet stance that rest on tracked marks nobody has looked at. */
export const hollowFrames = (course: RepCourse): number => {
  const inFit = course.frames.filter((frame) => frame.inFit && frame.provisional).length;
  const quiet = course.setting.reference.frames.filter((frame) =>
    restsOnHollow(frame, landmarksOf(course.set)),
  ).length;
  return inFit + quiet;
};

const warningsOf = (course: RepCourse): readonly Warning[] => {
  const { camera } = course.rep;
  const limits = WARNING_LIMITS;
  const warnings: Warning[] = [];
  if (camera.offFront !== null && Math.abs(camera.offFront) > limits.offFront)
    warnings.push({
      code: 'camera-off-front',
      by: camera.offFront,
      limit: degrees(limits.offFront),
    });
  if (camera.plumbTilt !== null && Math.abs(camera.plumbTilt) > limits.plumb)
    warnings.push({ code: 'plumb-off', by: camera.plumbTilt, limit: degrees(limits.plumb) });
  if (camera.distanceMm !== null && camera.distanceMm < limits.nearMm)
    warnings.push({ code: 'too-near', distanceMm: camera.distanceMm, limitMm: limits.nearMm });
  if (camera.mmPerPx !== null && camera.mmPerPx > limits.coarse)
    warnings.push({ code: 'too-coarse', mmPerPx: camera.mmPerPx, limit: limits.coarse });
  const rate = camera.framesPerSecond;
  // 29.97 frames per second is what phones call 30
  if (rate !== null && rate < limits.framesPerSecond - 0.1)
    warnings.push({
      code: 'slow-frame-rate',
      framesPerSecond: rate,
      limit: limits.framesPerSecond,
    });
  if (camera.mirrored) warnings.push({ code: 'mirrored' });
  const ownLift = camera.view === 'front' && !course.setting.tiedLift;
  if (course.setting.rig.lensHeightMm === null && ownLift)
    warnings.push({
      code: 'lens-height-missing',
      liftHalfWidth: degrees(CONSTANTS.liftModelErrorNoLens.value),
    });
  const quiet = course.setting.turnZero?.frames;
  if (quiet !== undefined && quiet < limits.quietFrames)
    warnings.push({ code: 'few-quiet-frames', have: quiet, recommended: limits.quietFrames });
  if (camera.exposureMs !== null) {
    const smear = smearOf(course, camera.exposureMs);
    if (smear) warnings.push(smear);
  }
  const hollow = hollowFrames(course);
  if (hollow > 0) warnings.push({ code: 'tracked-not-looked-at', frames: hollow });
  return warnings;
};

/** Warnings of all reps; the same warning of several reps stands once. */
export const placedWarnings = (
  courses: readonly RepCourse[],
  thighTurnsLittle: boolean,
): readonly PlacedWarning[] => {
  const placed = new Map<string, { warning: Warning; reps: string[] }>();
  const place = (warning: Warning, rep: string): void => {
    const key = canonicalText(warning);
    const entry = placed.get(key) ?? { warning, reps: [] };
    entry.reps.push(rep);
    placed.set(key, entry);
  };
  for (const course of courses)
    for (const warning of warningsOf(course)) place(warning, course.rep.id);
  if (thighTurnsLittle)
    for (const { rep } of courses)
      place({ code: 'assumed-thigh', sd: degrees(CONSTANTS.thighSpread.value) }, rep.id);
  return [...placed.values()];
};
