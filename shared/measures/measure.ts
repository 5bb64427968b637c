import type { LandmarkId, LandmarkSetId, View } from '#shared/landmarks/types.ts';
import type { MeasureUnit } from './change.ts';
import type { LevelFrame } from './level.ts';
import type { Missing } from './missing.ts';
import type { Reference } from './reference.ts';
import type { Rig } from './rig.ts';
import type { TiedLift } from './tied-lift.ts';
import type { TurnZero } from './turn-zero.ts';

/** What a measure may look at besides the marks of its frame. */
export interface Setting {
  readonly rig: Rig;
  readonly reference: Reference;
  readonly set: LandmarkSetId;
  /** Null where the quiet stance does not carry the marks of the set. */
  readonly turnZero: TurnZero | null;
  /** Lift is taken from a side clip of the same moment; absent: from the marks of this clip. */
  readonly tiedLift?: TiedLift | undefined;
}

/** A value with its ± (95 %), in the measure's unit; or why there is none. */
export type Value =
  | { readonly value: number; readonly halfWidth: number | null; readonly missing: null }
  | { readonly value: null; readonly halfWidth: null; readonly missing: Missing };

export const missing = (reason: Missing): Value => ({
  value: null,
  halfWidth: null,
  missing: reason,
});

/** A number that is not finite never leaves a measure. */
export const measured = (value: number, halfWidth: number | null): Value =>
  Number.isFinite(value) && (halfWidth === null || Number.isFinite(halfWidth))
    ? { value, halfWidth, missing: null }
    : missing({ code: 'marks-coincide' });

/** One thing that is measured on a frame. */
export interface Measure {
  readonly id: string;
  readonly label: string;
  readonly unit: MeasureUnit;
  /** What the plus sign means, in words. */
  readonly sign: string;
  readonly views: readonly View[];
  readonly landmarks: (set: LandmarkSetId, view: View) => readonly LandmarkId[];
  /** What the value is counted from. */
  readonly zero: 'quiet stance' | 'vertical' | 'horizontal' | 'straight ahead' | 'straight leg';
  /** True where the page shows its change from quiet stance to the top as a substitution. */
  readonly substitution: boolean;
  /** False: the value at the top itself is shown, the quiet stance has none. */
  readonly againstQuiet: boolean;
  /**
   * Smallest change (95 %) from quiet stance to the top that can be told from none, four top and
   * five quiet frames; null where it follows from the marks of each case.
   */
  readonly smallestChange: number | null;
  readonly source: string;
  readonly value: (frame: LevelFrame, setting: Setting) => Value;
}
