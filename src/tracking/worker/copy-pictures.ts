import { type FrameIndex, type Seconds, seconds } from '#shared/timing/units.ts';
import type { Plane } from '../core/plane.ts';
import { gridOf } from '../take/grid.ts';
import { PICTURES_A_SECOND, type TakeSource } from '../take/take-source.ts';
import type { TakePicture } from '../take/types.ts';
import { DecodedPictures } from './decoded-pictures.ts';
import type { SentClip } from './messages.ts';

/** The prepared copy, upright and small enough to decode anywhere; of frames between only what they rest on. */
export class CopyPictures implements TakeSource {
  readonly length: Seconds;
  readonly #pictures: DecodedPictures;
  /** Seconds, by frame. */
  readonly #times: readonly number[];

  private constructor(pictures: DecodedPictures, times: readonly number[]) {
    this.#pictures = pictures;
    this.#times = times;
    const [last = 0, before = last] = [times.at(-1), times.at(-2)];
    this.length = seconds(2 * last - before);
  }

  /** Rejects with `VideoError`. */
  static async open(clip: SentClip): Promise<CopyPictures> {
    const times = clip.frameTable.map((ms) => ms / 1000);
    return new CopyPictures(await DecodedPictures.open(clip), times);
  }

  async *pictures(): AsyncGenerator<TakePicture> {
    let next = -Infinity;
    for (const [frame, at] of this.#times.entries()) {
      if (at < next) continue;
      next = Math.max(next + 1 / PICTURES_A_SECOND, at + 0.5 / PICTURES_A_SECOND);
      const plane = await this.#pictures.picture(frame as FrameIndex, null);
      yield { at: seconds(at), grid: gridOf(plane) };
    }
  }

  whole(at: Seconds): Promise<Plane> {
    return this.#pictures.picture(this.#times.indexOf(at) as FrameIndex, null);
  }

  close(): void {
    this.#pictures.close();
  }
}
