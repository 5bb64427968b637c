import type { Missing } from './missing.ts';

export type MeasureUnit = 'degrees' | 'millimetres';

/** A substitution from quiet stance to the top: value, or why it is not there. */
export interface SubstitutionChange {
  readonly measure: string;
  readonly unit: MeasureUnit;
  readonly change: number | null;
  /** Smallest change that can be told from none; null where it cannot be given. */
  readonly smallestChange: number | null;
  /** The quiet stance's own value, not zeroed. */
  readonly quiet: number | null;
  readonly missing: Missing | null;
}
