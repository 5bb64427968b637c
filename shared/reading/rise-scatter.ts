import { CONSTANTS } from '#shared/measures/constants.ts';
import type { UsedRep } from './fit-rep.ts';
import type { Scatter } from './process-matrices.ts';
import type { Scattered } from './quiet-scatter.ts';

/** Tracked marks drift: what they err together does not show as scatter, and is at least that of a hand. */
const LEAST_FACTOR = 1 / CONSTANTS.trackedFactor.value ** 2;

const PRIOR_FRAMES = 6;
const TERMS = 4;

type TurnZero = NonNullable<UsedRep['course']['setting']['turnZero']>;

/** What of a rep tells of its scatter. */
export interface ScatteringRep {
  readonly fitted: { readonly fit: Pick<UsedRep['fitted']['fit'], 'sFit' | 'nu' | 'used'> };
  readonly course: {
    readonly setting: {
      readonly turnZero: Pick<TurnZero, 'femurVariance' | 'pelvisVariance'> | null;
    };
  };
}

/** What the frames of all rises scatter around their fits. */
export const riseScatter = (used: readonly ScatteringRep[]): Scattered => {
  let squares = 0;
  let free = 0;
  for (const { fitted } of used) {
    const { sFit, nu, used: frames } = fitted.fit;
    squares += sFit * sFit * nu - PRIOR_FRAMES;
    free += frames - TERMS;
  }
  return { squares, free };
};

/**
 * How much larger marks scatter than is assumed of them, over all reps together, from what was seen of
 * it; the assumption counts as six free squares. `nu`: degrees of freedom.
 */
export const scatterOf = (
  used: readonly ScatteringRep[],
  ...seen: readonly Scattered[]
): { readonly scatter: Scatter; readonly nu: number } => {
  const nu = seen.reduce((sum, { free }) => sum + free, PRIOR_FRAMES);
  const squares = seen.reduce((sum, each) => sum + each.squares, PRIOR_FRAMES);
  const factor = Math.max(LEAST_FACTOR, squares / nu);
  const zero = (read: (rep: ScatteringRep) => number | undefined): readonly number[] =>
    used.map((rep) => (read(rep) ?? 0) * (180 / Math.PI) ** 2 * factor);
  return {
    nu,
    scatter: {
      factor,
      zeroThigh: zero(({ course }) => course.setting.turnZero?.femurVariance),
      zeroPelvis: zero(({ course }) => course.setting.turnZero?.pelvisVariance),
    },
  };
};
