import { type FramePoint, midpoint } from '#shared/geometry/points.ts';
import type { LandmarkId, Marks, View } from '#shared/landmarks/types.ts';
import { stateOf } from './mark-shapes.ts';
import type { Line, OverlayRole, OverlayState } from './types.ts';

/** Hip centres of this frame, worked out from the ASIS and the quiet stance; null where unknown. */
export interface HipCentres {
  readonly support: FramePoint | null;
  readonly lifted: FramePoint | null;
}

interface End {
  readonly at: FramePoint;
  readonly state: OverlayState;
}

/** A line is only as certain as its weaker end. */
const weaker = (a: OverlayState, b: OverlayState): OverlayState =>
  a === 'conflict' || b === 'conflict'
    ? 'conflict'
    : a === 'tracked' || b === 'tracked'
      ? 'tracked'
      : 'placed';

const between = (a: End | null, b: End | null): End | null =>
  a && b ? { at: midpoint(a.at, b.at), state: weaker(a.state, b.state) } : null;

const line = (role: OverlayRole, a: End | null, b: End | null): Line[] =>
  a && b ? [{ kind: 'line', from: a.at, to: b.at, role, state: weaker(a.state, b.state) }] : [];

/**
 * The lines that join the marks of one frame: pelvis, both legs, pointers, trunk, foot. A line
 * whose end is not marked, or hidden, is not drawn.
 */
export const segments = (
  marks: Marks,
  view: View,
  hips: HipCentres,
  conflicts: ReadonlySet<LandmarkId> = new Set(),
): Line[] => {
  const end = (id: LandmarkId): End | null => {
    const mark = marks[id];
    return mark && !mark.hidden ? { at: mark.point, state: stateOf(id, mark, conflicts) } : null;
  };
  // a hip centre rests on both ASIS
  const asis = between(end('asis-support'), end('asis-lifted'));
  const hip = (at: FramePoint | null): End | null =>
    at && asis ? { at, state: asis.state } : null;

  if (view === 'lifted-side' || view === 'support-side') {
    const role = view === 'lifted-side' ? 'lifted' : 'support';
    return [
      ...line('midline', end('acromion'), end('trochanter')),
      ...line(role, end('trochanter'), end('knee-lateral')),
      ...line('midline', end('psis'), end('asis')),
    ];
  }

  const knee =
    end('kneecap') ??
    between(end('knee-inner'), end('knee-outer')) ??
    between(end('strap-inner'), end('strap-outer'));
  return [
    ...line('midline', end('outline-support'), end('outline-lifted')),
    ...line('midline', end('asis-support'), end('asis-lifted')),
    ...line('midline', asis, end('belt-tip')),
    ...line('midline', end('acromion-support'), end('acromion-lifted')),
    ...line('midline', asis, between(end('acromion-support'), end('acromion-lifted'))),
    ...line('support', hip(hips.support), knee),
    ...line('support', knee, end('ankle-support')),
    ...line('support', end('knee-inner'), end('knee-outer')),
    ...line('support', end('strap-inner'), end('strap-outer')),
    ...line('support', between(end('strap-inner'), end('strap-outer')), end('thigh-tip')),
    ...line('support', end('heel-support'), end('toe-support')),
    ...line('lifted', hip(hips.lifted), end('lifted-knee')),
    ...line('lifted', end('lifted-knee'), end('ankle-lifted')),
  ];
};
