import type { Degrees } from '#shared/geometry/units.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { SYSTEMATIC } from './constants.ts';

/** How often something happened. */
interface Count {
  readonly hits: number;
  readonly of: number;
}

/** How well readings do with one landmark set, from made people of known truth. */
export interface Achieved {
  /** Smallest change of turn that can be told from none (95 %), with one rep and with three. */
  readonly toldFromNone: { readonly one: Degrees; readonly three: Degrees };
  /** Smallest early turn tried that three reps show nine times in ten; null: none up to 16°. */
  readonly foundFrom: Degrees | null;
  /** No turn called early: errors as assumed; with drifting marks or twice the slip. */
  readonly falseEarly: { readonly assumed: Count; readonly harder: Count };
  /** Of an early turn of 6.2°, three reps, how many are found. */
  readonly found62: Count;
}

/** Turns tried: 5, 6.2, 8.8, 12 and 16°. `npm run study -- --engine 3 --seed 51`. From our model, no source. */
export const ACHIEVED: Readonly<Record<keyof typeof SYSTEMATIC, Achieved>> = {
  bare: {
    toldFromNone: { one: degrees(10.8), three: degrees(7.7) },
    foundFrom: null,
    falseEarly: { assumed: { hits: 3, of: 400 }, harder: { hits: 1, of: 200 } },
    found62: { hits: 9, of: 50 },
  },
  belt: {
    toldFromNone: { one: degrees(8.2), three: degrees(5.9) },
    foundFrom: degrees(12),
    falseEarly: { assumed: { hits: 0, of: 400 }, harder: { hits: 3, of: 200 } },
    found62: { hits: 19, of: 50 },
  },
  'belt+assumption': {
    toldFromNone: { one: degrees(7.6), three: degrees(6.0) },
    foundFrom: degrees(12),
    falseEarly: { assumed: { hits: 0, of: 400 }, harder: { hits: 3, of: 200 } },
    found62: { hits: 17, of: 50 },
  },
  'belt+thigh': {
    toldFromNone: { one: degrees(5.3), three: degrees(3.8) },
    foundFrom: degrees(8.8),
    falseEarly: { assumed: { hits: 7, of: 400 }, harder: { hits: 9, of: 200 } },
    found62: { hits: 44, of: 50 },
  },
};
