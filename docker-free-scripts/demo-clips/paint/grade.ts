import { seededRandom } from '../model/random.ts';
import { PICTURE } from '../model/camera.ts';

const STEPS = 4096;
/** Light above this turns gently towards white. */
const WHITE_POINT = 1.9;

/** Linear light to a display value 0 to 255, with a soft shoulder. */
const CURVE = Float32Array.from({ length: STEPS }, (_, i) => {
  const light = (i / (STEPS - 1)) * WHITE_POINT * 1.06;
  const soft = (light * (1 + light / (WHITE_POINT * WHITE_POINT))) / (1 + light * 0.55);
  const held = Math.min(1, soft);
  return 255 * (held <= 0.0031308 ? 12.92 * held : 1.055 * held ** (1 / 2.4) - 0.055);
});

export const developed = (light: number): number =>
  CURVE[Math.min(STEPS - 1, Math.max(0, (light * (STEPS - 1)) / WHITE_POINT)) | 0] ?? 0;

/** Corners of the picture get a little less light. */
export const lensShade = (u: number, v: number): number => {
  const x = (u - PICTURE.width / 2) / PICTURE.height;
  const y = (v - PICTURE.height / 2) / PICTURE.height;
  return 1 - 0.62 * (x * x + y * y);
};

const GRAINS = 1 << 18;
/** Noise of the sensor, display values, standard deviation about 1. */
export const makeGrain = (seed: number): Float32Array => {
  const random = seededRandom(seed);
  return Float32Array.from({ length: GRAINS }, () => (random() + random() + random() - 1.5) * 2);
};

export const grainStart = (seed: number, frame: number): number =>
  Math.floor(seededRandom(seed * 7919 + frame)() * GRAINS);

export const GRAIN_MASK = GRAINS - 1;
