import { landmark, LANDMARKS } from '#shared/landmarks/table.ts';
import { decimal } from './figures.ts';

const KNOWN = new Map(LANDMARKS.map(({ id }) => [id as string, id]));

/** A landmark's name; its id where this page does not know it. */
export const landmarkLabel = (id: string): string => {
  const known = KNOWN.get(id);
  return known ? landmark(known).label : id;
};

/** The same in running text. */
export const landmarkInText = (id: string): string => {
  const label = landmarkLabel(id);
  return label.charAt(0).toLowerCase() + label.slice(1);
};

/** `1.7 px`, with millimetres where the scale is known: `1.7 px (2.4 mm)`. */
export const errorWords = (px: number, mm: number | null): string =>
  `${decimal(px)} px${mm === null ? '' : ` (${decimal(mm)} mm)`}`;

/**
 * What a reading takes one anatomical mark to be wrong by: `own marking error, 1.8 px from 24 frames marked twice`,
 * `assumed marking error, 3 px`.
 */
export const markErrorWords = (
  { px, frames }: { readonly px: number; readonly frames: number },
  whose = 'own',
): string =>
  frames === 0
    ? `assumed marking error, ${decimal(px, Number.isInteger(px) ? 0 : 1)} px`
    : `${whose} marking error, ${decimal(px)} px from ${frames} frames marked twice`;
