import type { Seconds } from '#shared/timing/units.ts';
import type { Plane } from '../core/plane.ts';
import type { TakePicture } from './types.ts';

/** Pictures of a take, wherever they come from. */
export interface TakeSource {
  /** Of the whole clip. */
  readonly length: Seconds;
  /** Some ten a second, from the first one on. */
  pictures(): AsyncIterable<TakePicture>;
  /** One of those that were given, at its full size. */
  whole(at: Seconds): Promise<Plane>;
  close(): void;
}

export const PICTURES_A_SECOND = 10;
