import type { SafetyAnswer } from './cautions.ts';

/** Legs and hands as a plan means them; which is left and which right follows from the support side. */
export type Limb = 'support' | 'lifted';

/** Which leg and which hand does what. The coach confirms it. */
export interface SideRule {
  /** The leg that bears most of the weight. */
  readonly stands: Limb;
  /** Where the other leg is. */
  readonly other: 'lifted' | 'toes-behind' | 'knee-down' | 'on-floor' | 'alternates';
  /** The hand that holds the weight; null where none is held. */
  readonly load: Limb | 'both' | null;
  /** The hand on the wall or chair; null where none is. */
  readonly support: Limb | 'both' | null;
  /** Why, in a sentence. */
  readonly because: string;
}

/** How much. Either repetitions or seconds of holding. */
export interface Dose {
  readonly sets: number;
  readonly repetitions: number | null;
  readonly holdSeconds: number | null;
  readonly restSeconds: number;
  readonly daysPerWeek: number;
}

/** One exercise of the library, by a generic name. */
export interface Exercise<Id extends string = string> {
  readonly id: Id;
  readonly name: string;
  readonly purpose: string;
  /** What is needed and how to stand, in order. */
  readonly setUp: readonly string[];
  readonly side: SideRule;
  /** How the standing foot meets the floor: coached in each exercise. */
  readonly foot: string;
  readonly cues: readonly string[];
  readonly dose: Dose;
  readonly easier: string;
  readonly harder: string;
  readonly goOnWhen: readonly string[];
  readonly goBackWhen: readonly string[];
  /** Answers of the safety check with which it is not done before somebody has cleared it. */
  readonly notWith: readonly SafetyAnswer[];
  /** When not to, besides those answers. */
  readonly notWhen: readonly string[];
  readonly source: string;
}

export const COMMON_PRACTICE = 'common practice, no source';

/** Keeps the literal id. */
export const exercise = <const Id extends string>(definition: Exercise<Id>): Exercise<Id> =>
  definition;
