import type { FrameIndex } from '#shared/timing/units.ts';
import type { Plane } from '../core/plane.ts';

/** Grey pictures by frame. Ask for one at a time. */
export interface PictureSource {
  /** `next` will be wanted after this one: it may be made ready meanwhile. */
  picture(frame: FrameIndex, next: FrameIndex | null): Promise<Plane>;
  close(): void;
}
