import type { Degrees } from '#shared/geometry/units.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { Alternative, Systematic, Uncertain } from './figures.ts';
import type { UsedRep } from './fit-rep.ts';
import type { Pooled } from './pool.ts';
import type { CurvePoint, ReadingFigures } from './types.ts';

/** The usable reps of one reading and what is assumed of them; at least one rep. */
export interface Joining {
  readonly used: readonly UsedRep[];
  readonly set: LandmarkSetId;
  readonly thighTurnsLittle: boolean;
  readonly systematic: Systematic;
  readonly gates: Gates;
}

/** The reps together: what an engine makes of them. Everything after it is the same for all. */
export interface Joined {
  readonly pooled: Pooled;
  readonly uncertain: Uncertain;
  /** The same if skin slips twice as much, and how likely that is; absent: not believed possible. */
  readonly twice?: Alternative | undefined;
  /** Change of turn from the upper gate to a higher lift, over the reps with a share. */
  readonly past90: (to: Degrees, shares: readonly number[]) => Degrees;
  /** The course drawn, with its 95 % band. */
  readonly course: (figures: ReadingFigures) => readonly CurvePoint[];
}
