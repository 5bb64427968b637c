import { type FigureKey, figureWords } from './bounds.ts';
import type { Protocol } from './protocol.ts';

const MODEL = 'from our model, no source';
const PRACTICE = 'common practice, no source';

/** A figure that a practice may set: what it does and where its standard comes from. */
export interface Figure {
  readonly key: FigureKey;
  readonly label: string;
  readonly does: string;
  readonly source: string;
}

export interface FigureGroup {
  readonly title: string;
  readonly figures: readonly Figure[];
}

/** Every figure of the protocol, in the order of the page. */
export const FIGURE_GROUPS: readonly FigureGroup[] = [
  {
    title: 'Gates',
    figures: [
      {
        key: 'gateFrom',
        label: 'Lower gate',
        does: 'Lift from which the change of turn counts. Below 45° a front clip shows lift too poorly.',
        source: PRACTICE,
      },
      {
        key: 'gateTo',
        label: 'Upper gate',
        does: 'Lift up to which it counts, 20° to 45° above the lower gate. Above 100° the lift of a front clip was not checked.',
        source: PRACTICE,
      },
      {
        key: 'liftShort',
        label: 'Stops short under',
        does: 'A rep that stays under this lift did not reach the upper gate; at most 10° below it.',
        source: MODEL,
      },
    ],
  },
  {
    title: 'Frames near a gate',
    figures: [
      {
        key: 'fromBelow',
        label: 'Below the lower gate',
        does: 'A marked frame so far under the lower gate still speaks for it.',
        source: MODEL,
      },
      {
        key: 'fromAbove',
        label: 'Above the lower gate',
        does: 'The same above it.',
        source: MODEL,
      },
      {
        key: 'toBelow',
        label: 'Below the upper gate',
        does: 'A marked frame so far under the upper gate still speaks for it.',
        source: MODEL,
      },
      {
        key: 'toAbove',
        label: 'Above the upper gate',
        does: 'The same above it. Two frames at each gate are needed whatever the window: the fit has four unknowns.',
        source: MODEL,
      },
    ],
  },
  {
    title: 'How sure a reading must be',
    figures: [
      {
        key: 'early',
        label: 'Turns out early',
        does: 'Probability that is needed, of a turn outwards by more than 1°. Less finds more early turns, and calls more that are none.',
        source: MODEL,
      },
      {
        key: 'before',
        label: 'Turns out before the lower gate',
        does: 'Stricter, for less is known of the way up to the lower gate. The turn must also stay: 80 in 100, fixed.',
        source: MODEL,
      },
      {
        key: 'turnIn',
        label: 'Turns in on time',
        does: 'Probability that is needed, of a turn inwards by more than 1°.',
        source: MODEL,
      },
      {
        key: 'flat',
        label: 'Holds still',
        does: 'Probability that is needed, of less than 5° either way. It is not a pass, so it may be less sure.',
        source: MODEL,
      },
    ],
  },
  {
    title: 'What new work starts from',
    figures: [
      {
        key: 'reps',
        label: 'Reps asked for',
        does: 'On each side, in the filming guide. Three find smaller turns than one.',
        source: MODEL,
      },
      {
        key: 'framesPerSecond',
        label: 'Frames per second asked for',
        does: 'In the filming guide. From gate to gate a lift takes 0.15 to 0.35 s.',
        source: PRACTICE,
      },
    ],
  },
];

export const FIGURES: readonly Figure[] = FIGURE_GROUPS.flatMap(({ figures }) => figures);

/** What a version changes, in words. */
export interface Difference {
  readonly label: string;
  readonly from: string;
  readonly to: string;
}

/** @param nameOf a set-up; null where it is not there any more */
export const differences = (
  from: Protocol,
  to: Protocol,
  nameOf: (setUpId: string) => string | null,
): readonly Difference[] => {
  const setUp = (id: string | null): string =>
    id === null ? 'none' : (nameOf(id) ?? 'one that was deleted');
  const onOff = (on: boolean): string => (on ? 'on' : 'off');
  return [
    ...FIGURES.flatMap(({ key, label }) =>
      from[key] === to[key]
        ? []
        : [{ label, from: figureWords(key, from[key]), to: figureWords(key, to[key]) }],
    ),
    ...(from.thighTurnsLittle === to.thighTurnsLittle
      ? []
      : [
          {
            label: 'The planted thigh turns little',
            from: onOff(from.thighTurnsLittle),
            to: onOff(to.thighTurnsLittle),
          },
        ]),
    ...(from.setUpId === to.setUpId
      ? []
      : [{ label: 'Set-up of a new visit', from: setUp(from.setUpId), to: setUp(to.setUpId) }]),
  ];
};
