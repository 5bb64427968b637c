import type { SubstitutionChange } from '#shared/measures/change.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { LevelFrame } from '#shared/measures/level.ts';
import type { Measure, Value } from '#shared/measures/measure.ts';
import type { Missing } from '#shared/measures/missing.ts';
import { LEAST_QUIET } from '#shared/measures/reference.ts';
import { MEASURES } from '#shared/measures/registry.ts';
import type { RepCourse } from './course-of-rep.ts';

const TOP_FRAMES = 4;

interface Mean {
  readonly value: number;
  readonly variance: number;
  readonly frames: number;
}

const meanOf = (values: readonly Value[]): Mean | null => {
  const known = values.filter((value) => value.missing === null);
  if (known.length === 0) return null;
  const n = known.length;
  const sum = known.reduce((total, { value }) => total + value, 0);
  const variance = known.reduce(
    (total, { halfWidth }) => total + ((halfWidth ?? 0) / 1.96) ** 2,
    0,
  );
  return { value: sum / n, variance: variance / (n * n), frames: n };
};

const firstMissing = (values: readonly Value[]): Missing =>
  values.find((value) => value.missing !== null)?.missing ?? { code: 'no-quiet-stance' };

/** Frames at the top that carry the measure, highest first, at most four. */
const topFrames = (course: RepCourse, measure: Measure): readonly LevelFrame[] => {
  const { fMax, frames, level } = course;
  if (fMax === null) return [];
  const lowest = measure.againstQuiet ? fMax - CONSTANTS.plateau.value : -Infinity;
  return frames
    .flatMap(({ phase, lift }, i) => {
      const frame = level[i];
      return phase === 'rise' && lift !== null && lift >= lowest && frame ? [{ frame, lift }] : [];
    })
    .sort((a, b) => b.lift - a.lift)
    .map(({ frame }) => frame);
};

const changeOf = (course: RepCourse, measure: Measure): SubstitutionChange => {
  const { setting } = course;
  const quietValues = setting.reference.frames.map((frame) => measure.value(frame, setting));
  const topValues = topFrames(course, measure).map((frame) => measure.value(frame, setting));
  const top = meanOf(topValues.filter(({ missing }) => missing === null).slice(0, TOP_FRAMES));
  const known = meanOf(quietValues);
  const quiet = known && known.frames >= LEAST_QUIET ? known : null;
  const base = { measure: measure.id, unit: measure.unit };
  if (!top || (measure.againstQuiet && !quiet))
    return {
      ...base,
      change: null,
      smallestChange: null,
      quiet: quiet?.value ?? null,
      missing: firstMissing(top ? quietValues : topValues),
    };
  const variance = top.variance + (measure.againstQuiet && quiet ? quiet.variance : 0);
  const smallest = Math.max(measure.smallestChange ?? 0, 1.96 * Math.sqrt(variance));
  return {
    ...base,
    change: top.value - (measure.againstQuiet && quiet ? quiet.value : 0),
    // marks as coarse as no picture is have no error that can be named
    smallestChange: Number.isFinite(smallest) ? smallest : null,
    quiet: quiet?.value ?? null,
    missing: null,
  };
};

/** Every substitution the view can show, from quiet stance to the top of one rep. */
export const substitutionsOf = (course: RepCourse): readonly SubstitutionChange[] =>
  MEASURES.filter(
    ({ substitution, views }) =>
      substitution && views.some((view) => view === course.setting.rig.camera.view),
  ).map((measure) => changeOf(course, measure));
