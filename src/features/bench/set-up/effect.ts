import type { ClipGeometry, Scale } from '#shared/contracts/clips.ts';
import { plumbTilt } from '#shared/geometry/points.ts';
import { mmPerPxOf } from '#shared/records/scale.ts';
import { decimal, degrees, metres } from '#src/ui/figures.ts';

/** What is known of the set-up and what it makes measurable, in words. */
export interface Effect {
  readonly text: string;
  readonly kind: 'done' | 'wait' | 'bad';
}

/** Coarser than this, a mark's error costs several degrees of turn. */
const COARSE_MM_PER_PX = 2.5;
const NEAR_MM = 2000;
const PLUMB_LIMIT = 3;

export const scaleEffect = (scale: Scale | null): Effect => {
  const mm = mmPerPxOf(scale);
  if (mm === null)
    return scale === null
      ? { text: 'Without a scale nothing but the marks themselves is known.', kind: 'bad' }
      : { text: 'The two points lie too near to each other.', kind: 'bad' };
  const known = `${decimal(mm, 2)} mm per pixel`;
  return mm > COARSE_MM_PER_PX
    ? {
        text: `${known}: coarse. Film from 2.5 to 3.5 m, or with more pixels.`,
        kind: 'wait',
      }
    : { text: known, kind: 'done' };
};

export const distanceEffect = (distanceMm: number | null): Effect => {
  if (distanceMm === null)
    return { text: 'Without the distance there is no lift and no turn.', kind: 'bad' };
  return distanceMm < NEAR_MM
    ? { text: `${metres(distanceMm)}: near. The perspective bends the angles.`, kind: 'wait' }
    : { text: metres(distanceMm), kind: 'done' };
};

export const lensEffect = (lensHeightMm: number | null): Effect =>
  lensHeightMm === null
    ? { text: 'Lift is known to ± 7° only; with the lens height to ± 2°.', kind: 'wait' }
    : { text: 'Lift is known to ± 2°.', kind: 'done' };

export const pointersEffect = ({
  beltPointerMm: belt,
  thighPointerMm: thigh,
}: Pick<ClipGeometry, 'beltPointerMm' | 'thighPointerMm'>): Effect => {
  if (belt === null)
    return {
      text: 'Bare landmarks: only a change of turn of 16° or more can be told from none.',
      kind: 'wait',
    };
  return thigh === null
    ? { text: 'Belt pointer: a change of turn of 13.5° can be told from none.', kind: 'wait' }
    : { text: 'Both pointers: a change of turn of 5.5° can be told from none.', kind: 'done' };
};

export const plumbEffect = (plumb: ClipGeometry['plumb']): Effect => {
  if (!plumb) return { text: 'The picture is taken as upright.', kind: 'done' };
  const tilt = plumbTilt(plumb.top, plumb.bottom);
  if (tilt === null) return { text: 'The two points lie on each other.', kind: 'bad' };
  const text = `The picture leans by ${degrees(Math.abs(tilt))}; every mark is turned back by that.`;
  return { text, kind: Math.abs(tilt) > PLUMB_LIMIT ? 'wait' : 'done' };
};
