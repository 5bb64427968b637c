import { Problem } from '../../http/problem.ts';
import type { SafetyAnswers } from './visit.entity.ts';

/**
 * Whether filming may begin: no question was answered with yes, or somebody who may do so has cleared it; and for
 * a minor a guardian or chaperone is in the room.
 */
export const mayFilm = (safety: SafetyAnswers, minor: boolean): boolean => {
  const anyYes = Object.values(safety.answers).some(Boolean);
  return (!anyYes || safety.clearedBy !== null) && (!minor || safety.chaperone === true);
};

/**
 * Before a clip is taken in.
 * @throws Problem 'safety-check-missing' or 'safety-check-stops'
 */
export const needSafe = (safety: SafetyAnswers | null | undefined, minor: boolean): void => {
  if (!safety) throw new Problem('safety-check-missing');
  if (!mayFilm(safety, minor)) throw new Problem('safety-check-stops');
};
