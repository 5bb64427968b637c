import type { RepCourse } from '#shared/course/course-of-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { FILMING_LIMITS as LIMITS, isSlow } from '#shared/measures/filming-limits.ts';
import { restsOnHollow } from '#shared/measures/need.ts';
import {
  gatesOf,
  type ReadingRules,
  sameGates,
  STANDARD_GATES,
  STANDARD_RULES,
} from '#shared/protocol/protocol.ts';
import { canonicalText } from './canonical.ts';
import type { PlacedWarning, Warning } from './reasons.ts';

/** Furthest a mark moves while the shutter is open, px, over the frames of the fit. */
const smearOf = (course: RepCourse): Warning | null => {
  const { exposureMs, smearPx } = course.rep.camera;
  const limit = LIMITS.smearPx.value;
  if (smearPx !== undefined && smearPx > limit)
    return { code: 'smear', px: smearPx, landmark: null, limit };
  if (exposureMs === null) return null;
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
  return worst && worst.px > limit ? { code: 'smear', ...worst, limit } : null;
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
  const warnings: Warning[] = [];
  const { offFront, plumbTilt, distanceMm, mmPerPx, framesPerSecond } = camera;
  if (offFront !== null && Math.abs(offFront) > LIMITS.offFront.value)
    warnings.push({
      code: 'camera-off-front',
      by: offFront,
      limit: degrees(LIMITS.offFront.value),
    });
  if (plumbTilt !== null && Math.abs(plumbTilt) > LIMITS.plumb.value)
    warnings.push({ code: 'plumb-off', by: plumbTilt, limit: degrees(LIMITS.plumb.value) });
  if (distanceMm !== null && distanceMm < LIMITS.nearMm.value)
    warnings.push({ code: 'too-near', distanceMm, limitMm: LIMITS.nearMm.value });
  if (mmPerPx !== null && mmPerPx > LIMITS.coarse.value)
    warnings.push({ code: 'too-coarse', mmPerPx, limit: LIMITS.coarse.value });
  if (framesPerSecond !== null && isSlow(framesPerSecond))
    warnings.push({
      code: 'slow-frame-rate',
      framesPerSecond,
      limit: LIMITS.framesPerSecond.value,
    });
  if (camera.mirrored) warnings.push({ code: 'mirrored' });
  const ownLift = camera.view === 'front' && !course.setting.tiedLift;
  if (course.setting.rig.lensHeightMm === null && ownLift)
    warnings.push({
      code: 'lens-height-missing',
      liftHalfWidth: degrees(CONSTANTS.liftModelErrorNoLens.value),
    });
  const quiet = course.setting.turnZero?.frames;
  if (quiet !== undefined && quiet < LIMITS.quietFrames.value)
    warnings.push({
      code: 'few-quiet-frames',
      have: quiet,
      recommended: LIMITS.quietFrames.value,
    });
  const smear = smearOf(course);
  if (smear) warnings.push(smear);
  const hollow = hollowFrames(course);
  if (hollow > 0) warnings.push({ code: 'tracked-not-looked-at', frames: hollow });
  return warnings;
};

/** What the study cannot speak for. */
const warningsOfRules = (rules: ReadingRules): readonly Warning[] => {
  const gates = gatesOf(rules);
  const lowered = (['early', 'before', 'turnIn', 'flat'] as const).find(
    (limit) => rules[limit] < STANDARD_RULES[limit],
  );
  return [
    ...(sameGates(gates, STANDARD_GATES) ? [] : [{ code: 'gates-not-studied' as const, ...gates }]),
    ...(lowered
      ? [
          {
            code: 'limit-lowered' as const,
            limit: rules[lowered],
            studied: STANDARD_RULES[lowered],
          },
        ]
      : []),
  ];
};

/** What the reading rests on beside its courses. */
interface Grounds {
  readonly thighTurnsLittle: boolean;
  readonly rules: ReadingRules;
}

/** Warnings of all reps; the same warning of several reps stands once. */
export const placedWarnings = (
  courses: readonly RepCourse[],
  { thighTurnsLittle, rules }: Grounds,
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
  const ofAll: readonly Warning[] = [
    ...(thighTurnsLittle
      ? [{ code: 'assumed-thigh' as const, sd: degrees(CONSTANTS.thighSpread.value) }]
      : []),
    ...warningsOfRules(rules),
  ];
  for (const warning of ofAll) for (const { rep } of courses) place(warning, rep.id);
  return [...placed.values()];
};
