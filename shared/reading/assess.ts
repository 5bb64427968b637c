import { courseOfRep, isCourse, type RepCourse } from '#shared/course/course-of-rep.ts';
import type { RepInput } from '#shared/course/types.ts';
import { LANDMARK_SETS, type LandmarkSetId } from '#shared/landmarks/types.ts';
import { fitRep, type UsedRep } from './fit-rep.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import type { RepFault } from './reasons.ts';
import type { ReadingInput } from './types.ts';
import { bestShown, faultsOfCourse, faultsOfInput } from './usable.ts';

/** One rep with every landmark set that may be chosen. */
interface Candidate {
  readonly rep: RepInput;
  readonly inputFaults: readonly RepFault[];
  readonly courses: ReadonlyMap<LandmarkSetId, RepCourse>;
  readonly courseFaults: ReadonlyMap<LandmarkSetId, readonly RepFault[]>;
}

/** One rep as the reading takes it. */
export interface Assessed {
  readonly rep: RepInput;
  /** Course it is shown with; null where none can be computed. */
  readonly shown: RepCourse | null;
  readonly used: UsedRep | null;
  readonly faults: readonly RepFault[];
}

/** The set a reading rests on and its reps; null where no set has a usable one. */
export interface Assessment {
  readonly set: LandmarkSetId | null;
  readonly reps: readonly Assessed[];
}

const candidateOf = (rep: RepInput, input: ReadingInput): Candidate => {
  const inputFaults: RepFault[] = [...faultsOfInput(rep, input.supportSide)];
  const courses = new Map<LandmarkSetId, RepCourse>();
  const courseFaults = new Map<LandmarkSetId, readonly RepFault[]>();
  const ordered = !inputFaults.some(({ code }) => code === 'bad-timestamps');
  const sets = input.set === null ? LANDMARK_SETS : [input.set];
  for (const set of ordered ? sets : []) {
    const course = courseOfRep(rep, set, input.markError, { halfWidths: false });
    if (isCourse(course)) {
      courses.set(set, course);
      courseFaults.set(set, faultsOfCourse(course, input.rules));
    } else if (course.code === 'scale-missing' || course.code === 'distance-missing') {
      inputFaults.push({ code: course.code });
      break;
    }
  }
  return { rep, inputFaults, courses, courseFaults };
};

const usableWith = (candidate: Candidate, set: LandmarkSetId): boolean =>
  candidate.inputFaults.length === 0 && candidate.courseFaults.get(set)?.length === 0;

const assessed = (
  candidate: Candidate,
  set: LandmarkSetId | null,
  used: UsedRep | null,
): Assessed => {
  const { rep, inputFaults, courses, courseFaults } = candidate;
  if (used) return { rep, used, shown: used.course, faults: [] };
  const shown = (set && courses.get(set)) ?? bestShown(courses);
  const own = shown ? (courseFaults.get(shown.set) ?? []) : [];
  const faults: RepFault[] = [...inputFaults, ...own];
  // usable by its frames, but its marks lie on each other and carry no fit
  if (faults.length === 0) faults.push({ code: 'marks-coincide' });
  const poorer = set === null ? -1 : LANDMARK_SETS.indexOf(set);
  const other = LANDMARK_SETS.filter((each, i) => i < poorer && usableWith(candidate, each)).at(-1);
  if (other) faults.unshift({ code: 'poorer-set', set: other });
  return { rep, used: null, shown, faults };
};

/** Chooses the richest set that has a usable rep, or takes the one asked for, and fits its reps. */
export const assess = (input: ReadingInput, seed: number, runs: number): Assessment => {
  const gates = gatesOf(input.rules);
  const candidates = input.reps.map((rep) => candidateOf(rep, input));
  const sets = input.set === null ? [...LANDMARK_SETS].reverse() : [input.set];
  for (const set of sets) {
    const used = candidates.map((candidate, at) => {
      const course = candidate.courses.get(set);
      return course && usableWith(candidate, set) ? fitRep(course, gates, seed, at, runs) : null;
    });
    if (used.every((rep) => rep === null)) continue;
    return { set, reps: candidates.map((each, at) => assessed(each, set, used[at] ?? null)) };
  }
  return { set: null, reps: candidates.map((each) => assessed(each, input.set, null)) };
};
