import type { RepCourse } from '#shared/course/course-of-rep.ts';
import { type RiseData, riseDataOf } from '#shared/course/rise-data.ts';
import { drawRise } from '#shared/course/rise-draws.ts';
import { fitRise } from '#shared/course/rise-fit.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { fittedRep, type FittedRep } from './pool.ts';

export interface UsedRep {
  readonly course: RepCourse;
  readonly data: RiseData;
  readonly fitted: FittedRep;
}

/** Reps get different draws of one seed. */
const repSeed = (seed: number, at: number): number => (seed + Math.imul(at, 0x9e3779b1)) >>> 0;

/** Fit and Monte Carlo of one usable rep; null where its marks coincide. */
export const fitRep = (
  course: RepCourse,
  gates: Gates,
  seed: number,
  at: number,
  runs: number,
): UsedRep | null => {
  const data = riseDataOf(course, gates);
  if (!data) return null;
  const fit = fitRise(data.lifts, data.weights, data.thighPart, data.pelvisPart, gates);
  if (!fit) return null;
  const fitted = fittedRep(fit, drawRise(data, repSeed(seed, at), runs), gates);
  return fitted && { course, data, fitted };
};
