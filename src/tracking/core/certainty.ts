import { SURE, type TrackState } from '../types.ts';
import { eigenvalues } from './solve.ts';
import type { Template } from './template.ts';

/** What was seen of one point on one picture. */
export interface Evidence {
  /** Likeness to the template, −1 to 1. */
  readonly correlation: number;
  /** How far likeness fell since the picture before; negative where it rose. */
  readonly fall: number;
  /** Likeness of the patch's middle alone to the keyframe's, −1 to 1. */
  readonly core: number;
  /** How far the middle alone would rather be from where the whole patch is, pixels. */
  readonly apart: number;
  /** The share of the patch that shows something else, 0 to 1. */
  readonly covered: number;
  /** Likeness of the half of the patch that is least alike, −1 to 1. */
  readonly half: number;
  /** Forth and back again, how far from where it began, pixels. Null where that was not tried. */
  readonly roundTrip: number | null;
  /** What the template's error says of the place, one standard deviation, pixels. */
  readonly spread: number;
  /** How much larger the point's surroundings look than on the keyframe, a factor. */
  readonly scale: number;
}

/** 1 up to `good`, 0 from `bad` on, straight between; for values that are better when smaller. */
const falling = (value: number, good: number, bad: number): number =>
  Number.isFinite(value) ? Math.min(1, Math.max(0, (bad - value) / (bad - good))) : 0;

/** So alike, whole and middle, that it can be nothing else. */
export const isUnmistakable = (correlation: number, core: number): boolean =>
  correlation > 0.9 && core > 0.8;

/** Without any doubt. */
export const isItself = (correlation: number, core: number): boolean =>
  correlation > 0.95 && core > 0.92;

/** One half shows something else, and the middle is not beyond doubt: it has to prove itself again. */
export const isTorn = ({ half, core }: Pick<Evidence, 'half' | 'core'>): boolean =>
  core <= 0.92 && half < 0.6;

/**
 * All of it is there, or its middle leaves no doubt: what was lost proves itself by that, and not by its edge with
 * what covers it.
 */
export const isBack = ({ covered, half, core }: Pick<Evidence, 'covered' | 'half' | 'core'>) =>
  core > 0.96 || (covered < 0.08 && half > 0.7);

/**
 * 0 to 1; each piece of evidence can only lower it. A fall of likeness counts only where likeness
 * is no longer good: blur makes it fall as well, but not as deep as something that covers the point.
 * The bounds were set on rendered clips of known truth; no other source.
 */
export const confidenceOf = (seen: Evidence): number => {
  const { correlation, fall, core, apart, covered, half, roundTrip, spread, scale } = seen;
  const alike = falling(1 - correlation, 0.12, 0.5);
  // on coarse levels the way back may go astray in what is behind a limb: likeness outweighs it
  const back = roundTrip === null ? 0.8 : falling(roundTrip, 0.6, 3.5);
  const returned = isUnmistakable(correlation, core) ? Math.max(0.9, back) : back;
  const sharp = falling(spread, 0.5, 2.5);
  const steady = correlation > 0.88 ? 1 : falling(fall, 0.06, 0.3);
  const bare = falling(covered, 0.08, 0.35);
  // a patch that shrinks or swells has fitted itself to what covers the point
  const sized = falling(Math.abs(Math.log(scale)), 0.16, 0.3);
  // behind a limb's edge the picture may change as it likes, as long as the middle is beyond doubt
  const joined = core > 0.92 ? 1 : falling(1 - half, 0.25, 0.45);
  const same = falling(1 - core, 0.5, 0.85);
  const rest = alike * returned * sharp * steady * bare * same * sized * falling(apart, 1.5, 4);
  // that alone is a reason to look, not to lose the point
  return Math.max(rest * joined, Math.min(rest, WORTH_A_LOOK));
};

const UNSURE = 0.15;
const WORTH_A_LOOK = 0.3;

export const stateOf = (confidence: number): TrackState =>
  confidence >= SURE ? 'sure' : confidence >= UNSURE ? 'unsure' : 'lost';

/** Neighbouring pixels err alike: that many are worth one. */
const ALIKE_PIXELS = 4;

/**
 * Standard deviation of a place found with this likeness, pixels: what is not alike is taken as
 * noise, against the template's weakest slope. Infinity where nothing determines the place.
 */
export const spreadOf = (template: Template, correlation: number): number => {
  const { normal, slopes, contrast, crowding } = template;
  const count = slopes.length;
  const [weakest] = eigenvalues(normal[0] ?? 0, normal[1] ?? 0, normal[count + 1] ?? 0);
  if (!(weakest > 0) || !(correlation > 0)) return Infinity;
  const unlike = contrast * contrast * Math.max(0, 1 / (correlation * correlation) - 1);
  return Math.sqrt((ALIKE_PIXELS * crowding * unlike) / weakest);
};
