import type { LandmarkId } from '#shared/landmarks/types.ts';
import {
  kappa,
  countPairs,
  type Limits,
  limitsOfAgreement,
  type Pair,
  smallestDetectable,
  standardError,
  typicalError,
} from './agreement.ts';
import { type Icc, iccFixed, iccOfMeans, iccOneWay, iccRandom } from './icc.ts';
import { typicalMarkError } from './mark-repeat.ts';
import { doublyMarked, isAnatomical, type MarkedTwice } from './marked-twice.ts';
import { meanSquares } from './variance.ts';

/** The marks of one finished second marking. */
export interface FinishedMarks {
  readonly repId: string;
  readonly marks: readonly MarkedTwice[];
  readonly mmPerPx: number | null;
}

/** Typical error √(Σd²/2n) of one coordinate of one landmark. */
export interface LandmarkRepeat {
  readonly landmark: LandmarkId;
  /** How many were marked twice. */
  readonly marks: number;
  readonly px: number;
  /** Null where no clip had its scale. */
  readonly mm: number | null;
}

/** How well marks repeat. `px` and `mm` are of the anatomical landmarks alone: theirs is the error a reading takes. */
export interface MarkRepeat {
  /** Frames with an anatomical landmark marked twice. */
  readonly frames: number;
  readonly marks: number;
  readonly px: number | null;
  readonly mm: number | null;
  /** Every landmark marked twice, worst first. */
  readonly landmarks: readonly LandmarkRepeat[];
}

const inMm = (finished: readonly FinishedMarks[]): FinishedMarks[] =>
  finished.flatMap(({ repId, marks, mmPerPx: k }) =>
    k === null
      ? []
      : [
          {
            repId,
            mmPerPx: k,
            marks: marks.map((mark) => ({
              ...mark,
              first: { u: mark.first.u * k, v: mark.first.v * k },
              second: { u: mark.second.u * k, v: mark.second.v * k },
            })),
          },
        ],
  );

const only = (
  finished: readonly FinishedMarks[],
  wanted: (landmark: LandmarkId) => boolean,
): FinishedMarks[] =>
  finished.map((each) => ({
    ...each,
    marks: each.marks.filter(({ landmark }) => wanted(landmark)),
  }));

const errorOf = (finished: readonly FinishedMarks[]): number | null =>
  typicalMarkError(finished.flatMap(({ repId, marks }) => doublyMarked(repId, marks)));

/** Of marks from any number of second markings. */
export const markRepeatOf = (finished: readonly FinishedMarks[]): MarkRepeat => {
  const scaled = inMm(finished);
  const anatomical = only(finished, isAnatomical);
  const all = doublyMarkedOf(anatomical);
  const ids = [...new Set(finished.flatMap(({ marks }) => marks.map((mark) => mark.landmark)))];
  return {
    frames: new Set(all.map(({ frame }) => frame)).size,
    marks: all.length,
    px: typicalMarkError(all),
    mm: errorOf(only(scaled, isAnatomical)),
    landmarks: ids
      .flatMap((landmark): LandmarkRepeat[] => {
        const here = only(finished, (id) => id === landmark);
        const px = errorOf(here);
        return px === null
          ? []
          : [
              {
                landmark,
                marks: here.reduce((sum, { marks }) => sum + marks.length, 0),
                px,
                mm: errorOf(only(scaled, (id) => id === landmark)),
              },
            ];
      })
      .sort((a, b) => b.px - a.px),
  };
};

/** The anatomical landmarks of some second markings, as a person's own marking error is made from them. */
export const doublyMarkedOf = (finished: readonly FinishedMarks[]) =>
  only(finished, isAnatomical).flatMap(({ repId, marks }) => doublyMarked(repId, marks));

/** Fewer pairs than this say nothing of how well a value repeats; common practice asks for many more, no source. */
export const LEAST_PAIRS = 5;

/** Why a figure is not there. */
export type WhyUnknown = 'too-few' | 'all-alike';

/** How well a value in degrees repeats over frames measured twice. What is unknown is null; `why` says why. */
export interface ValueAgreement {
  readonly pairs: number;
  readonly why: WhyUnknown | null;
  readonly oneWay: Icc | null;
  readonly random: Icc | null;
  readonly fixed: Icc | null;
  /** Of the mean of the two markings. */
  readonly ofMeans: ReturnType<typeof iccOfMeans>;
  readonly sem: number | null;
  /** Smallest detectable change, 95 %. */
  readonly mdc95: number | null;
  /** √(Σd²/2n), Dahlberg. */
  readonly typical: number | null;
  readonly limits: Limits | null;
  /** Mean of both against first less second, for the plot. */
  readonly points: readonly { readonly mean: number; readonly difference: number }[];
}

const UNKNOWN = {
  oneWay: null,
  random: null,
  fixed: null,
  ofMeans: null,
  sem: null,
  mdc95: null,
  typical: null,
  limits: null,
} as const;

export const valueAgreementOf = (pairs: readonly Pair[]): ValueAgreement => {
  const points = pairs.map(([a, b]) => ({ mean: (a + b) / 2, difference: a - b }));
  const squares = pairs.length < LEAST_PAIRS ? null : meanSquares(pairs);
  if (!squares) return { pairs: pairs.length, why: 'too-few', ...UNKNOWN, points };
  const sem = standardError(pairs);
  const icc = { oneWay: iccOneWay(squares), random: iccRandom(squares), fixed: iccFixed(squares) };
  return {
    pairs: pairs.length,
    why: icc.oneWay && icc.random && icc.fixed ? null : 'all-alike',
    ...icc,
    ofMeans: iccOfMeans(squares),
    sem,
    mdc95: sem === null ? null : smallestDetectable(sem),
    typical: typicalError(pairs),
    limits: limitsOfAgreement(pairs),
    points,
  };
};

/** How far two judges agree beyond chance. */
export interface AnswerAgreement {
  readonly pairs: number;
  /** How many of them were the same answer. */
  readonly same: number;
  readonly kappa: number | null;
  readonly why: WhyUnknown | null;
}

/** Cohen's kappa of pairs of answers. */
export const answerAgreementOf = <T extends string>(
  answers: readonly T[],
  pairs: readonly (readonly [T, T])[],
): AnswerAgreement => {
  const same = pairs.filter(([a, b]) => a === b).length;
  if (pairs.length < LEAST_PAIRS) return { pairs: pairs.length, same, kappa: null, why: 'too-few' };
  const value = kappa(countPairs(answers, pairs));
  return { pairs: pairs.length, same, kappa: value, why: value === null ? 'all-alike' : null };
};
