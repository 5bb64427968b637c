import type { ExclusionReason } from '#shared/course/types.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import type { LandmarkId, LandmarkSetId, View } from '#shared/landmarks/types.ts';
import type { TimestampFault } from '#shared/timing/timestamps.ts';

/** Why a rep does not count, with the figures. Pages turn codes into sentences. */
export type RepFault =
  | { readonly code: 'excluded'; readonly reason: ExclusionReason }
  | { readonly code: 'bad-timestamps'; readonly fault: TimestampFault }
  | { readonly code: 'marks-implausible'; readonly landmarks: readonly LandmarkId[] }
  | { readonly code: 'no-frames' }
  | { readonly code: 'other-side' }
  | { readonly code: 'view-cannot-show-turn'; readonly view: View }
  | { readonly code: 'scale-missing' }
  | { readonly code: 'distance-missing' }
  | { readonly code: 'belt-pointer-length-missing' }
  | { readonly code: 'thigh-pointer-length-missing' }
  /** Not marked on any frame of the rise or of the quiet stance. */
  | { readonly code: 'landmarks-missing'; readonly landmarks: readonly LandmarkId[] }
  | { readonly code: 'no-foot-off' }
  | FewFrames
  | { readonly code: 'marks-coincide' }
  /** Usable only with a poorer landmark set than the reading's. */
  | { readonly code: 'poorer-set'; readonly set: LandmarkSetId };

/**
 * Fewer marked frames than the least; `from` and `to` are lifts, null for quiet stance. `60` and `90`
 * in the codes mean the lower and the upper gate.
 */
export interface FewFrames {
  readonly code: 'few-quiet' | 'few-near-60' | 'few-near-90' | 'few-across-window' | 'few-in-rise';
  readonly have: number;
  readonly need: number;
  readonly from: Degrees | null;
  readonly to: Degrees | null;
}

/** Why the reading is what it is: the line of the rule that held, with its figure and limit. */
export type Reason =
  | { readonly code: 'no-usable-rep'; readonly reps: number }
  | {
      readonly code: 'lift-under-85';
      readonly reps: number;
      readonly of: number;
      readonly highest: Degrees;
    }
  | { readonly code: 'too-uncertain'; readonly u: Degrees; readonly limit: Degrees }
  | { readonly code: 'early-probable'; readonly p: number; readonly limit: number }
  | {
      readonly code: 'before-60-probable';
      readonly p: number;
      readonly limit: number;
      readonly pNotBack: number;
      readonly limitNotBack: number;
    }
  | { readonly code: 'turn-in-probable'; readonly p: number; readonly limit: number }
  | { readonly code: 'flat-probable'; readonly p: number; readonly limit: number }
  | {
      readonly code: 'nothing-probable-enough';
      readonly pEarly: number;
      readonly pIn: number;
      readonly pFlat: number;
    };

/** Shown beside the reading; none changes it. */
export type Warning =
  | { readonly code: 'camera-off-front'; readonly by: Degrees; readonly limit: Degrees }
  | { readonly code: 'plumb-off'; readonly by: Degrees; readonly limit: Degrees }
  | { readonly code: 'too-near'; readonly distanceMm: number; readonly limitMm: number }
  | { readonly code: 'too-coarse'; readonly mmPerPx: number; readonly limit: number }
  | { readonly code: 'slow-frame-rate'; readonly framesPerSecond: number; readonly limit: number }
  | { readonly code: 'mirrored' }
  | { readonly code: 'lens-height-missing'; readonly liftHalfWidth: Degrees }
  /** `landmark` is null where a smeared dot was measured on the picture itself. */
  | {
      readonly code: 'smear';
      readonly px: number;
      readonly landmark: LandmarkId | null;
      readonly limit: number;
    }
  | { readonly code: 'few-quiet-frames'; readonly have: number; readonly recommended: number }
  | { readonly code: 'assumed-thigh'; readonly sd: Degrees }
  /** The assumed errors and every published figure are those of other gates. */
  | { readonly code: 'gates-not-studied'; readonly from: Degrees; readonly to: Degrees }
  /** A reading needs less than in the study: more of them will be wrong. */
  | { readonly code: 'limit-lowered'; readonly limit: number; readonly studied: number }
  | { readonly code: 'tracked-not-looked-at'; readonly frames: number };

/** A warning and the reps it concerns. */
export interface PlacedWarning {
  readonly warning: Warning;
  readonly reps: readonly string[];
}

/** What would settle a reading that is not settled. */
export type Settle =
  | {
      readonly code: 'mark-frames';
      readonly rep: string;
      readonly from: Degrees;
      readonly to: Degrees;
      readonly more: number;
    }
  | { readonly code: 'mark-quiet-frames'; readonly rep: string; readonly more: number }
  | { readonly code: 'give-scale' }
  | { readonly code: 'give-distance' }
  | { readonly code: 'give-pointer-length'; readonly pointer: 'belt' | 'thigh' }
  | {
      readonly code: 'mark-landmarks';
      readonly rep: string;
      readonly landmarks: readonly LandmarkId[];
    }
  | { readonly code: 'film-from-front' }
  | { readonly code: 'lift-higher'; readonly reached: Degrees; readonly needed: Degrees }
  | { readonly code: 'stand-still-first' }
  /** `u` is what one standard uncertainty of the change would become. */
  | { readonly code: 'another-rep'; readonly u: Degrees; readonly from: Degrees }
  | {
      readonly code: 'richer-set';
      readonly set: LandmarkSetId;
      readonly u: Degrees;
      readonly from: Degrees;
    };
