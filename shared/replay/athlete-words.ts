import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Seen } from '#shared/contracts/calls.ts';
import { READING_LABELS } from '#shared/contracts/readings.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import { capital, inWords, levelWords } from '#shared/exports/running-text.ts';
import type { Gates } from '#shared/protocol/protocol.ts';

/** What the athlete reads: a heading and a few sentences without a term of the trade. */
export interface AthleteWords {
  readonly title: string;
  readonly text: readonly string[];
  /** How sure, in words; empty where nothing was measured. */
  readonly sure: string;
}

type Reading = NonNullable<PublicReplay['reading']>;

const stood = (side: Side): string =>
  `You stood on the ${side} leg and lifted the ${otherSide(side)} knee.`;

/** `Three times of three,`; nothing where no rep agrees, which the words then need not mention. */
const times = ({ repsUsed, repsAgreeing }: Reading): string =>
  repsUsed < 2 || repsAgreeing === 0
    ? ''
    : `${capital(inWords(repsAgreeing))} ${repsAgreeing === 1 ? 'time' : 'times'} of ${inWords(repsUsed)}, `;

const after = (start: string, rest: string): string =>
  start === '' ? capital(rest) : start + rest;

export const howSureWords = (p: number | null): string => {
  if (p === null) return '';
  if (p >= 0.99) return 'We are almost certain of the direction, less of the size.';
  if (p >= 0.95) return 'We are very sure of the direction, less of the size.';
  return 'This is likely, not certain.';
};

/** Turned out already before the lower gate: the label says so beside the plain words. */
const beforeGate = ({ label, code }: Reading): boolean => label !== READING_LABELS[code];

const cameTo = (lift: number): string => `came to ${levelWords(lift)}`;

const wasAt = (lift: number): string => (lift === 90 ? 'was level' : cameTo(lift));

const partOfTheWay = ({ from, to }: Gates): string =>
  from === 60 && to === 90 ? 'was two thirds of the way up' : cameTo(from);

/** A measured reading in the athlete's words. */
export const readingWords = (reading: Reading, side: Side, gates: Gates): AthleteWords => {
  const sure = howSureWords(reading.probability);
  switch (reading.code) {
    case 'early-turn-out':
      return {
        title: `Your ${side} hip turns out early`,
        text: [
          stood(side),
          after(
            times(reading),
            beforeGate(reading)
              ? `the hip you stand on had turned outwards before the lifted thigh ${partOfTheWay(gates)}.`
              : `the hip you stand on turned outwards before the lifted thigh ${wasAt(gates.to)}.`,
          ),
        ],
        sure,
      };
    case 'expected-turn-in':
      return {
        title: `Your ${side} hip turns in on time`,
        text: [
          stood(side),
          after(
            times(reading),
            `the hip you stand on turned inwards while the lifted thigh ${cameTo(gates.to)}. That is what is expected.`,
          ),
        ],
        sure,
      };
    case 'holds-still':
      return {
        title: `Your ${side} hip holds still`,
        text: [
          stood(side),
          `The hip you stand on hardly turned while the lifted thigh ${cameTo(gates.to)}. A turn inwards is expected there and was not seen; your coach will look at it again.`,
        ],
        sure,
      };
    case 'cannot-tell':
      return {
        title: 'We can’t tell yet',
        text: [
          stood(side),
          'What was measured is not clear enough to say what the hip you stand on does. That says nothing about you; another try will show more.',
        ],
        sure: '',
      };
    case 'lift-stops-short':
      return {
        title: `The lift stopped before ${levelWords(gates.to)}`,
        text: [
          stood(side),
          `The thigh did not come near ${levelWords(gates.to)}, so what the hip you stand on does there was not seen. Lift only as far as it goes without pain.`,
        ],
        sure: '',
      };
    case 'not-measurable':
      return {
        title: 'Not measured this time',
        text: [
          stood(side),
          'The film does not show enough to measure how the hip you stand on turns.',
        ],
        sure: '',
      };
  }
};

/** A call by eye in the athlete's words; it is never said without who saw it. */
export const callWords = (seen: Seen, side: Side, coach: string, gates: Gates): AthleteWords => {
  const eye = `${coach} looked, and saw`;
  switch (seen) {
    case 'early':
      return {
        title: `Your ${side} hip turned out early`,
        text: [
          stood(side),
          `${eye} the hip you stand on swing outwards before the thigh ${wasAt(gates.to)}.`,
        ],
        sure: '',
      };
    case 'on-time':
      return {
        title: `Your ${side} hip turned in on time`,
        text: [
          stood(side),
          `${eye} the hip you stand on turn inwards while the thigh ${cameTo(gates.to)}.`,
        ],
        sure: '',
      };
    case 'still':
      return {
        title: `Your ${side} hip held still`,
        text: [
          stood(side),
          `${eye} no turn of the hip you stand on, neither outwards nor inwards.`,
        ],
        sure: '',
      };
    case 'unsure':
      return {
        title: 'It could not be told by eye',
        text: [stood(side), `${coach} looked, and could not tell how the hip you stand on turned.`],
        sure: '',
      };
  }
};

/** `This is a way of moving…` stands under every result, with what the test does not do. */
export const NOT_AN_INJURY =
  'It is a way of moving, not an injury. This test does not look for injury and cannot rule one out.';
