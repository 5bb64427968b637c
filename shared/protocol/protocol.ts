import { type Degrees, degrees } from '#shared/geometry/units.ts';

/** Lifts between which the change of turn counts. */
export interface Gates {
  readonly from: Degrees;
  readonly to: Degrees;
}

/** What a reading depends on. Lifts in degrees, probabilities from 0 to 1. */
export interface ReadingRules {
  readonly gateFrom: Degrees;
  readonly gateTo: Degrees;
  /** Frames count as near a gate so far under it and over it. */
  readonly fromBelow: Degrees;
  readonly fromAbove: Degrees;
  readonly toBelow: Degrees;
  readonly toAbove: Degrees;
  /** Lift under which a rep stops short. */
  readonly liftShort: Degrees;
  /** How probable a reading must be. `before`: turning out already before the lower gate. */
  readonly early: number;
  readonly before: number;
  readonly turnIn: number;
  readonly flat: number;
}

/** What new work starts from. No reading depends on it once the work is begun. */
export interface WorkDefaults {
  /** 'The planted thigh turns little' is on for sides that are called from now on. */
  readonly thighTurnsLittle: boolean;
  /** Set-up that a new visit starts from; null: none is chosen beforehand. */
  readonly setUpId: string | null;
  /** Reps asked for on each side. */
  readonly reps: number;
  /** Frames per second asked for. */
  readonly framesPerSecond: number;
}

/** What a practice has agreed on: how it reads, and what its work starts from. */
export interface Protocol extends ReadingRules, WorkDefaults {}

/** The figures of the study and of every published table of Redshank. */
export const STANDARD_RULES: ReadingRules = {
  gateFrom: degrees(60),
  gateTo: degrees(90),
  fromBelow: degrees(12),
  fromAbove: degrees(10),
  toBelow: degrees(12),
  toAbove: degrees(16),
  liftShort: degrees(85),
  early: 0.95,
  before: 0.975,
  turnIn: 0.95,
  flat: 0.8,
};

export const STANDARD_DEFAULTS: WorkDefaults = {
  thighTurnsLittle: false,
  setUpId: null,
  reps: 3,
  framesPerSecond: 60,
};

/** Version 1 of every practice. */
export const STANDARD_PROTOCOL: Protocol = { ...STANDARD_RULES, ...STANDARD_DEFAULTS };

export const gatesOf = ({ gateFrom, gateTo }: ReadingRules): Gates => ({
  from: gateFrom,
  to: gateTo,
});

export const STANDARD_GATES = gatesOf(STANDARD_RULES);

export const sameGates = (a: Gates, b: Gates): boolean => a.from === b.from && a.to === b.to;

/** Rules alone, in a fixed order and without anything else that the value carries. */
export const rulesOf = (of: ReadingRules): ReadingRules => ({
  gateFrom: of.gateFrom,
  gateTo: of.gateTo,
  fromBelow: of.fromBelow,
  fromAbove: of.fromAbove,
  toBelow: of.toBelow,
  toAbove: of.toAbove,
  liftShort: of.liftShort,
  early: of.early,
  before: of.before,
  turnIn: of.turnIn,
  flat: of.flat,
});

const RULES = Object.keys(STANDARD_RULES) as (keyof ReadingRules)[];

export const sameRules = (a: ReadingRules, b: ReadingRules): boolean =>
  RULES.every((key) => a[key] === b[key]);
