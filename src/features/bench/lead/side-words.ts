import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { roleIn } from '#shared/landmarks/table.ts';
import { type LandmarkId, otherSide } from '#shared/landmarks/types.ts';

/** Which leg is meant while both feet stand: `The athlete’s left, on the right of the picture.` */
export const sideWords = (
  id: LandmarkId,
  { supportSide, view }: Pick<Rep, 'supportSide' | 'view'>,
  { mirrored }: Pick<BenchDocument['clip'], 'mirrored'>,
): string => {
  const role = roleIn(id, view);
  if (role === 'midline' || (view !== 'front' && view !== 'back')) return '';
  const own = role === 'support' ? supportSide : otherSide(supportSide);
  const facing = (view === 'front') !== mirrored;
  return `The athlete’s ${own}, on the ${facing ? otherSide(own) : own} of the picture.`;
};
