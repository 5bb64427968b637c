import type { FramePoint } from '#shared/geometry/points.ts';

export type Side = 'left' | 'right';
export const otherSide = (side: Side): Side => (side === 'left' ? 'right' : 'left');

/** Where the camera stood. The side views are named after the leg the camera sees. */
export type View = 'front' | 'back' | 'lifted-side' | 'support-side';

/** The landmark sets a turn can be read from, poorest first. */
export const LANDMARK_SETS = ['bare', 'belt', 'belt+thigh'] as const;
export type LandmarkSetId = (typeof LANDMARK_SETS)[number];

export const LANDMARK_IDS = [
  'asis-support',
  'asis-lifted',
  'belt-tip',
  'outline-support',
  'outline-lifted',
  'lifted-knee',
  'kneecap',
  'knee-inner',
  'knee-outer',
  'thigh-tip',
  'strap-inner',
  'strap-outer',
  'ankle-support',
  'ankle-lifted',
  'acromion-support',
  'acromion-lifted',
  'toe-support',
  'heel-support',
  'trochanter',
  'knee-lateral',
  'acromion',
  'asis',
  'psis',
] as const;
export type LandmarkId = (typeof LANDMARK_IDS)[number];

/** Whose side a landmark lies on; 'seen' is the leg the side camera looks at. */
export type Role = 'support' | 'lifted' | 'midline' | 'seen';

/** Anatomical 3 px, pointer and tape 1.5 px, pelvis outline 1.4 × anatomical. */
export type ErrorClass = 'anatomical' | 'pointer' | 'outline';

export interface Landmark {
  readonly id: LandmarkId;
  readonly label: string;
  /** Where it is found, in words that need no anatomy. */
  readonly where: string;
  readonly role: Role;
  readonly errorClass: ErrorClass;
  /** The sets that need it; empty for landmarks of substitutions and side clips. */
  readonly sets: readonly LandmarkSetId[];
  readonly views: readonly View[];
}

/** A landmark placed on one frame, or said to be hidden there. */
export type Mark = PlacedMark | HiddenMark;

export interface PlacedMark {
  readonly hidden: false;
  readonly point: FramePoint;
  /**
   * How much coarser than the source the picture was on which the mark was placed:
   * max(1, long edge of the source / long edge of that picture).
   */
  readonly scale: number;
  readonly source: 'hand' | 'tracked';
  /** A tracked mark stays hollow until a person has looked at it. True for marks by hand. */
  readonly looked: boolean;
}

/** Covered by clothing, an arm or the groin crease: what needs it is unknown on this frame. */
export interface HiddenMark {
  readonly hidden: true;
}

export type Marks = Readonly<Partial<Record<LandmarkId, Mark>>>;
