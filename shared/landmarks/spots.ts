import { landmarksIn, roleIn } from './table.ts';
import { type LandmarkId, otherSide, type Side, type View } from './types.ts';

/**
 * A place on the body, whichever leg is stood on: a landmark without its role and with the athlete's
 * own side, `asis/left`, `belt-tip`. What was found of it holds for reps of both sides.
 */
export type SpotId = string & { readonly spot: unique symbol };

/** In which rep a landmark is meant: its roles follow the leg stood on. */
export interface Standing {
  readonly supportSide: Side;
  readonly view: View;
}

export const spotOf = (id: LandmarkId, { supportSide, view }: Standing): SpotId => {
  const role = roleIn(id, view);
  const base = id.replace(/-(support|lifted)$/, '');
  if (role === 'midline') return base as SpotId;
  return `${base}/${role === 'support' ? supportSide : otherSide(supportSide)}` as SpotId;
};

/** What a place is called in a rep; null where such a rep has no use for it (the other leg's knee-cap). */
export const landmarkAt = (spot: SpotId, standing: Standing): LandmarkId | null =>
  landmarksIn(standing.view).find((id) => spotOf(id, standing) === spot) ?? null;
