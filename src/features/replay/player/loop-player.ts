import { frameAt } from '#shared/timing/timestamps.ts';
import {
  type FrameIndex,
  frameIndex,
  type Milliseconds,
  milliseconds,
} from '#shared/timing/units.ts';
import { presentedFrame } from '#src/video/exact-seek.ts';
import { endOfFrame, middleOfFrame } from '#src/video/frame-times.ts';

export interface LoopHooks {
  /** Each frame as the browser presents it. */
  readonly onFrame: (frame: FrameIndex) => void;
  readonly onPlaying: (playing: boolean) => void;
}

/**
 * Plays a span of the browser's own video again and again. Frames are told from what the browser says it
 * presented, where it does; elsewhere from its clock. `from` and `to` are inclusive.
 */
export class LoopPlayer {
  readonly #video: HTMLVideoElement;
  readonly #times: readonly Milliseconds[];
  readonly #from: FrameIndex;
  readonly #to: FrameIndex;
  readonly #hooks: LoopHooks;
  readonly #told = 'requestVideoFrameCallback' in HTMLVideoElement.prototype;
  #handle = 0;
  #rate = 0.25;

  constructor(
    video: HTMLVideoElement,
    times: readonly Milliseconds[],
    span: { readonly from: number; readonly to: number },
    hooks: LoopHooks,
  ) {
    this.#video = video;
    this.#times = times;
    const last = times.length - 1;
    this.#from = frameIndex(Math.min(span.from, last));
    this.#to = frameIndex(Math.min(span.to, last));
    this.#hooks = hooks;
    video.addEventListener('seeked', this.#onSeeked);
    video.addEventListener('ended', this.#again);
    this.#listen();
  }

  /** Rejects where the browser does not let it play. */
  async play(): Promise<void> {
    const at = frameAt(this.#times, milliseconds(this.#video.currentTime * 1000));
    if (at === null || at < this.#from || at >= this.#to) this.#seek(this.#from);
    this.#video.playbackRate = this.#rate;
    await this.#video.play();
    this.#hooks.onPlaying(true);
  }

  pause(): void {
    this.#video.pause();
    this.#hooks.onPlaying(false);
  }

  /** 1 is life's own speed. */
  setRate(rate: number): void {
    this.#rate = rate;
    this.#video.playbackRate = rate;
  }

  /** Stops on a frame. */
  show(frame: number): void {
    this.pause();
    this.#seek(frameIndex(Math.min(this.#to, Math.max(this.#from, frame))));
  }

  close(): void {
    this.#video.removeEventListener('seeked', this.#onSeeked);
    this.#video.removeEventListener('ended', this.#again);
    if (this.#told) this.#video.cancelVideoFrameCallback(this.#handle);
    else cancelAnimationFrame(this.#handle);
    this.#video.pause();
  }

  #seek(frame: FrameIndex): void {
    this.#video.currentTime = middleOfFrame(this.#times, frame) / 1000;
  }

  #listen(): void {
    this.#handle = this.#told
      ? this.#video.requestVideoFrameCallback((_, { mediaTime }) => {
          this.#tell(presentedFrame(this.#times, mediaTime));
          this.#listen();
        })
      : requestAnimationFrame(() => {
          if (!this.#video.seeking) this.#tellByClock();
          this.#listen();
        });
  }

  readonly #onSeeked = (): void => this.#tellByClock();

  readonly #again = (): void => {
    this.#seek(this.#from);
    // an ended video stands still until it is told to play
    this.#video.play().catch(() => this.#hooks.onPlaying(false));
  };

  #tellByClock(): void {
    this.#tell(frameAt(this.#times, milliseconds(this.#video.currentTime * 1000)));
  }

  #tell(frame: FrameIndex | null): void {
    if (frame === null) return;
    const running = !this.#video.paused && !this.#video.seeking;
    const over = this.#video.currentTime * 1000 >= endOfFrame(this.#times, this.#to);
    if (running && (frame > this.#to || over)) this.#seek(this.#from);
    if (frame >= this.#from && frame <= this.#to) this.#hooks.onFrame(frame);
  }
}
