import type { Constant } from './constants.ts';

const MODEL = 'from our model, no source';
const PRACTICE = 'common practice, no source';

const limit = (value: number, unit: string, meaning: string, source: string): Constant => ({
  value,
  unit,
  meaning,
  source,
});

/** Limits of filming: what is beyond them is warned of, before a clip is sent and beside a reading. */
export const FILMING_LIMITS = {
  offFront: limit(20, 'degrees', 'camera off the front that bends the turn', MODEL),
  plumb: limit(3, 'degrees', 'lean of the picture that a person should know of', MODEL),
  nearMm: limit(2000, 'mm', 'distance under which the perspective is too steep', MODEL),
  bestFromMm: limit(2500, 'mm', 'nearest of the distances to film from', MODEL),
  bestToMm: limit(3500, 'mm', 'farthest of the distances to film from at 1080p', MODEL),
  bestTo4kMm: limit(4000, 'mm', 'farthest of the distances to film from at 4K', MODEL),
  coarse: limit(2.5, 'mm', 'of the body in one pixel above which marks are too coarse', MODEL),
  framesPerSecond: limit(
    30,
    'a second',
    'frames under which the way from gate to gate has too few',
    MODEL,
  ),
  goodFramesPerSecond: limit(60, 'a second', 'frames to film at', MODEL),
  quietFrames: limit(5, 'frames', 'of the quiet stance that make zero firm', MODEL),
  stillSeconds: limit(3, 's', 'of standing still before the lift', PRACTICE),
  leastStillSeconds: limit(
    1,
    's',
    'of standing still under which zero is a moment of sway',
    PRACTICE,
  ),
  riseSeconds: limit(2, 's', 'that a slow lift takes', PRACTICE),
  leastRiseSeconds: limit(1, 's', 'of a rise under which the leg is swung, not lifted', PRACTICE),
  quickestPassSeconds: limit(0.15, 's', 'in which a quick lift passes from 60° to 90°', MODEL),
  smearPx: limit(3, 'px', 'that a dot is drawn out in one exposure before it misleads', MODEL),
  scaleError: limit(0.15, '', 'error of the scale that is taken as an example', MODEL),
  turnErrorByScale: limit(0.2, '', 'error of the turn which that error of the scale makes', MODEL),
  lensAngle: limit(
    69,
    'degrees',
    'field of a phone’s main lens along the long edge, assumed before a scale is known',
    MODEL,
  ),
} as const satisfies Record<string, Constant>;

/** 29.97 frames per second is what phones call 30. */
export const isSlow = (framesPerSecond: number): boolean =>
  framesPerSecond < FILMING_LIMITS.framesPerSecond.value - 0.1;

/** Millimetres that the picture shows along its long edge at a distance, through the assumed lens. */
export const shownAlongLongEdge = (distanceMm: number): number =>
  2 * distanceMm * Math.tan((FILMING_LIMITS.lensAngle.value * Math.PI) / 360);
