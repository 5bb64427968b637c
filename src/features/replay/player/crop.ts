import type { OverlayMarks } from '#shared/contracts/replay-parts.ts';

/** A part of the source frame, pixels. */
export interface Crop {
  readonly u: number;
  readonly v: number;
  readonly width: number;
  readonly height: number;
}

/** Room around the marks, as a share of their longer side. */
const ROOM = 0.14;
/** Not taller than this against its width, so that on a phone the buttons stay on the screen. */
const TALLEST = 1.2;

const within = (low: number, length: number, whole: number): [number, number] => {
  const size = Math.min(length, whole);
  return [Math.min(Math.max(0, low), whole - size), size];
};

/**
 * The part of the picture that holds every mark of the span from the pelvis down, larger and mostly without
 * the face; the whole frame where nothing is marked.
 */
export const cropFor = (overlay: OverlayMarks, width: number, height: number): Crop => {
  const points = overlay.flatMap(({ marks }) =>
    marks.filter(({ landmark }) => !landmark.startsWith('acromion')),
  );
  if (points.length === 0) return { u: 0, v: 0, width, height };
  const us = points.map(({ u }) => u);
  const vs = points.map(({ v }) => v);
  const [left, right] = [Math.min(...us), Math.max(...us)];
  const [top, bottom] = [Math.min(...vs), Math.max(...vs)];
  const room = ROOM * Math.max(right - left, bottom - top);
  const high = Math.min(height, bottom - top + 2 * room);
  const wide = Math.max(right - left + 2 * room, high / TALLEST);
  const [v, cropHeight] = within(top - room, high, height);
  const [u, cropWidth] = within((left + right) / 2 - wide / 2, wide, width);
  return { u, v, width: cropWidth, height: cropHeight };
};
