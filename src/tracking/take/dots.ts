import { standsOut } from '../core/dot-candidate.ts';
import { dotAt, type FoundDot } from '../core/dot.ts';
import type { Place } from '../core/flow.ts';
import type { Plane } from '../core/plane.ts';
import type { Movement } from './movement.ts';
import { type Answer, cannotTell } from './types.ts';

/** Fewer pixels along the long edge draw a sticker too small to be told from a lace or a button. */
const LEAST_EDGE = 1500;
/** A face has eyes, which are round: the upper part of the body is left out. */
const FACE = 0.14;

/** Where to look: in each row of the picture from one column to another, or nowhere. */
export type RowSpan = (row: number) => { readonly from: number; readonly to: number } | null;

/** Radii that are tried, as parts of the picture's long edge: 8 to 20 mm at three metres. */
const RADII = [0.0028, 0.0042, 0.0063];
/** What the fit finds farther away than this, in radii, is another thing. */
const SAME = 1.2;

interface Peak extends Place {
  readonly worth: number;
}

/** The places that stand out most within a dot's size. */
const peaksOf = (plane: Plane, span: RowSpan, radius: number): Peak[] => {
  const step = Math.max(1, radius / 2);
  const peaks: Peak[] = [];
  for (let y = radius; y < plane.height - radius; y += step) {
    const across = span(y);
    if (!across) continue;
    for (let x = across.from; x <= across.to; x += step) {
      const worth = Math.abs(standsOut(plane, x, y, radius));
      if (worth > 0) peaks.push({ x, y, worth });
    }
  }
  peaks.sort((a, b) => b.worth - a.worth);
  return peaks.filter(
    (peak, n) =>
      !peaks
        .slice(0, n)
        .some((other) => Math.hypot(other.x - peak.x, other.y - peak.y) < 2 * radius),
  );
};

/** Round stickers within a part of a picture, those that stand out most first. */
export const dotsIn = (plane: Plane, span: RowSpan): FoundDot[] => {
  const found: FoundDot[] = [];
  for (const share of RADII) {
    const radius = share * Math.max(plane.width, plane.height);
    for (const peak of peaksOf(plane, span, radius)) {
      const dot = dotAt(plane, peak);
      if (!dot) continue;
      const away = Math.hypot(dot.centre.x - peak.x, dot.centre.y - peak.y);
      if (away > SAME * Math.max(radius, dot.radius)) continue;
      const known = found.some(
        ({ centre, radius: size }) =>
          Math.hypot(centre.x - dot.centre.x, centre.y - dot.centre.y) <
          1.5 * Math.max(size, dot.radius),
      );
      if (!known) found.push(dot);
    }
  }
  return found;
};

/** Between the outermost columns of a body's rows, below its face, in a picture of the full size. */
const within = ({ body, grids }: Movement, plane: Plane): RowSpan => {
  const { columns = 1, rows = 1 } = grids[0] ?? {};
  const [across, down] = [plane.width / columns, plane.height / rows];
  const first = body.top + FACE * (body.bottom - body.top);
  return (y) => {
    const row = Math.floor(y / down);
    if (row < first || row > body.bottom) return null;
    const cells = body.cells.subarray(row * columns, (row + 1) * columns);
    const [from, to] = [cells.indexOf(1), cells.lastIndexOf(1)];
    return from < 0 ? null : { from: from * across, to: (to + 1) * across };
  };
};

/** Stickers that make the answer firm: one on each front corner of the hip bone, and one more. */
const FIRM = 3;
/** Grey values by which a sticker clearly stands out; folds, laces and buttons rarely do. */
const CLEAR = 70;
/** What stands out less is no sticker that a mark could be set on. */
const PALE = 40;

/** Stickers on a body in a still picture of the take at the size in which marks are placed. */
export const dotsOn = (movement: Movement, still: Plane): Answer<{ readonly dots: number }> => {
  if (Math.max(still.width, still.height) < LEAST_EDGE) return cannotTell('too-coarse');
  const contrasts = dotsIn(still, within(movement, still)).map(({ centre, radius }) =>
    Math.abs(standsOut(still, centre.x, centre.y, radius)),
  );
  const beyond = (least: number): number =>
    contrasts.filter((contrast) => contrast >= least).length;
  const clear = beyond(CLEAR);
  if (clear >= FIRM) return { told: 'yes', dots: clear };
  // pale stickers would be several as well
  return clear === 0 && beyond(PALE) < FIRM ? { told: 'no', dots: 0 } : cannotTell('few-round');
};
