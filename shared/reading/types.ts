import type { CourseFrame, RepInput, RepPhases } from '#shared/course/types.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import type { LandmarkSetId, Side } from '#shared/landmarks/types.ts';
import type { SubstitutionChange } from '#shared/measures/change.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import type { ReadingRules } from '#shared/protocol/protocol.ts';
import type { EngineVersion } from './engine.ts';
import type { PlacedWarning, Reason, RepFault, Settle } from './reasons.ts';

/** Everything a reading depends on: the same input gives the same result to the last digit. */
export interface ReadingInput {
  readonly engine: EngineVersion;
  /** Gates and limits of the practice's protocol. */
  readonly rules: ReadingRules;
  readonly supportSide: Side;
  /** Null: the richest set that has a usable rep. */
  readonly set: LandmarkSetId | null;
  /** 'The planted thigh turns little', turned on by the coach; counts only with belt alone. */
  readonly thighTurnsLittle: boolean;
  readonly markError: MarkError;
  /** The practice's own repeated lifts, which replace the assumed systematic error of their set. */
  readonly ownSystematic: {
    readonly set: LandmarkSetId;
    readonly u: Degrees;
    readonly lifts: number;
  } | null;
  readonly reps: readonly RepInput[];
}

export const READING_CODES = [
  'early-turn-out',
  'expected-turn-in',
  'holds-still',
  'cannot-tell',
  'lift-stops-short',
  'not-measurable',
] as const;
export type ReadingCode = (typeof READING_CODES)[number];

/** A change in degrees and its standard uncertainty. */
export interface Change {
  readonly value: Degrees;
  readonly u: Degrees;
}

/** Figures of the reps together. Changes are from gate to gate unless said otherwise. */
export interface ReadingFigures {
  readonly d: Degrees;
  /** Total standard uncertainty: d ± 1.96 uC is shown. */
  readonly uC: Degrees;
  /** Random part, systematic part (with q d), and the total for no true turn. */
  readonly uR: Degrees;
  readonly uS: Degrees;
  readonly uC0: Degrees;
  /** Degrees of freedom. */
  readonly nu: number;
  /** Mean and spread of what is believed after the weak prior. */
  readonly m: Degrees;
  readonly sM: Degrees;
  readonly pEarly: number;
  readonly pIn: number;
  readonly pFlat: number;
  readonly pBefore60: number;
  /** P(change > 0). */
  readonly pNotBack: number;
  /** Smallest early turn that would be found 9 times in 10. */
  readonly mdt90: Degrees;
  /** Parts; with the assumption the thigh's is already shrunk by `lambda`. */
  readonly pelvis: Change;
  readonly thigh: Change;
  /** Change from 30° to the lower gate. */
  readonly pre: Change;
  /** How much of the thigh part counts under the assumption; null without it. */
  readonly lambda: number | null;
}

/** Lift at which an early turn starts: mean and 5–95 % of its posterior. A range, never a point. */
export interface Onset {
  readonly mean: Degrees;
  readonly low: Degrees;
  readonly high: Degrees;
}

/** The fit over one rise. */
export interface RepFit {
  /** At the lower gate, slope before, change of slope at either gate (rounded corners of 5°). */
  readonly beta: readonly [number, number, number, number];
  readonly change: Change;
  readonly pelvis: Change;
  readonly thigh: Change;
  readonly pre: Change;
  readonly sFit: number;
  readonly used: number;
  readonly nu: number;
  /** Share of the rep in the reading; the shares of all used reps add up to 1. */
  readonly share: number;
}

export interface RepResult {
  readonly id: string;
  readonly used: boolean;
  readonly why: readonly RepFault[];
  /** Set its frames are shown with. */
  readonly set: LandmarkSetId;
  readonly phases: RepPhases | null;
  readonly frames: readonly CourseFrame[];
  /** Mean of the two largest lifts of the rise. */
  readonly fMax: Degrees | null;
  readonly fit: RepFit | null;
  readonly curve: readonly CurvePoint[];
  readonly substitutions: readonly SubstitutionChange[];
  /** Rep of the side clip that its lift was taken from; absent: from its own clip. */
  readonly liftFrom?: string | undefined;
}

/** One point of a drawn course; `low` and `high` bound the 95 % band under our error model. */
export interface CurvePoint {
  readonly lift: Degrees;
  readonly turn: Degrees;
  readonly low: Degrees;
  readonly high: Degrees;
  /** False where no marked frame lies within reach: drawn dotted. */
  readonly carried: boolean;
}

export interface ReadingResult {
  readonly engine: EngineVersion;
  /**
   * What it was read with. `60` and `90` in the names of codes and figures mean the lower and the
   * upper gate, whatever lift they stand at.
   */
  readonly rules: ReadingRules;
  /** SHA-256 of the canonical input, hex. A new reading row is made only when it changes. */
  readonly inputHash: string;
  readonly supportSide: Side;
  /** Null where no set has a usable rep. */
  readonly set: LandmarkSetId | null;
  readonly thighTurnsLittle: boolean;
  readonly code: ReadingCode;
  /** Line of the decision rule that held, 1 to 7. */
  readonly line: 1 | 2 | 3 | 4 | 5 | 6 | 7;
  /** Turns out early, already before the lower gate. */
  readonly before60: boolean;
  /** Rests on tracked marks nobody has looked at: cannot be signed off. */
  readonly provisional: boolean;
  readonly figures: ReadingFigures | null;
  readonly onset: Onset | null;
  /** Turn of the reps' weighted fit from the upper gate to their top, only where a rep goes 10° past it. */
  readonly returnPast90: { readonly to: Degrees; readonly change: Degrees } | null;
  readonly course: readonly CurvePoint[];
  readonly reps: readonly RepResult[];
  readonly reason: Reason;
  readonly warnings: readonly PlacedWarning[];
  readonly settle: readonly Settle[];
}
