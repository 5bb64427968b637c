import type { Degrees } from '#shared/geometry/units.ts';
import { normalBelow } from './normal.ts';

/** Probability that the true value lies below a limit, of a normal estimate (JCGM 106:2012). */
export const probabilityBelow = (limit: Degrees, estimate: Degrees, u: Degrees): number =>
  u > 0 ? normalBelow((limit - estimate) / u) : NaN;
