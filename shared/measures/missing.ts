import type { Degrees } from '#shared/geometry/units.ts';
import type { LandmarkId, View } from '#shared/landmarks/types.ts';

/** Why a value is not there. A value is never filled in. */
export type Missing =
  | { readonly code: 'landmark-not-marked'; readonly landmarks: readonly LandmarkId[] }
  | { readonly code: 'landmark-hidden'; readonly landmarks: readonly LandmarkId[] }
  | { readonly code: 'no-quiet-stance' }
  | { readonly code: 'scale-missing' }
  | { readonly code: 'distance-missing' }
  | { readonly code: 'belt-pointer-length-missing' }
  | { readonly code: 'thigh-pointer-length-missing' }
  | { readonly code: 'body-height-missing' }
  | { readonly code: 'toe-direction-missing' }
  | { readonly code: 'view-cannot-show-it'; readonly view: View }
  | { readonly code: 'only-between-lifts'; readonly from: Degrees; readonly to: Degrees }
  /** Lift comes from a side clip, which has no marked frames around this moment. */
  | { readonly code: 'not-in-side-clip' }
  /** Marks that lie on each other, or numbers that are not finite. */
  | { readonly code: 'marks-coincide' };
