import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { Marks, Side, View } from '#shared/landmarks/types.ts';
import { liftText, plusMinus, signedDegrees } from './figures.ts';
import type { Arc, Label, Line, OverlayRole } from './types.ts';

/** Values of one frame that may be written on the picture. Null is unknown and not written. */
export interface FrameValues {
  readonly lift: Degrees | null;
  readonly liftHalfWidth: Degrees | null;
  readonly turn: Degrees | null;
  readonly turnHalfWidth: Degrees | null;
  /** Rests on tracked marks that nobody has looked at. */
  readonly provisional: boolean;
}

/** Words and their uncertainty, `lift 74° ± 2`. */
const words = (name: string, value: string, halfWidth: Degrees | null): string =>
  halfWidth === null ? `${name} ${value}` : `${name} ${value} ${plusMinus(halfWidth, 0)}`;

const label = (
  role: OverlayRole,
  at: FramePoint,
  text: string,
  towards: Label['towards'],
  provisional: boolean,
): Label => ({ kind: 'label', at, text, towards, role, state: provisional ? 'tracked' : 'placed' });

/** Seen from the front the athlete's left is the picture's right; from behind it is not. */
const outward = (side: Side, view: View): 'left' | 'right' =>
  (side === 'left') === (view === 'front') ? 'right' : 'left';

/** Lift beside the lifted knee, turn beside the support hip, each on its outer side. */
export const valueLabels = (
  values: FrameValues,
  marks: Marks,
  view: View,
  supportSide: Side,
): Label[] => {
  const fromSide = view === 'lifted-side' || view === 'support-side';
  const knee = marks[fromSide ? 'knee-lateral' : 'lifted-knee'];
  // the edge of the pelvis lies further out: words beside the ASIS would run over it
  const outline = marks['outline-support'];
  const asis = outline && !outline.hidden ? outline : marks['asis-support'];
  const out = outward(supportSide, view);
  const labels: Label[] = [];
  if (values.lift !== null && knee && !knee.hidden) {
    // under 20° the front view is blind: '< 20°' carries no ±
    const blind = !fromSide && values.lift < 20;
    const text = words(
      'lift',
      liftText(values.lift, !fromSide, 0),
      blind ? null : values.liftHalfWidth,
    );
    const away = out === 'left' ? 'right' : 'left';
    labels.push(label('lifted', knee.point, text, away, values.provisional));
  }
  if (values.turn !== null && asis && !asis.hidden) {
    const text = words('turn', signedDegrees(values.turn), values.turnHalfWidth);
    const full = values.provisional ? `${text}, provisional` : text;
    labels.push(label('support', asis.point, full, out, values.provisional));
  }
  return labels;
};

/** Length of the plumb dropped from the hip in a side clip, as a share of the thigh. */
const PLUMB_SHARE = 0.8;
const ARC_SHARE = 0.45;

/**
 * In a side clip the lift can be seen in the picture itself: a plumb from the hip knob and the arc
 * from it to the thigh. From the front the thigh points at the camera, so nothing is drawn there.
 */
export const liftArc = (marks: Marks, view: View): (Line | Arc)[] => {
  const hip = marks.trochanter;
  const knee = marks['knee-lateral'];
  if (view !== 'lifted-side' || !hip || hip.hidden || !knee || knee.hidden) return [];
  const du = knee.point.u - hip.point.u;
  const dv = knee.point.v - hip.point.v;
  const thigh = Math.hypot(du, dv);
  if (thigh === 0) return [];
  const down = framePoint(hip.point.u, hip.point.v + PLUMB_SHARE * thigh);
  const heading = degrees((Math.atan2(du, -dv) * 180) / Math.PI);
  return [
    { kind: 'line', from: hip.point, to: down, role: 'note', state: 'tracked' },
    {
      kind: 'arc',
      centre: hip.point,
      radius: ARC_SHARE * thigh,
      from: degrees(180),
      to: degrees(heading < 0 ? heading + 360 : heading),
      role: 'lifted',
      state: 'placed',
    },
  ];
};
