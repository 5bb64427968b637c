import type { Seconds } from '#shared/timing/units.ts';
import type { Grid } from './grid.ts';

/** One of the coarse pictures of a take, upright. */
export interface TakePicture {
  readonly at: Seconds;
  readonly grid: Grid;
}

/** What keeps a question about a take from being answered. */
export type Unanswered =
  | 'too-few-pictures'
  /** Everything in the picture moves: it was held by hand, or fell over. */
  | 'camera-moved'
  /** Nobody in it lifts a leg and sets it down again. */
  | 'no-lift'
  /** What moves is too small a part of the picture to be a whole body. */
  | 'too-small'
  /** Nowhere in it anybody stands still. */
  | 'never-still'
  /** The picture is too small to tell a sticker from a button. */
  | 'too-coarse'
  /** A few round things, which may be stickers or not. */
  | 'few-round';

/** Yes and no with their figure, or why neither can be said. */
export type Answer<Figure> =
  | ({ readonly told: 'yes' | 'no' } & Figure)
  | { readonly told: 'cannot-tell'; readonly why: Unanswered };

export const cannotTell = (why: Unanswered): { told: 'cannot-tell'; why: Unanswered } => ({
  told: 'cannot-tell',
  why,
});
