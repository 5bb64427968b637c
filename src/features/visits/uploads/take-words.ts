import { FILMING_LIMITS as LIMITS } from '#shared/measures/filming-limits.ts';
import type { TakeLook } from '#src/tracking/take/look-at-take.ts';
import type { Answer, Unanswered } from '#src/tracking/take/types.ts';
import { capital, decimal } from '#src/ui/figures.ts';
import type { Verdict } from './judge.ts';

/** The steps of the filming guide that a sentence leads to. */
export type GuideStep = 'frame' | 'dots' | 'lift';

export const GUIDE_STEPS = {
  frame: 'Whole body in the picture',
  dots: 'Where the dots go',
  lift: 'Three still seconds, then slowly',
} as const satisfies Record<GuideStep, string>;

export interface TakeLine {
  readonly grade: Verdict['grade'] | 'open';
  readonly words: string;
  readonly step: GuideStep;
}

export interface TakeVerdict {
  /** `open`: nothing speaks against it, and something could not be told. */
  readonly grade: Verdict['grade'] | 'open';
  readonly summary: string;
  /** What speaks against it first, then what could be better, then what is left to the eye. */
  readonly lines: readonly TakeLine[];
  /** Of a take that was looked at up to here only: the rest of it may say something else. */
  readonly inPart: string | null;
}

const WHY: Record<Unanswered, string> = {
  'too-few-pictures': 'the clip is too short',
  'camera-moved': 'the whole picture moves; put the phone on a stand',
  'no-lift': 'no lift from standing still and back was found',
  'too-small': 'the athlete is small in the picture, or hardly moves',
  'never-still': 'nobody stands still in it',
  'too-coarse': 'the picture is too small',
  'few-round': 'there are a few round things, which may be dots or not',
};

const s = (value: number): string => `${decimal(value)}\u00a0s`;

/** A line for what is wrong or could be better; null where all is well. */
type Said<Figure> = (answer: { told: 'yes' | 'no' } & Figure) => Omit<TakeLine, 'step'> | null;

const line = <Figure>(
  answer: Answer<Figure>,
  step: GuideStep,
  unknown: string,
  said: Said<Figure>,
): TakeLine[] => {
  if (answer.told === 'cannot-tell')
    return [{ grade: 'open', words: `${unknown} could not be told: ${WHY[answer.why]}.`, step }];
  const one = said(answer);
  return one ? [{ ...one, step }] : [];
};

const again = (words: string) => ({ grade: 'again' as const, words });
const weak = (words: string) => ({ grade: 'weak' as const, words });

const linesOf = ({ head, feet, still, rise, dots }: TakeLook): TakeLine[] => [
  ...line(head, 'frame', 'Whether the head is in the picture', ({ told }) =>
    told === 'no'
      ? again('The head is cut off: step back or tilt the phone up until there is wall above it.')
      : null,
  ),
  ...line(feet, 'frame', 'Whether the feet are in the picture', ({ told }) =>
    told === 'no'
      ? again('The feet are cut off: step back or lower the phone until there is floor below them.')
      : null,
  ),
  ...line(still, 'lift', 'How long the athlete stood still', ({ told, seconds }) =>
    told === 'no'
      ? again(
          seconds === 0
            ? `The athlete moves from the first picture on: start the phone, then wait ${LIMITS.stillSeconds.value} still seconds on both feet.`
            : `Still for ${s(seconds)} before the first lift: wait ${LIMITS.stillSeconds.value} seconds on both feet.`,
        )
      : seconds < LIMITS.stillSeconds.value - 0.25
        ? weak(
            `Still for ${s(seconds)} before the first lift; ${LIMITS.stillSeconds.value} seconds make zero firmer.`,
          )
        : null,
  ),
  ...line(rise, 'lift', 'How fast the lift was', ({ told, seconds }) =>
    told === 'no'
      ? again(
          `The quickest lift reaches its top ${s(seconds)} after the first movement: the leg is swung. Take ${LIMITS.riseSeconds.value} seconds, with the two short stops.`,
        )
      : seconds < LIMITS.riseSeconds.value - 0.25
        ? weak(
            `The quickest lift takes ${s(seconds)} to its top; ${LIMITS.riseSeconds.value} seconds show more of the way.`,
          )
        : null,
  ),
  ...line(dots, 'dots', 'Whether there are dots on the skin', ({ told }) =>
    told === 'no'
      ? again(
          'No round dots were found: stick them on both front corners of the hip bone and on both knees.',
        )
      : null,
  ),
];

const ORDER = { again: 0, weak: 1, open: 2, good: 3 } as const;

const wellOf = ({ head, feet, still, rise, dots }: TakeLook): string[] => [
  ...(head.told === 'yes' && feet.told === 'yes' ? ['head, feet and floor in the picture'] : []),
  ...(still.told === 'yes' ? [`still for ${s(still.seconds)}`] : []),
  ...(rise.told === 'yes' ? [`up in ${s(rise.seconds)} or slower`] : []),
  ...(dots.told === 'yes' ? ['dots found'] : []),
];

/** Why nothing at all could be told; null where something was. */
const nothingTold = ({ head, feet, still, rise, dots }: TakeLook): Unanswered | null =>
  [head, feet, still, rise, dots].every(({ told }) => told === 'cannot-tell') &&
  head.told === 'cannot-tell'
    ? head.why
    : null;

const summaryOf = (grade: TakeVerdict['grade'], look: TakeLook): string => {
  const well = wellOf(look);
  const seen = well.length === 0 ? '' : `: ${well.join(', ')}`;
  if (grade === 'again') return 'Film again, while the athlete is still here:';
  if (grade === 'open')
    return `Nothing speaks against this take${seen}. Look at the rest yourself:`;
  return `The take ${grade === 'good' ? 'is good' : 'will do'}${seen}.`;
};

/** Seen from the front a pointer points at the lens: its tip is one round thing among others. */
const POINTERS =
  'Whether the pointers are worn could not be told from the picture: look at the athlete.';

export const takeVerdict = (look: TakeLook, asksPointers: boolean): TakeVerdict => {
  const inPart =
    look.lookedAt < look.length - 0.5
      ? `Only the first ${s(look.lookedAt)} of ${s(look.length)} were looked at.`
      : null;
  const nothing = nothingTold(look);
  if (nothing !== null) {
    const words = `${capital(WHY[nothing])}. Look at the take yourself before the athlete leaves.`;
    return {
      grade: 'open',
      summary: 'Whether this take will do could not be told:',
      lines: [{ grade: 'open', words, step: nothing === 'no-lift' ? 'lift' : 'frame' }],
      inPart,
    };
  }
  const lines = linesOf(look).sort((a, b) => ORDER[a.grade] - ORDER[b.grade]);
  const grade = lines[0]?.grade ?? 'good';
  const pointers: TakeLine[] = asksPointers
    ? [{ grade: 'open', words: POINTERS, step: 'dots' }]
    : [];
  return { grade, summary: summaryOf(grade, look), lines: [...lines, ...pointers], inPart };
};
