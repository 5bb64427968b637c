import type { Protocol, ReadingRules, WorkDefaults } from './protocol.ts';

/** Where a figure may lie; both ends are allowed. */
export interface Bounds {
  readonly low: number;
  readonly high: number;
}

/** The figures that a practice may set. The set-up and the assumption are no figures. */
export type FigureKey = keyof ReadingRules | 'reps' | 'framesPerSecond';

/**
 * From our model, no source. Below 45° a front clip shows lift too poorly, and the turn before the
 * lower gate needs the rise from 30° on; above 100° the model of the lift was not checked.
 */
export const BOUNDS: Readonly<Record<FigureKey, Bounds>> = {
  gateFrom: { low: 45, high: 80 },
  gateTo: { low: 65, high: 100 },
  fromBelow: { low: 6, high: 16 },
  fromAbove: { low: 6, high: 16 },
  toBelow: { low: 6, high: 16 },
  toAbove: { low: 6, high: 16 },
  liftShort: { low: 55, high: 100 },
  early: { low: 0.9, high: 0.99 },
  before: { low: 0.95, high: 0.99 },
  turnIn: { low: 0.9, high: 0.99 },
  flat: { low: 0.7, high: 0.95 },
  reps: { low: 1, high: 6 },
  framesPerSecond: { low: 30, high: 240 },
};

/** Gates nearer to each other than this leave no change to tell; wider apart than that, none was tried. */
export const APART = { least: 20, most: 45 } as const;

/** So far under the upper gate a rep may stop and still count as having reached it. */
export const MOST_SHORT = 10;

/** What is wrong with a protocol and what to do about it. */
export interface ProtocolFault {
  readonly key: keyof Protocol;
  readonly message: string;
}

const LIMITS: readonly FigureKey[] = ['early', 'before', 'turnIn', 'flat'];
const DEGREES: readonly FigureKey[] = [
  'gateFrom',
  'gateTo',
  'fromBelow',
  'fromAbove',
  'toBelow',
  'toAbove',
  'liftShort',
];

/** A probability in 100, to a tenth. */
export const inHundred = (probability: number): number => Math.round(probability * 1000) / 10;

/** A figure of the protocol as people write it: 60°, 95 in 100, 3. */
export const figureWords = (key: FigureKey, value: number): string => {
  if (DEGREES.includes(key)) return `${value}°`;
  if (LIMITS.includes(key)) return `${inHundred(value)} in 100`;
  return `${value}`;
};

const outside = (key: FigureKey, value: number): string | null => {
  const { low, high } = BOUNDS[key];
  return Number.isFinite(value) && value >= low && value <= high
    ? null
    : `Choose ${figureWords(key, low)} to ${figureWords(key, high)}.`;
};

/** What only several figures together can be wrong about. */
const together = (rules: ReadingRules): readonly ProtocolFault[] => {
  const { gateFrom, gateTo, fromAbove, toBelow, liftShort } = rules;
  const faults: ProtocolFault[] = [];
  const apart = gateTo - gateFrom;
  if (apart < APART.least)
    faults.push({
      key: 'gateTo',
      message: `Put the gates at least ${APART.least}° apart: over less lift no phone clip tells a change of turn.`,
    });
  if (apart > APART.most)
    faults.push({
      key: 'gateTo',
      message: `Put the gates at most ${APART.most}° apart: our model was not tried over more lift.`,
    });
  if (apart >= APART.least && gateFrom + fromAbove >= gateTo - toBelow)
    faults.push({
      key: 'toBelow',
      message: `Narrow one of the windows: frames of ${gateTo - toBelow}° to ${gateFrom + fromAbove}° would speak for both gates.`,
    });
  if (liftShort > gateTo || liftShort < gateTo - MOST_SHORT)
    faults.push({
      key: 'liftShort',
      message: `Choose ${gateTo - MOST_SHORT}° to ${gateTo}°: the turn is read up to the upper gate.`,
    });
  return faults;
};

const WHOLE: readonly FigureKey[] = [...DEGREES, 'reps', 'framesPerSecond'];

/** Everything that speaks against a protocol; empty where nothing does. */
export const protocolFaults = (
  protocol: ReadingRules & Pick<WorkDefaults, 'reps' | 'framesPerSecond'>,
): readonly ProtocolFault[] => {
  const own = (Object.keys(BOUNDS) as FigureKey[]).flatMap((key): readonly ProtocolFault[] => {
    const value = protocol[key];
    const message =
      outside(key, value) ??
      (WHOLE.includes(key) && !Number.isInteger(value) ? 'Choose a whole number.' : null);
    return message === null ? [] : [{ key, message }];
  });
  return own.some(({ key }) => (DEGREES as readonly string[]).includes(key))
    ? own
    : [...own, ...together(protocol)];
};
