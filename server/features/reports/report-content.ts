import type { Dose } from '#shared/contracts/athlete-plan.ts';
import type { Call } from '#shared/contracts/calls.ts';
import type { Side, View } from '#shared/contracts/primitives.ts';
import type { ReadingCode } from '#shared/contracts/readings.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { ReviewState } from '#shared/contracts/reviews.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import type { CourseCurve } from '#shared/plots/course-shapes.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { ChangeRow } from '#shared/reading/changes.ts';
import type { Filming } from '../visits/visit.entity.ts';

/** A value with its ± (95 %), degrees. */
export interface Measured {
  readonly value: number;
  readonly plusMinus: number;
}

export interface ReportReading {
  readonly label: string;
  readonly code: ReadingCode;
  readonly provisional: boolean;
  readonly gates: Gates;
  readonly set: LandmarkSetId | null;
  readonly assumption: boolean;
  /** Null where nothing could be read. */
  readonly figures: {
    readonly change: Measured;
    readonly pelvis: Measured;
    readonly thigh: Measured;
    readonly pEarly: number;
    readonly smallestFound: number;
  } | null;
  readonly reps: { readonly used: number; readonly of: number };
  readonly marks: number;
  readonly markError: { readonly px: number; readonly frames: number };
  readonly engine: number;
  readonly protocol: number;
  readonly course: CourseCurve;
  readonly repCourses: readonly CourseCurve[];
  readonly changes: readonly Pick<
    ChangeRow,
    'label' | 'sign' | 'unit' | 'change' | 'smallest' | 'beyond'
  >[];
}

/** Which frames of which clip are shown of a side, and what is drawn on them. */
export interface ReportKeyFrames {
  readonly clip: string;
  /** The version of the box that hides the head on them; null where they are left out. */
  readonly head: string | null;
  /** Why they are left out; null where they are shown. */
  readonly leftOut: string | null;
  readonly drawn: Pick<PublicReplay, 'overlay' | 'moments' | 'view' | 'side'>;
}

export interface ReportSide {
  readonly side: Side;
  readonly calls: readonly Pick<
    Call,
    'seen' | 'confidence' | 'substitutions' | 'at' | 'gates' | 'beforeFigures'
  >[];
  readonly calledBy: readonly string[];
  /** Null where nothing was marked. */
  readonly reading: ReportReading | null;
  /** Null where nothing that counts was marked; not there in reports from before there were any. */
  readonly keyFrames?: ReportKeyFrames | null;
  readonly review: {
    readonly state: ReviewState;
    readonly by: string | null;
    readonly at: string | null;
    /** What the last word was about. */
    readonly about: 'reading' | 'call' | null;
  };
}

export interface ReportPlan {
  readonly side: Side;
  readonly givenAt: string;
  readonly givenBy: string;
  readonly retestOn: string;
  readonly note: string;
  readonly items: readonly {
    readonly name: string;
    readonly side: Side;
    readonly purpose: string;
    readonly dose: Dose;
    readonly cue: string;
  }[];
}

/** All that a report says, as it stood when it was asked for. */
export interface ReportContent {
  readonly practice: { readonly name: string; readonly contact: string };
  readonly athlete: { readonly name: string; readonly birthDate: string };
  readonly visit: {
    readonly day: string;
    readonly coach: string;
    readonly filming: Filming;
    readonly views: readonly View[];
    readonly clips: number;
  };
  readonly sides: readonly ReportSide[];
  readonly compared: {
    readonly difference: number;
    readonly plusMinus: number;
    readonly differ: boolean;
  } | null;
  readonly plans: readonly ReportPlan[];
}
