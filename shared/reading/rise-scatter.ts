import { CONSTANTS } from '#shared/measures/constants.ts';
import type { UsedRep } from './fit-rep.ts';
import type { Scattered } from './quiet-scatter.ts';

/** Tracked marks drift: what they err together does not show as scatter, and is at least that of a hand. */
export const LEAST_FACTOR = 1 / CONSTANTS.trackedFactor.value ** 2;

const PRIOR_FRAMES = 6;
const TERMS = 4;

/** What the frames of all rises scatter around their fits. */
export const riseScatter = (used: readonly UsedRep[]): Scattered => {
  let squares = 0;
  let free = 0;
  for (const { fitted } of used) {
    const { sFit, nu, used: frames } = fitted.fit;
    squares += sFit * sFit * nu - PRIOR_FRAMES;
    free += frames - TERMS;
  }
  return { squares, free };
};
