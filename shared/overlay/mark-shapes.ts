import { LANDMARKS, roleIn } from '#shared/landmarks/table.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { LandmarkId, Mark, Marks, View } from '#shared/landmarks/types.ts';
import type { MarkShape, OverlayRole, OverlayState } from './types.ts';

/** What a mark looks like, from how it came to be. */
export const stateOf = (
  id: LandmarkId,
  mark: Mark,
  conflicts: ReadonlySet<LandmarkId>,
): OverlayState => {
  if (conflicts.has(id)) return 'conflict';
  return !mark.hidden && mark.source === 'tracked' && !mark.looked ? 'tracked' : 'placed';
};

export const shapeAt = (
  role: OverlayRole,
  state: OverlayState,
  at: FramePoint,
  landmark: LandmarkId | null,
): MarkShape => {
  if (role === 'lifted') return { kind: 'diamond', at, role, state, landmark };
  if (role === 'midline') return { kind: 'bracket', at, role, state, landmark };
  return { kind: 'ring', at, radius: null, role, state, landmark };
};

/** One shape per placed mark, in the order of marking; hidden marks draw nothing. */
export const markShapes = (
  marks: Marks,
  view: View,
  conflicts: ReadonlySet<LandmarkId> = new Set(),
): MarkShape[] =>
  LANDMARKS.flatMap(({ id }) => {
    const mark = marks[id];
    if (!mark || mark.hidden) return [];
    return [shapeAt(roleIn(id, view), stateOf(id, mark, conflicts), mark.point, id)];
  });

/** The ring that says where the landmark asked for is expected. */
export const nextShape = (id: LandmarkId, view: View, at: FramePoint): MarkShape =>
  shapeAt(roleIn(id, view), 'next', at, id);
