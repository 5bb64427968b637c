import type { AthleteInput, CameraInput, FrameInput } from '#shared/measures/inputs.ts';
import type { TiedLift } from '#shared/measures/tied-lift.ts';
import type { Missing } from '#shared/measures/missing.ts';
import type { Side } from '#shared/landmarks/types.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';

/** Part of a rep a frame belongs to; 'between' is neither quiet nor rising nor lowering. */
export type FramePhase = 'quiet' | 'between' | 'rise' | 'lower';

/** Boundaries of a rep. Each is found from the marks unless the coach moved it. */
export interface RepBoundaries {
  readonly quietFrom: Milliseconds;
  readonly quietTo: Milliseconds;
  readonly footOff: Milliseconds;
  readonly top: Milliseconds;
  /** End of the plateau, where lowering begins. */
  readonly lowerFrom: Milliseconds;
  readonly footDown: Milliseconds;
}
export type BoundaryId = keyof RepBoundaries;

/** Why a coach left a rep out. */
export const EXCLUSION_REASONS = [
  'touched-support',
  'hopped',
  'foot-pivoted',
  'lost-balance',
  'pain',
  'another-drill',
  'other',
] as const;
export type ExclusionReason = (typeof EXCLUSION_REASONS)[number];

/** One rep, with everything its course depends on. Frames in order of time, marked ones only. */
export interface RepInput {
  readonly id: string;
  readonly supportSide: Side;
  readonly camera: CameraInput;
  readonly athlete: AthleteInput;
  readonly frames: readonly FrameInput[];
  /** Quiet stance shared by several reps of one clip (marching); null: the rep's own. */
  readonly sharedQuiet: readonly FrameInput[] | null;
  /** Boundaries the coach moved by hand; they override what is found. */
  readonly moved: Partial<RepBoundaries>;
  /** A phase per frame known from elsewhere (evaluation files): nothing is searched then. */
  readonly labels: readonly FramePhase[] | null;
  readonly excluded: ExclusionReason | null;
  /** Lift as a side clip of the same moment shows it; absent: from this clip's own marks. */
  readonly liftFrom?: TiedLift | undefined;
}

/** Boundaries found or moved; null where there is no evidence for them. */
export interface RepPhases {
  readonly boundaries: { readonly [K in BoundaryId]: Milliseconds | null };
  readonly moved: readonly BoundaryId[];
  /** Half the gap between the marks around foot off, ± ms. */
  readonly footOffHalfGap: Milliseconds | null;
  readonly byFrame: readonly FramePhase[];
}

/** One frame of a course. Null is unknown; `missing` says why, for lift and for turn. */
export interface CourseFrame {
  readonly frame: FrameIndex;
  readonly time: Milliseconds;
  readonly phase: FramePhase;
  readonly lift: Degrees | null;
  readonly liftHalfWidth: Degrees | null;
  /** Turn against the quiet stance, external positive. */
  readonly turn: Degrees | null;
  readonly turnHalfWidth: Degrees | null;
  /** Yaw of femur and pelvis, positive to the athlete's left, not zeroed. */
  readonly femurYaw: Degrees | null;
  readonly pelvisYaw: Degrees | null;
  /** Parts of the turn: they add up to it. */
  readonly thighPart: Degrees | null;
  readonly pelvisPart: Degrees | null;
  /** Weight in the fit, 1/degrees²; 0 where lift is under 25°. */
  readonly weight: number | null;
  readonly inFit: boolean;
  readonly missing: { readonly lift: Missing | null; readonly turn: Missing | null };
  /** True where a mark it rests on is tracked and nobody has looked at it. */
  readonly provisional: boolean;
}
