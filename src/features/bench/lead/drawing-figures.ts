import type { LandmarkId } from '#shared/landmarks/types.ts';

/**
 * Own small drawings of where a landmark is found: 92 × 112, seen as the camera sees it, standing on
 * the right leg, which is then at the left of the picture. Bones are dashed: they are felt, not seen.
 */
export interface Figure {
  readonly lines: string;
  readonly dashed?: string;
  /** Sticks and straps, drawn heavier. */
  readonly gear?: string;
  readonly words?: { readonly text: string; readonly x: number; readonly y: number };
}

const HIPS = 'M14 4C13 18 10 30 6 44 2 62 3 84 6 108M78 4c1 14 4 26 8 40 4 18 3 40 0 64M46 92v16';
const HIP_BONES =
  'M40 40C34 28 22 22 15 30c-3 6 0 12 5 17 4 6 4 12 10 18 5 5 10 8 15 9M52 40c6-12 18-18 25-10 3 6 0 12-5 17-4 6-4 12-10 18-5 5-10 8-15 9';
const KNEE =
  'M18 4c3 16 9 30 10 42 0 5-3 9-2 15 1 6 4 8 4 16 0 12 1 22 3 31M74 4c-3 16-9 30-10 42 0 5 3 9 2 15-1 6-4 8-4 16 0 12-1 22-3 31';
const KNEE_CAP = 'M46 43c8 0 12 6 12 14s-5 14-12 14-12-6-12-14 4-14 12-14Z';
const THIGH =
  'M14 4c3 22 8 40 11 56 1 7-2 11-1 18 1 8 3 18 4 30M78 4c-3 22-8 40-11 56-1 7 2 11 1 18-1 8-3 18-4 30';
const STRAP = 'M19 32c16 6 38 6 54 0M22 45c15 6 33 6 48 0M19 32l3 13M73 32l-3 13';
const SHIN =
  'M32 4c-1 22 5 42 6 56-2 3-3 7-1 11M60 4c1 22-4 42-5 56 2 3 3 7 1 11M37 71c-3 10-9 17-8 25 1 7 33 7 35 0 1-8-5-15-8-25';
const LIFTED =
  'M12 4c-2 14-6 26-6 42 0 22 3 42 5 62M78 4c2 8 4 14 4 22M34 108c0-20 2-36 4-50M38 58c-2-14 6-26 20-26s24 10 23 25c0 10-5 16-8 22-2 10-3 20-4 29M49 108c0-12-1-20-3-30-4-6-8-12-8-20';
const LIFTED_CAP = 'M58 40c7 0 10 4 10 9s-4 9-10 9-10-4-10-9 3-9 10-9Z';
const SHOULDERS =
  'M46 6c8 0 12 6 12 13s-4 14-12 14-12-7-12-14S38 6 46 6ZM39 32c0 8-10 9-20 12C11 47 8 54 7 64c-1 14-3 28-3 44M53 32c0 8 10 9 20 12 8 3 11 10 12 20 1 14 3 28 3 44M22 62c2 16 2 30 1 46M70 62c-2 16-2 30-1 46';
const FOOT_ABOVE =
  'M36 4c-2 12 0 22 1 30-7 16-13 36-12 52 1 12 38 14 42 2 3-16-6-36-12-54 1-8 3-18 1-30M32 94v6M39 96v7M47 97v7M55 96v6M62 93v5';
const FOOT_SIDE =
  'M22 4c1 20 2 34-2 48-5 8-8 16-6 28 1 7 6 10 14 10h48c8 0 9-9 1-13-13-6-24-12-28-24-3-10-1-32 1-49';
const SIDE_BODY =
  'M32 4c-6 14-10 26-8 36 1 12 8 16 8 30 0 14-3 26-2 38M66 4c4 16 4 28 3 42 0 20-7 42-9 62';
const SIDE_BONE =
  'M30 34c4-12 24-14 32-4 3 8 0 14-8 16-2 8 0 12-6 14-10 0-14-6-14-12-4-4-6-8-4-14Z';
const SIDE_KNEE =
  'M4 26c20 2 38 8 52 16 12 6 18 12 16 24-2 14-6 26-8 42M4 62c14 0 24 2 32 8 6 6 4 14 4 38';
const SIDE_SHOULDER =
  'M40 6c10-2 18 4 18 14 0 8-4 12-6 16M36 22c-2 8-4 10-12 18-8 12-10 40-8 68M52 36c14 6 20 20 20 40 0 12-2 22-3 32M44 44c-10 4-12 20-11 36 0 10 2 20 2 28M44 44c10 4 12 20 10 36-1 10-2 20-3 28';

const BELT: Figure = {
  lines: HIPS,
  gear: 'M7 40c22 8 56 8 78 0M5 50c24 8 58 8 82 0M46 50l4 16',
  dashed: 'M28 100c0-8 8-12 18-12s18 4 18 12',
  words: { text: 'from above', x: 46, y: 84 },
};
const KNEES: Figure = { lines: KNEE, dashed: KNEE_CAP };
const STRAPPED: Figure = {
  lines: THIGH,
  gear: `${STRAP}M46 40 58 66`,
  dashed: 'M46 74c7 0 10 5 10 12s-4 12-10 12-10-5-10-12 3-12 10-12Z',
};
const PELVIS: Figure = { lines: HIPS, dashed: HIP_BONES };

export const DRAWINGS: Readonly<
  Record<LandmarkId, { readonly figure: Figure; readonly at: readonly [number, number] }>
> = {
  'asis-support': { figure: PELVIS, at: [20, 47] },
  'asis-lifted': { figure: PELVIS, at: [72, 47] },
  'belt-tip': { figure: BELT, at: [50, 67] },
  'outline-support': { figure: PELVIS, at: [5.5, 47] },
  'outline-lifted': { figure: PELVIS, at: [86.5, 47] },
  'lifted-knee': { figure: { lines: LIFTED, dashed: LIFTED_CAP }, at: [59, 62] },
  kneecap: { figure: KNEES, at: [46, 57] },
  'knee-inner': { figure: KNEES, at: [66, 57] },
  'knee-outer': { figure: KNEES, at: [26, 57] },
  'thigh-tip': { figure: STRAPPED, at: [58, 66] },
  'strap-inner': { figure: STRAPPED, at: [71.5, 38] },
  'strap-outer': { figure: STRAPPED, at: [20.5, 38] },
  'ankle-support': { figure: { lines: SHIN }, at: [46.5, 66] },
  'ankle-lifted': { figure: { lines: SHIN }, at: [46.5, 66] },
  'acromion-support': { figure: { lines: SHOULDERS }, at: [13, 48] },
  'acromion-lifted': { figure: { lines: SHOULDERS }, at: [79, 48] },
  'toe-support': { figure: { lines: FOOT_ABOVE }, at: [39, 103] },
  'heel-support': { figure: { lines: FOOT_SIDE }, at: [20, 88] },
  trochanter: { figure: { lines: SIDE_BODY, dashed: SIDE_BONE }, at: [46, 62] },
  'knee-lateral': { figure: { lines: SIDE_KNEE }, at: [54, 58] },
  acromion: { figure: { lines: SIDE_SHOULDER }, at: [44, 45] },
  asis: { figure: { lines: SIDE_BODY, dashed: SIDE_BONE }, at: [63, 32] },
  psis: { figure: { lines: SIDE_BODY, dashed: SIDE_BONE }, at: [29, 37] },
};

/** Standing on the left leg everything seen from the front changes sides. */
const SEEN_FROM_SIDE: ReadonlySet<LandmarkId> = new Set([
  'heel-support',
  'trochanter',
  'knee-lateral',
  'acromion',
  'asis',
  'psis',
]);
export const isMirrored = (id: LandmarkId, standingOn: 'left' | 'right'): boolean =>
  standingOn === 'left' && !SEEN_FROM_SIDE.has(id);
