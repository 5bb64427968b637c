import type { FrameIndex } from '#shared/timing/units.ts';
import { type Plane, planeOf } from '../core/plane.ts';
import { TrackingError, type TrackingErrorCode } from '../errors.ts';
import type { SentPicture } from './messages.ts';
import type { PictureSource } from './picture-source.ts';

interface Wait {
  readonly arrived: (plane: Plane) => void;
  readonly failed: (error: TrackingError) => void;
}

/** Pictures that the page sends when they are asked for: where the worker has no decoder. */
export class FedPictures implements PictureSource {
  readonly #ask: (frame: FrameIndex) => void;
  readonly #waits = new Map<FrameIndex, Wait>();

  constructor(ask: (frame: FrameIndex) => void) {
    this.#ask = ask;
  }

  picture(frame: FrameIndex): Promise<Plane> {
    return new Promise((arrived, failed) => {
      this.#waits.set(frame, { arrived, failed });
      this.#ask(frame);
    });
  }

  take(frame: FrameIndex, { luma, width, height }: SentPicture): void {
    this.#waits.get(frame)?.arrived(planeOf(luma, width, height));
    this.#waits.delete(frame);
  }

  doWithout(frame: FrameIndex, code: TrackingErrorCode, detail: string): void {
    this.#waits.get(frame)?.failed(new TrackingError(code, detail));
    this.#waits.delete(frame);
  }

  close(): void {
    for (const frame of this.#waits.keys()) this.doWithout(frame, 'closed', '');
  }
}
