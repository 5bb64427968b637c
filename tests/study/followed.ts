import { readingInputOf, TRIAL_SETS, type TrialSet } from '#shared/evaluate/trial.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import { clipsOf } from './clip.ts';
import type { StudyOptions } from './outcome.ts';
import { planOf } from './plan.ts';
import type { Count } from './tables.ts';

/**
 * The same people, marked by hand and with marks that the computer followed from one touch in the quiet
 * stance: does help make a reading worse?
 */

/** A followed mark slips off its place about once in thirty landmarks and reps. From our model, no source. */
const SLIPS = 0.03;

/** Early calls of one way of marking: where there is no turn, and where there is one of a size. */
export interface Called {
  readonly falseEarly: Count;
  readonly found: Count;
}
export interface Help {
  readonly set: TrialSet;
  readonly byHand: Called;
  readonly followed: Called;
}

const NONE: Count = { hits: 0, of: 0 };
const plus = ({ hits, of }: Count, hit: boolean): Count => ({
  hits: hits + (hit ? 1 : 0),
  of: of + 1,
});

/** Trials with no turn, or with a clear early one, of the study with this seed. */
export const helpOf = ({ seed, trials, engine, runs }: StudyOptions): readonly Help[] => {
  const called = new Map<string, Called>();
  for (let index = 0; index < trials; index += 1) {
    for (const followed of [false, true]) {
      const { plan, chance } = planOf(seed, index);
      const none = plan.truth === 'none';
      if (!none && !(plan.truth === 'early' && plan.change >= CLEAR)) continue;
      const marking = { ...plan.marking, tracked: followed, slips: followed ? SLIPS : 0 };
      const { side, reps } = clipsOf({ ...plan, marking }, chance);
      const trial = { id: String(index), supportSide: side, reps };
      for (const set of TRIAL_SETS) {
        const { code } = deriveReading(readingInputOf(trial, set, engine), runs);
        const key = `${set} ${followed}`;
        const before = called.get(key) ?? { falseEarly: NONE, found: NONE };
        const early = code === 'early-turn-out';
        called.set(
          key,
          none
            ? { ...before, falseEarly: plus(before.falseEarly, early) }
            : { ...before, found: plus(before.found, early) },
        );
      }
    }
  }
  const of = (set: TrialSet, followed: boolean): Called =>
    called.get(`${set} ${followed}`) ?? { falseEarly: NONE, found: NONE };
  return TRIAL_SETS.map((set) => ({ set, byHand: of(set, false), followed: of(set, true) }));
};

/** An early turn this large is clear with pointers and three reps, degrees. */
const CLEAR = 8.8;

const share = ({ hits, of }: Count): string =>
  of === 0 ? '–' : `${((100 * hits) / of).toFixed(1)} % (${hits} of ${of})`;

export const helpWords = (all: readonly Help[]): string =>
  [
    'the same people by hand, and followed from one touch with drift and an occasional slip',
    ...all.map(
      ({ set, byHand, followed }) =>
        `  ${set}: early calls at no turn ${share(byHand.falseEarly)} by hand, ${share(followed.falseEarly)} followed; early turns of ${CLEAR}° and more found ${share(byHand.found)}, ${share(followed.found)}`,
    ),
  ].join('\n');
