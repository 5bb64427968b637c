import type { Visit } from '#shared/contracts/visits.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { metres } from '#src/ui/figures.ts';

export type FilmingKey = keyof Visit['filming'];

type Figure = {
  key: FilmingKey;
  label: string;
  unit: 'm' | 'mm';
  hint: string;
  /** What is lost while it is not known. */
  without: string;
  /** Its figures were worked out between gates, which a practice may have changed. */
  studied?: true;
};

/** The figures of a way of filming, in the order they are taken. */
export const FILMING: readonly Figure[] = [
  {
    key: 'distanceMm',
    label: 'Distance',
    unit: 'm',
    hint: 'From the lens to the middle of the standing foot: 2.5 to 3.5 m for 1080p.',
    without: 'no turn can be measured',
  },
  {
    key: 'lensHeightMm',
    label: 'Lens height',
    unit: 'm',
    hint: 'From the floor. Put it at the height of the pelvis.',
    without: 'lift is known to ±\u00a07° instead of ±\u00a02°',
  },
  {
    key: 'rodMm',
    label: 'Rod',
    unit: 'm',
    hint: 'Its length. It stands beside the athlete, at their own distance.',
    without: 'body height gives the scale',
  },
  {
    key: 'beltPointerMm',
    label: 'Belt pointer',
    unit: 'mm',
    hint: 'From the line between the two front corners of the hip bones to its tip.',
    without: 'turn is not measured from a single rep',
  },
  {
    key: 'thighPointerMm',
    label: 'Thigh pointer',
    unit: 'mm',
    hint: 'From the skin to its tip.',
    without: `three reps tell a change of turn from none beyond ${ACHIEVED.belt.toldFromNone.three}° instead of ${ACHIEVED['belt+thigh'].toldFromNone.three}°`,
    studied: true,
  },
];

export const lengthWords = (mm: number, unit: 'm' | 'mm'): string =>
  unit === 'm' ? metres(mm) : `${Math.round(mm)} mm`;
