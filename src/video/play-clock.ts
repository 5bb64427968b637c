import { frameAt } from '#shared/timing/timestamps.ts';
import { type FrameIndex, type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import { endOfFrame } from './frame-times.ts';

/** A stretch of the clip, first and last frame inclusive. */
export interface Span {
  readonly from: FrameIndex;
  readonly to: FrameIndex;
}

export interface PlayPlan {
  readonly span: Span;
  readonly from: FrameIndex;
  /** 1 is life's own speed, 0.25 a quarter of it. */
  readonly rate: number;
  /** Begin again at the end of the span instead of staying on its last frame. */
  readonly loop: boolean;
}

/**
 * Which frame is due. Time runs by the frame table, so a variable frame rate keeps its own rhythm.
 * `now` is milliseconds of any steady clock.
 */
export class PlayClock {
  readonly #table: readonly Milliseconds[];
  readonly #plan: PlayPlan;
  #startedAt: number;
  #startedFrom: Milliseconds;
  #heldSince: number | null = null;

  constructor(table: readonly Milliseconds[], plan: PlayPlan, now: number) {
    const { span, from, rate } = plan;
    if (!(rate > 0)) throw new RangeError('A play rate is above 0.');
    if (!(span.from <= from && from <= span.to && span.to < table.length))
      throw new RangeError('Play begins within its span and the span lies within the clip.');
    this.#table = table;
    this.#plan = plan;
    this.#startedAt = now;
    this.#startedFrom = table[from] ?? milliseconds(0);
  }

  /** Stops time while a picture is late, so that play waits instead of leaping. */
  hold(now: number): void {
    this.#heldSince ??= now;
  }

  resume(now: number): void {
    if (this.#heldSince === null) return;
    this.#startedAt += now - this.#heldSince;
    this.#heldSince = null;
  }

  due(now: number): { readonly index: FrameIndex; readonly ended: boolean } {
    const { span, rate, loop } = this.#plan;
    const { from, to } = span;
    const begin = this.#table[from] ?? 0;
    const end = endOfFrame(this.#table, to);
    // a heartbeat may carry the time of a moment before play began
    const elapsed = Math.max(0, (this.#heldSince ?? now) - this.#startedAt) * rate;
    let time = this.#startedFrom + elapsed;
    if (time >= end) {
      if (!loop || end <= begin) return { index: to, ended: !loop };
      time = begin + ((time - begin) % (end - begin));
    }
    const index = frameAt(this.#table, milliseconds(time)) ?? from;
    return { index: Math.min(to, Math.max(from, index)) as FrameIndex, ended: false };
  }
}
