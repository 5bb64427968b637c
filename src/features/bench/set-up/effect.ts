import type { ClipGeometry, Scale, Shutter } from '#shared/contracts/clips.ts';
import { distance, plumbTilt } from '#shared/geometry/points.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { FILMING_LIMITS as LIMITS } from '#shared/measures/filming-limits.ts';
import type { OffFront } from '#shared/measures/off-front.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { mmPerPxOf } from '#shared/records/scale.ts';
import { decimal, degrees, metres, plusMinus } from '#src/ui/figures.ts';
import { studiedBetween } from '#src/ui/gate-words.ts';

/** What is known of the set-up and what it makes measurable, in words. */
export interface Effect {
  readonly text: string;
  readonly kind: 'done' | 'wait' | 'bad';
}

const { bestFromMm, bestToMm } = LIMITS;
const distances = `${decimal(bestFromMm.value / 1000)} to ${decimal(bestToMm.value / 1000)} m`;

const percent = (share: number): string => `${decimal(100 * share, 0)} %`;

export const scaleEffect = (scale: Scale | null): Effect => {
  const mm = mmPerPxOf(scale);
  if (mm === null)
    return scale === null
      ? {
          text: `Without a scale there is no lift and no turn; one that is ${percent(LIMITS.scaleError.value)} off makes the turn ${percent(LIMITS.turnErrorByScale.value)} wrong.`,
          kind: 'bad',
        }
      : { text: 'The two points lie too near to each other.', kind: 'bad' };
  const known = `${decimal(mm, 2)} mm per pixel`;
  return mm > LIMITS.coarse.value
    ? {
        text: `${known}: coarse, above ${decimal(LIMITS.coarse.value)}. Film from ${distances}, or with more pixels.`,
        kind: 'wait',
      }
    : { text: known, kind: 'done' };
};

export const distanceEffect = (distanceMm: number | null): Effect => {
  if (distanceMm === null)
    return { text: 'Without the distance there is no lift and no turn.', kind: 'bad' };
  return distanceMm < LIMITS.nearMm.value
    ? {
        text: `${metres(distanceMm)}: nearer than ${metres(LIMITS.nearMm.value)} the perspective bends the angles. Film from ${distances}.`,
        kind: 'wait',
      }
    : { text: metres(distanceMm), kind: 'done' };
};

export const lensEffect = (lensHeightMm: number | null): Effect =>
  lensHeightMm === null
    ? { text: 'Lift is known to ± 7° only; with the lens height to ± 2°.', kind: 'wait' }
    : { text: 'Lift is known to ± 2°.', kind: 'done' };

/** @param gates the practice's; the figures say between which they were worked out where that is not there */
export const pointersEffect = (
  {
    beltPointerMm: belt,
    thighPointerMm: thigh,
  }: Pick<ClipGeometry, 'beltPointerMm' | 'thighPointerMm'>,
  gates: Gates,
): Effect => {
  const studied = studiedBetween(gates);
  if (belt === null)
    return {
      text: `Bare landmarks: one rep tells a change of turn from none only beyond ${ACHIEVED.bare.toldFromNone.one}°${studied}.`,
      kind: 'wait',
    };
  return thigh === null
    ? {
        text: `Belt pointer: one rep tells a change of turn from none beyond ${ACHIEVED.belt.toldFromNone.one}°, three beyond ${ACHIEVED.belt.toldFromNone.three}°${studied}.`,
        kind: 'wait',
      }
    : {
        text: `Both pointers: one rep tells a change of turn from none beyond ${ACHIEVED['belt+thigh'].toldFromNone.one}°, three beyond ${ACHIEVED['belt+thigh'].toldFromNone.three}°${studied}.`,
        kind: 'done',
      };
};

export const plumbEffect = (plumb: ClipGeometry['plumb']): Effect => {
  if (!plumb) return { text: 'The picture is taken as upright.', kind: 'done' };
  const tilt = plumbTilt(plumb.top, plumb.bottom);
  if (tilt === null) return { text: 'The two points lie on each other.', kind: 'bad' };
  const over = Math.abs(tilt) > LIMITS.plumb.value;
  const text = `The picture leans by ${degrees(Math.abs(tilt))}${over ? `, more than ${LIMITS.plumb.value}°` : ''}; every mark is turned back by that.`;
  return { text, kind: over ? 'wait' : 'done' };
};

export const floorEffect = (line: ClipGeometry['floorLine'], found: OffFront | null): Effect => {
  if (!line) return { text: 'The camera is taken to stand straight in front.', kind: 'done' };
  if (!found)
    return {
      text: 'It tells how far off the front the camera stood once the scale, the distance and the lens height are known, and the two touches lie apart across the floor.',
      kind: 'wait',
    };
  const stood = `The camera stood ${degrees(Math.abs(found.by), 0)} (${plusMinus(1.96 * found.u, 0)}°) off the front`;
  return Math.abs(found.by) > LIMITS.offFront.value
    ? {
        text: `${stood}: more than ${LIMITS.offFront.value}° bends the turn. Film again from straight ahead.`,
        kind: 'wait',
      }
    : { text: `${stood}.`, kind: 'done' };
};

export const shutterEffect = (shutter: Shutter | null, framesPerSecond: number | null): Effect => {
  if (!shutter) return { text: 'Not known: nothing is said about smeared marks.', kind: 'done' };
  if (shutter.from === 'typed') {
    const open = `The shutter is open for 1/${decimal(shutter.perSecond, 0)} s`;
    return framesPerSecond !== null && shutter.perSecond < framesPerSecond - 0.1
      ? {
          text: `${open}: with ${decimal(framesPerSecond, 0)} frames a second it cannot be open longer than 1/${decimal(framesPerSecond, 0)} s. Look again.`,
          kind: 'bad',
        }
      : { text: `${open}; the reading says which mark that smears.`, kind: 'done' };
  }
  const px = distance(shutter.a, shutter.b);
  const drawn = `A dot is drawn out by ${decimal(px)} pixels`;
  return px > LIMITS.smearPx.value
    ? {
        text: `${drawn}; more than ${LIMITS.smearPx.value} hides where its middle is. More light, or a shorter shutter, makes it sharper.`,
        kind: 'wait',
      }
    : { text: `${drawn}: sharp enough.`, kind: 'done' };
};
