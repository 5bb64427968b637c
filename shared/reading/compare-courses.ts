import type { CourseFrame } from '#shared/course/types.ts';
import { degrees } from '#shared/geometry/units.ts';
import { type Gates, gatesOf, sameGates } from '#shared/protocol/protocol.ts';
import { repHalfWidth, turnAt } from './at-lift.ts';
import { type Compared, type Difference, retestChange } from './compare.ts';
import type { CurvePoint, ReadingResult, RepResult } from './types.ts';

/** A course as it is compared: that of one rep, or of all reps of a side. */
export interface ComparedCourse {
  readonly gates: Gates;
  readonly curve: readonly CurvePoint[];
  /** Marked frames of the rises that it rests on. */
  readonly frames: readonly CourseFrame[];
  /** From gate to gate; null where nothing could be fitted. */
  readonly change: Compared | null;
}

const risesOf = (reps: readonly RepResult[]): CourseFrame[] =>
  reps.flatMap(({ frames }) => frames.filter(({ phase }) => phase === 'rise'));

export const sideCourse = ({ course, figures, reps, rules }: ReadingResult): ComparedCourse => ({
  gates: gatesOf(rules),
  curve: course,
  frames: risesOf(reps.filter(({ used }) => used)),
  change: figures && { d: figures.d, uC: figures.uC },
});

export const repCourse = (rep: RepResult, gates: Gates): ComparedCourse => ({
  gates,
  curve: rep.curve,
  frames: risesOf([rep]),
  change: rep.fit && {
    d: rep.fit.change.value,
    uC: degrees(repHalfWidth(rep, gates.to) / 1.96),
  },
});

/** Frames this near to a gate, degrees of lift, say how well the turn at the gate is known. */
const NEAR = 12;

/**
 * Turn at a lift with the uncertainty of a single frame there. The course averages over several frames and knows it
 * better, by how much our error model does not say: so the ± is never too narrow.
 */
const turnWithError = ({ curve, frames }: ComparedCourse, lift: number): Compared | null => {
  const value = turnAt(curve, lift);
  const halves = frames
    .flatMap(({ lift: at, turnHalfWidth }) =>
      at !== null && turnHalfWidth !== null && Math.abs(at - lift) <= NEAR ? [turnHalfWidth] : [],
    )
    .sort((a, b) => a - b);
  const middle = halves[Math.floor(halves.length / 2)];
  return value === null || middle === undefined
    ? null
    : { d: degrees(value), uC: degrees(middle / 1.96) };
};

export interface CourseDifference {
  readonly atFrom: Difference | null;
  readonly atTo: Difference | null;
  readonly change: Difference | null;
}

/** The second less the first; null where they were read between other gates. */
export const courseDifference = (
  first: ComparedCourse,
  second: ComparedCourse,
): CourseDifference | null => {
  if (!sameGates(first.gates, second.gates)) return null;
  const at = (lift: number): Difference | null => {
    const [one, other] = [turnWithError(first, lift), turnWithError(second, lift)];
    return one && other && retestChange(one, other);
  };
  return {
    atFrom: at(first.gates.from),
    atTo: at(first.gates.to),
    change: first.change && second.change && retestChange(first.change, second.change),
  };
};
