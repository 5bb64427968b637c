import type {
  AnswerAgreementShape,
  Reliability,
  ValueAgreementShape,
} from '#shared/contracts/reliability.ts';
import { decimal, degrees } from '#src/ui/figures.ts';
import { errorWords } from '#src/ui/mark-error-words.ts';

type Person = Reliability['people'][number];

/** What a new reading of this person's marks takes. */
export const takenWords = ({ px, fromFrames }: Person): string =>
  fromFrames === 0 ? `${decimal(px, 0)} px, assumed` : `${decimal(px)} px, own`;

/** How far a person is from an error of their own. */
export const ownErrorWords = ({ frames, fromFrames }: Person, least: number): string => {
  if (fromFrames > 0) return `from ${fromFrames} frames marked twice`;
  const left = Math.max(0, least - frames);
  return frames === 0
    ? `none marked twice yet; ${least} are needed`
    : left > 0
      ? `${frames} marked twice, ${left} more are needed`
      : `${frames} marked twice without any difference`;
};

const WHY = {
  'too-few': 'Too few pairs yet to say more: it takes five.',
  'all-alike': 'Without spread between the frames there is nothing to correlate.',
} as const;

/** Why a figure is missing, in words; null where none is. */
export const whyWords = ({ why }: { readonly why: keyof typeof WHY | null }): string | null =>
  why && WHY[why];

type Icc = ValueAgreementShape['random'];
export const iccWords = (icc: Icc): string =>
  icc === null
    ? 'unknown'
    : `${decimal(icc.value, 2)} (${decimal(icc.low, 2)} to ${decimal(icc.high, 2)})`;

export const degreesOrUnknown = (value: number | null): string =>
  value === null ? 'unknown' : degrees(value);

/** `They agreed in 7 of 9, kappa 0.64.` */
export const answersWords = (agreement: AnswerAgreementShape, what: string): string => {
  const { pairs, same, kappa } = agreement;
  if (pairs === 0) return `No ${what} on both sides yet.`;
  const chance =
    kappa === null ? whyWords(agreement) : `Beyond chance: kappa ${decimal(kappa, 2)}.`;
  return `The same in ${same} of ${pairs}. ${chance ?? ''}`.trim();
};

/** The typical error of one coordinate; `unknown` where nothing was marked twice. */
export const typicalWords = (px: number | null, mm: number | null): string =>
  px === null ? 'unknown' : errorWords(px, mm);
