import type { LandmarkSetId, Side } from '#shared/landmarks/types.ts';
import { CONSTANTS } from './constants.ts';
import type { AthleteInput, CameraInput } from './inputs.ts';
import type { Missing } from './missing.ts';

/** Camera and body scale of one clip, ready for the formulas. Lengths in px of the source. */
export interface Rig {
  readonly camera: CameraInput;
  readonly side: Side;
  /** +1 standing on the left leg, −1 on the right: R = σ(ψ femur − ψ pelvis). */
  readonly sigma: 1 | -1;
  readonly mmPerPx: number;
  /** Distance over scale, px. */
  readonly focal: number;
  /** u of the image centre. */
  readonly centre: number;
  readonly outlineDepthPx: number;
  readonly beltPointerPx: number | null;
  readonly thighPointerPx: number | null;
  readonly footPx: number | null;
  /** Lens above the floor, mm; null makes lift less certain. */
  readonly lensHeightMm: number | null;
}

const SMALLEST = 1e-3;
const LARGEST = 1e6;
const HIGHEST_LENS_MM = 1e5;

/** A length or scale that can be meant, mm or mm/px; anything else counts as not given. */
const known = (value: number | null): value is number =>
  value !== null && value >= SMALLEST && value <= LARGEST;

/** Null inputs that nothing can be computed without. */
export const rigOf = (camera: CameraInput, athlete: AthleteInput, side: Side): Rig | Missing => {
  if (!known(camera.mmPerPx)) return { code: 'scale-missing' };
  if (!known(camera.distanceMm)) return { code: 'distance-missing' };
  const k = camera.mmPerPx;
  const px = (mm: number | null): number | null => (known(mm) ? mm / k : null);
  return {
    camera,
    side,
    sigma: side === 'left' ? 1 : -1,
    mmPerPx: k,
    lensHeightMm:
      camera.lensHeightMm !== null && Math.abs(camera.lensHeightMm) <= HIGHEST_LENS_MM
        ? camera.lensHeightMm
        : null,
    focal: camera.distanceMm / k,
    centre: camera.width / 2,
    outlineDepthPx: CONSTANTS.outlineDepth.value / k,
    beltPointerPx: px(camera.beltPointerMm),
    thighPointerPx: px(camera.thighPointerMm),
    footPx: known(athlete.bodyHeightMm)
      ? (CONSTANTS.footLength.value * athlete.bodyHeightMm) / k
      : null,
  };
};

export const isRig = (rig: Rig | Missing): rig is Rig => 'focal' in rig;

/** Pointer lengths a set needs and the rig lacks. */
export const missingLengths = (rig: Rig, set: LandmarkSetId): readonly Missing[] => {
  const missing: Missing[] = [];
  if (set !== 'bare' && rig.beltPointerPx === null)
    missing.push({ code: 'belt-pointer-length-missing' });
  if (set === 'belt+thigh' && rig.thighPointerPx === null)
    missing.push({ code: 'thigh-pointer-length-missing' });
  return missing;
};
