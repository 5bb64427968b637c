import { type Chance, chanceOf } from './chance.ts';
import type { Marking } from './marking.ts';
import { type SourceLines, SOURCES } from './pinhole.ts';

/** What is true of a trial. 'any': drawn from the spread of turns that the prior believes in. */
export type Truth = 'none' | 'expected' | 'early' | 'any';

/** Early turns whose power is counted, degrees. The method's table names all but the first. */
export const EARLY = [5, 6.2, 8.8, 12, 16] as const;

/** Conditions of one trial. */
export interface Plan {
  readonly index: number;
  readonly truth: Truth;
  /** True change of the person's turn from 60° to 90° of lift, degrees. */
  readonly change: number;
  readonly reps: number;
  readonly lines: SourceLines;
  readonly marking: Marking;
  /** Skin artefact, times the assumed. */
  readonly artefact: 1 | 2;
  /** Marks independent of each other and the artefact as assumed. */
  readonly assumed: boolean;
}

/** 3 px marked on 1,080 lines: what the method's table was made for. */
const TABLE_MARKING: Marking = { errorPx: 3, pointerPx: 1.5, scale: 1, tracked: false };

const markingOf = (chance: Chance, lines: SourceLines, tracked: boolean): Marking => {
  const errorPx = chance.between(2, 5);
  // a clip of 2,160 lines is marked on a picture of 1,080 or, for half, as it is
  const scale = lines === 2160 && chance.pick([true, false]) ? 2 : 1;
  return { errorPx, pointerPx: errorPx / 2, scale, tracked };
};

const SPREAD_OF_TURNS = 8;

/** Twenty trials in a row: what is true of them, and how many are as the engine assumes or harder. */
const ROW: readonly { readonly truth: Truth; readonly hard: boolean }[] = [
  ...Array.from({ length: 4 }, () => ({ truth: 'none', hard: false }) as const),
  ...Array.from({ length: 2 }, () => ({ truth: 'none', hard: true }) as const),
  { truth: 'expected', hard: false },
  ...Array.from({ length: 5 }, () => ({ truth: 'early', hard: false }) as const),
  ...Array.from({ length: 6 }, () => ({ truth: 'any', hard: false }) as const),
  ...Array.from({ length: 2 }, () => ({ truth: 'any', hard: true }) as const),
];

const changeOf = (chance: Chance, truth: Truth, place: number): number => {
  switch (truth) {
    case 'none':
      return 0;
    case 'expected':
      return chance.between(-14, -6);
    case 'early':
      return EARLY[place % EARLY.length] ?? 0;
    case 'any':
      return chance.normal(0, SPREAD_OF_TURNS);
  }
};

/** Conditions of trial `index` of the study with this seed. */
export const planOf = (
  seed: number,
  index: number,
): { readonly plan: Plan; readonly chance: Chance } => {
  const chance = chanceOf((Math.imul(seed, 1_000_003) + Math.imul(index, 7919)) >>> 0);
  const place = index % ROW.length;
  const round = Math.floor(index / ROW.length);
  const { truth, hard } = ROW[place] ?? { truth: 'any', hard: false };
  const change = changeOf(chance, truth, place);
  if (truth === 'early') {
    // one and three reps in turn, as in the method's table
    const reps = round % 2 === 0 ? 3 : 1;
    const table = { lines: 1080, marking: TABLE_MARKING, artefact: 1, assumed: true } as const;
    return { plan: { index, truth, change, reps, ...table }, chance };
  }
  // harder: drifting marks, twice the artefact, or both
  const artefact = hard && chance.pick([true, true, false]) ? 2 : 1;
  const tracked = hard && (artefact === 1 || chance.pick([true, false]));
  const lines = chance.pick(SOURCES);
  return {
    plan: {
      index,
      truth,
      change,
      reps: chance.pick([1, 2, 3, 4]),
      lines,
      marking: markingOf(chance, lines, tracked),
      artefact,
      assumed: artefact === 1 && !tracked,
    },
    chance,
  };
};
