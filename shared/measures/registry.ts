import { footTurnOut } from './foot-turn-out.ts';
import { frontalPlaneProjection } from './frontal-plane-projection.ts';
import { heelRise } from './heel-rise.ts';
import { lift } from './lift.ts';
import { thighAgainstTrunk } from './lift-from-side.ts';
import { liftedKneeDrift } from './lifted-knee-drift.ts';
import { liftedShankSwing } from './lifted-shank-swing.ts';
import type { Measure } from './measure.ts';
import { pelvicObliquity } from './pelvic-obliquity.ts';
import { pelvicTilt, supportHipExtension } from './pelvic-tilt.ts';
import { supportHipAdduction } from './support-hip-adduction.ts';
import { trunkSideBend } from './trunk-side-bend.ts';
import { pelvisPart, thighPart, turn } from './turn.ts';

/** Every measure, in the order in which pages list them. A new one is a file and a line here. */
export const MEASURES = [
  lift,
  turn,
  pelvisPart,
  thighPart,
  trunkSideBend,
  pelvicObliquity,
  supportHipAdduction,
  frontalPlaneProjection,
  footTurnOut,
  heelRise,
  liftedShankSwing,
  liftedKneeDrift,
  pelvicTilt,
  supportHipExtension,
  thighAgainstTrunk,
] as const satisfies readonly Measure[];

export const measureById = (id: string): Measure | null =>
  MEASURES.find((measure) => measure.id === id) ?? null;
