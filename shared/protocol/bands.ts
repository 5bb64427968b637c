import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { ReadingRules } from './protocol.ts';

/** A stretch of lift, both ends included. */
export interface Band {
  readonly from: Degrees;
  readonly to: Degrees;
}

/** Frames this far outside the gates still count across the window: from our model, no source. */
const ACROSS = 5;

/** Where marked frames are needed: near either gate, and across the window. */
export const bandsOf = (
  rules: ReadingRules,
): { readonly from: Band; readonly to: Band; readonly across: Band } => ({
  from: {
    from: degrees(rules.gateFrom - rules.fromBelow),
    to: degrees(rules.gateFrom + rules.fromAbove),
  },
  to: { from: degrees(rules.gateTo - rules.toBelow), to: degrees(rules.gateTo + rules.toAbove) },
  across: { from: degrees(rules.gateFrom - ACROSS), to: degrees(rules.gateTo + ACROSS) },
});
