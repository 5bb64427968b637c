import { scaleLinear, type ScaleLinear } from 'd3-scale';
import { frameAt } from '#shared/timing/timestamps.ts';
import {
  frameIndex,
  type FrameIndex,
  type Milliseconds,
  milliseconds,
} from '#shared/timing/units.ts';

/** Where things lie on the strip, CSS px. Time runs to the right by the clip's exact times. */
export interface StripLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  /** Top of the hill and its base line. */
  readonly top: number;
  readonly base: number;
  readonly compact: boolean;
  /** The row of pins above, and under it that of the frame's tag. */
  readonly tagTop: number;
  readonly from: FrameIndex;
  readonly to: FrameIndex;
  readonly x: (frame: number) => number;
  /** Degrees of lift to px, highest shown 110°. */
  readonly y: ScaleLinear<number, number>;
  /** The frame under a place. */
  readonly frameAtX: (x: number) => FrameIndex;
  /** Whole seconds, or tenths of a short span, with their places. */
  readonly ticks: readonly { readonly x: number; readonly text: string }[];
}

const HIGHEST_LIFT = 110;
const PIN_ROW = 28;

export const stripLayout = (
  size: { readonly width: number; readonly height: number },
  span: readonly [FrameIndex, FrameIndex],
  times: readonly Milliseconds[],
  pins = false,
): StripLayout => {
  const { width, height } = size;
  const compact = width < 560;
  const left = compact ? 34 : 46;
  const right = width - (compact ? 6 : 14);
  const tagTop = pins ? PIN_ROW : 2;
  const top = tagTop + (compact ? 8 : 32);
  const base = height - 34;
  const [from, to] = span;
  const start = times[from] ?? 0;
  const end = times[to] ?? start;
  const time = scaleLinear([start, Math.max(end, start + 1)], [left, right]);
  const frameAtX = (x: number): FrameIndex => {
    const wanted = Math.max(start, Math.min(end, time.invert(x)));
    const shown = frameAt(times, milliseconds(wanted)) ?? from;
    const next = frameIndex(Math.min(to, shown + 1));
    const nearer = Math.abs((times[next] ?? 0) - wanted) < Math.abs((times[shown] ?? 0) - wanted);
    return nearer ? next : shown;
  };
  const seconds = scaleLinear([start / 1000, end / 1000], [left, right]);
  const ticks = seconds.ticks(Math.max(2, Math.floor((right - left) / 110))).map((at) => ({
    x: seconds(at),
    text: `${Number(at.toFixed(2))} s`,
  }));
  return {
    width,
    height,
    left,
    right,
    top,
    base,
    compact,
    tagTop,
    from,
    to,
    x: (frame) => time(times[frame] ?? start),
    y: scaleLinear([0, HIGHEST_LIFT], [base, top]),
    frameAtX,
    ticks,
  };
};

/** Room that a word on the strip takes. */
export interface LabelRoom {
  readonly from: number;
  readonly to: number;
}

/** Those that keep `gap` px from all that came before them; the weightiest come first. */
export const spacedLabels = <T extends LabelRoom>(labels: readonly T[], gap = 8): T[] =>
  labels.reduce<T[]>(
    (shown, label) =>
      shown.some(({ from, to }) => label.from < to + gap && from < label.to + gap)
        ? shown
        : [...shown, label],
    [],
  );

/** The same widths, pushed apart within `width` so that each can be pressed; in order of place. */
export const spreadTargets = (wanted: readonly LabelRoom[], width: number): LabelRoom[] => {
  let free = 0;
  const fromLeft = wanted.map(({ from, to }) => {
    const left = Math.max(from, free);
    free = left + to - from;
    return { left, room: to - from };
  });
  return pushedBack(fromLeft, width, 0).map(({ left, room }) => ({ from: left, to: left + room }));
};

/** What runs over the end is pushed back, and with it those before it; in order of place. */
const pushedBack = <T extends { readonly left: number; readonly room: number }>(
  placed: readonly T[],
  end: number,
  gap: number,
): T[] => {
  let free = end;
  return placed
    .toReversed()
    .map((each) => {
      const left = Math.min(each.left, free - each.room);
      free = left - gap;
      return { ...each, left };
    })
    .reverse();
};

export interface Pin<T> {
  readonly item: T;
  /** Where the moment is, and where the pin's box begins so that it stays on the strip. */
  readonly x: number;
  readonly left: number;
  /** Room for the pin, px; too little for words shows initials alone. */
  readonly room: number;
}

const LEAST_ROOM = 84;
const MOST_ROOM = 190;
const INITIALS = 34;
const PIN_GAP = 2;

/** Pins in one row: each gets the room up to the next one. */
export const pinRow = <T>(
  items: readonly T[],
  frameOf: (item: T) => number,
  { x, right }: Pick<StripLayout, 'x' | 'right'>,
): Pin<T>[] => {
  const sorted = items.map((item) => ({ item, x: x(frameOf(item)) })).sort((a, b) => a.x - b.x);
  const pins: Pin<T>[] = [];
  for (const [n, pin] of sorted.entries()) {
    const before = pins.at(-1);
    const left = Math.max(pin.x, before ? before.left + before.room + PIN_GAP : pin.x);
    const free = (sorted[n + 1]?.x ?? right) - left - 6;
    const room = free < LEAST_ROOM ? INITIALS : Math.min(MOST_ROOM, free);
    pins.push({ ...pin, room, left });
  }
  return pushedBack(pins, right, PIN_GAP);
};
