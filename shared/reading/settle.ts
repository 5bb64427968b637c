import { degrees } from '#shared/geometry/units.ts';
import { type LandmarkSetId, LANDMARK_SETS } from '#shared/landmarks/types.ts';
import { LEAST_QUIET } from '#shared/measures/reference.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { type Gates, gatesOf, type ReadingRules } from '#shared/protocol/protocol.ts';
import type { Assessed } from './assess.ts';
import type { EngineVersion } from './engine.ts';
import { systematicVariance, type Systematic, widening } from './figures.ts';
import type { RepFault, Settle } from './reasons.ts';
import type { Decision } from './rule.ts';
import type { ReadingFigures } from './types.ts';
import { inBand } from './usable.ts';

type Typical = Readonly<Record<LandmarkSetId, readonly [one: number, three: number]>>;

const now = (set: LandmarkSetId): readonly [number, number] => [
  ACHIEVED[set].toldFromNone.one / 1.96,
  ACHIEVED[set].toldFromNone.three / 1.96,
];

/** Typical uncertainty of the change from 60° to 90° with one rep and with three, degrees: from our model. */
const TYPICAL: Readonly<Record<EngineVersion, Typical>> = {
  1: {
    bare: [16.0 / 1.96, 10.5 / 1.96],
    belt: [13.5 / 1.96, 8.8 / 1.96],
    'belt+thigh': [5.5 / 1.96, 3.9 / 1.96],
  },
  2: {
    bare: [16.0 / 1.96, 10.5 / 1.96],
    belt: [9.1 / 1.96, 6.8 / 1.96],
    'belt+thigh': [5.5 / 1.96, 3.9 / 1.96],
  },
  3: { bare: now('bare'), belt: now('belt'), 'belt+thigh': now('belt+thigh') },
};

/** With so many marked frames a foot that never leaves the floor is a clip without quiet stance. */
const MANY = 7;

/** Marked frames recommended at each end of the window. */
const AT_EACH_END = 4;
const END = 6;
const endsOf = ({ from, to }: Gates) =>
  [from, to].map((gate) => ({ from: degrees(gate - END), to: degrees(gate + END) }));

const forFault = (
  fault: RepFault,
  { rep, shown }: Assessed,
  { liftShort }: ReadingRules,
): Settle | null => {
  switch (fault.code) {
    case 'scale-missing':
      return { code: 'give-scale' };
    case 'distance-missing':
      return { code: 'give-distance' };
    case 'belt-pointer-length-missing':
      return { code: 'give-pointer-length', pointer: 'belt' };
    case 'thigh-pointer-length-missing':
      return { code: 'give-pointer-length', pointer: 'thigh' };
    case 'view-cannot-show-turn':
      return { code: 'film-from-front' };
    case 'landmarks-missing':
      return { code: 'mark-landmarks', rep: rep.id, landmarks: fault.landmarks };
    case 'no-foot-off':
      return rep.frames.length >= MANY ? { code: 'stand-still-first' } : null;
    case 'few-quiet': {
      const footOff = shown?.phases.boundaries.footOff ?? null;
      const before = rep.frames.filter(({ time }) => footOff === null || time < footOff).length;
      return footOff !== null && before >= LEAST_QUIET && !rep.sharedQuiet
        ? { code: 'stand-still-first' }
        : { code: 'mark-quiet-frames', rep: rep.id, more: fault.need - fault.have };
    }
    case 'few-near-60':
    case 'few-near-90':
    case 'few-across-window':
    case 'few-in-rise': {
      const reached = shown?.fMax ?? null;
      if (reached !== null && reached < liftShort && fault.code !== 'few-near-60')
        return { code: 'lift-higher', reached, needed: liftShort };
      return {
        code: 'mark-frames',
        rep: rep.id,
        from: fault.from ?? degrees(0),
        to: fault.to ?? degrees(180),
        more: fault.need - fault.have,
      };
    }
    default:
      return null;
  }
};

const once = (all: readonly Settle[]): readonly Settle[] => {
  const seen = new Set<string>();
  return all.filter((settle) => {
    const key = JSON.stringify(settle);
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
};

/** A reading that is not settled, with what its uncertainty is made of. */
interface Unsettled {
  readonly engine: EngineVersion;
  readonly set: LandmarkSetId;
  readonly figures: ReadingFigures;
  readonly systematic: Systematic;
  readonly gates: Gates;
}

/** More marks at the ends of the window, another rep, a richer set: with what each would bring. */
const forUnsettled = (
  used: readonly Assessed[],
  { engine, set, figures, systematic, gates }: Unsettled,
): readonly Settle[] => {
  const settle: Settle[] = [];
  for (const { rep, shown } of used)
    for (const end of endsOf(gates)) {
      const have = (shown?.frames ?? []).filter(
        ({ inFit, lift }) => inFit && lift !== null && inBand(lift, end),
      ).length;
      if (have < AT_EACH_END)
        settle.push({
          code: 'mark-frames',
          rep: rep.id,
          ...end,
          more: AT_EACH_END - have,
        });
    }
  const n = used.length;
  const from = figures.uC0;
  const random = (figures.uR ** 2 * n) / (n + 1);
  const gained =
    systematicVariance(systematic, n, gates) - systematicVariance(systematic, n + 1, gates);
  const rest = from ** 2 - figures.uR ** 2 - gained;
  const u = degrees(Math.sqrt(Math.max(0, random + rest)));
  if (u < from) settle.push({ code: 'another-rep', u, from });
  for (const richer of LANDMARK_SETS.slice(LANDMARK_SETS.indexOf(set) + 1)) {
    const typical = degrees(TYPICAL[engine][richer][n >= 3 ? 1 : 0] * Math.sqrt(widening(gates)));
    if (typical < from) settle.push({ code: 'richer-set', set: richer, u: typical, from });
  }
  return settle;
};

/** More marks help nothing where the camera stood in the wrong place. */
const decisive = (faults: readonly RepFault[]): readonly RepFault[] => {
  const view = faults.filter(({ code }) => code === 'view-cannot-show-turn');
  return view.length > 0 ? view : faults;
};

/** What would settle a reading that is not settled; empty where it is. */
export const settleOf = (
  decision: Decision,
  reps: readonly Assessed[],
  reading: Omit<Unsettled, 'gates'> | null,
  rules: ReadingRules,
): readonly Settle[] => {
  if (decision.code === 'lift-stops-short' || !reading)
    return once(
      reps.flatMap((rep) =>
        decisive(rep.faults).flatMap((fault) => forFault(fault, rep, rules) ?? []),
      ),
    );
  if (decision.line !== 2 && decision.line !== 7) return [];
  const used = reps.filter((rep) => rep.used !== null);
  return forUnsettled(used, { ...reading, gates: gatesOf(rules) });
};
