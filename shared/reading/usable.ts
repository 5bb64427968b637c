import type { RepCourse } from '#shared/course/course-of-rep.ts';
import type { CourseFrame, RepInput } from '#shared/course/types.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import type { LandmarkId, LandmarkSetId, Side } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { isPlausible } from '#shared/measures/level.ts';
import { missingLengths } from '#shared/measures/rig.ts';
import { LEAST_QUIET } from '#shared/measures/reference.ts';
import { bandsOf } from '#shared/protocol/bands.ts';
import type { ReadingRules } from '#shared/protocol/protocol.ts';
import { timestampFault } from '#shared/timing/timestamps.ts';
import type { FewFrames, RepFault } from './reasons.ts';

interface Least {
  readonly code: Exclude<FewFrames['code'], 'few-quiet'>;
  readonly need: number;
  readonly from: Degrees;
  readonly to: Degrees | null;
}

/**
 * Fewest marked frames of the rise, by lift, both bounds included. How many is no matter of taste:
 * the fit has four unknowns.
 */
export const leastFrames = (rules: ReadingRules): readonly Least[] => {
  const { from, to, across } = bandsOf(rules);
  return [
    { code: 'few-near-60', need: 2, ...from },
    { code: 'few-near-90', need: 2, ...to },
    { code: 'few-across-window', need: 4, ...across },
    { code: 'few-in-rise', need: 7, from: degrees(CONSTANTS.leastLift.value), to: null },
  ];
};

export const inBand = (lift: Degrees, { from, to }: Pick<Least, 'from' | 'to'>): boolean =>
  lift >= from && (to === null || lift <= to);

const implausible = (rep: RepInput): readonly LandmarkId[] => {
  const bad = new Set<LandmarkId>();
  for (const { marks } of [...rep.frames, ...(rep.sharedQuiet ?? [])])
    for (const id of Object.keys(marks) as LandmarkId[]) {
      const mark = marks[id];
      if (mark && !mark.hidden && !isPlausible(mark)) bad.add(id);
    }
  return [...bad];
};

/** What no landmark set can mend. */
export const faultsOfInput = (rep: RepInput, side: Side): readonly RepFault[] => {
  const faults: RepFault[] = [];
  if (rep.excluded) faults.push({ code: 'excluded', reason: rep.excluded });
  if (rep.supportSide !== side) faults.push({ code: 'other-side' });
  if (rep.camera.view !== 'front')
    faults.push({ code: 'view-cannot-show-turn', view: rep.camera.view });
  if (rep.frames.length === 0) faults.push({ code: 'no-frames' });
  const fault =
    timestampFault(rep.frames.map((frame) => frame.time)) ??
    timestampFault(rep.sharedQuiet?.map((frame) => frame.time) ?? []);
  if (fault) faults.push({ code: 'bad-timestamps', fault });
  const landmarks = implausible(rep);
  if (landmarks.length > 0) faults.push({ code: 'marks-implausible', landmarks });
  return faults;
};

/** Lifts of the rise frames that carry a turn. */
const turnedLifts = (frames: readonly CourseFrame[]): readonly Degrees[] =>
  frames.flatMap(({ phase, lift, turn }) =>
    phase === 'rise' && lift !== null && turn !== null ? [lift] : [],
  );

/** What a rep lacks for a fit with the landmark set of its course; empty: usable. */
export const faultsOfCourse = (course: RepCourse, rules: ReadingRules): readonly RepFault[] => {
  const { setting, set, frames, rep, phases } = course;
  const faults: RepFault[] = [];
  for (const missing of missingLengths(setting.rig, set))
    if (
      missing.code === 'belt-pointer-length-missing' ||
      missing.code === 'thigh-pointer-length-missing'
    )
      faults.push({ code: missing.code });
  const rising = course.level.filter((_, i) => frames[i]?.phase === 'rise');
  const quiet = setting.reference.frames;
  const absent = landmarksOf(set).filter(
    (id) =>
      id !== 'ankle-lifted' &&
      id !== 'ankle-support' &&
      ((rising.length > 0 && !rising.some(({ marks }) => marks[id])) ||
        (quiet.length > 0 && !quiet.some(({ marks }) => marks[id]))),
  );
  if (absent.length > 0) faults.push({ code: 'landmarks-missing', landmarks: absent });
  if (!rep.labels && phases.boundaries.footOff === null) faults.push({ code: 'no-foot-off' });
  const still =
    setting.turnZero?.frames ?? quiet.filter(({ marks }) => marks['asis-support']).length;
  if (still < LEAST_QUIET)
    faults.push({ code: 'few-quiet', have: still, need: LEAST_QUIET, from: null, to: null });
  const lifts = turnedLifts(frames);
  for (const least of leastFrames(rules)) {
    const have = lifts.filter((lift) => inBand(lift, least)).length;
    if (have < least.need)
      faults.push({
        code: least.code,
        have,
        need: least.need,
        from: least.from,
        to: least.to,
      });
  }
  return faults;
};

/** The set a rep that is not used is shown with: the richest that carries most turns. */
export const bestShown = (courses: ReadonlyMap<LandmarkSetId, RepCourse>): RepCourse | null => {
  let best: RepCourse | null = null;
  let most = -1;
  for (const course of courses.values()) {
    const turned = course.frames.filter((frame) => frame.turn !== null).length;
    if (turned >= most) {
      best = course;
      most = turned;
    }
  }
  return best;
};
