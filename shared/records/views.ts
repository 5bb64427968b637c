import type { CameraStood, Side, View } from '#shared/contracts/primitives.ts';

/** Where the camera stood in the room, from how a clip was named; a side view needs the leg stood on. */
export const cameraStoodOf = (view: View, supportSide: Side | null): CameraStood | null => {
  if (view === 'front' || view === 'back') return view;
  if (supportSide === null) return null;
  const seen = (view === 'support-side') === (supportSide === 'left') ? 'left' : 'right';
  return `athlete-${seen}`;
};

/** A rep's view: the same camera sees the lifted side of one rep and the support side of the next. */
export const viewOf = (stood: CameraStood, supportSide: Side): View => {
  if (stood === 'front' || stood === 'back') return stood;
  return stood === `athlete-${supportSide}` ? 'support-side' : 'lifted-side';
};
