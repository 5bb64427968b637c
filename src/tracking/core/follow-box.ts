import { type Box, boxWithin, grown } from '#shared/geometry/boxes.ts';
import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { FollowedBox, PointToFollow, Track } from '../types.ts';

/** Where in a box its anchors lie, as parts of its width and height. */
const ANCHORS = [0.2, 0.5, 0.8];
/** Anchors agree where they moved alike within this part of the box's size. */
const ALIKE = 0.12;
/** So many of all anchors have to agree, and never fewer than two. */
const LEAST_SHARE = 1 / 3;
/**
 * How far a head that nobody sees may get from one picture to the next, as a part of the box's
 * size: 1.5 heads a second at 30 pictures a second. From our own clips, no source.
 */
const GROWTH = 0.05;

export interface DrawnBox {
  readonly frame: FrameIndex;
  readonly box: Box;
}

export interface BoxSpan {
  readonly from: FrameIndex;
  readonly to: FrameIndex;
  /** Size of the source picture: no box is larger. */
  readonly width: number;
  readonly height: number;
  /** Part of the box's size that it grows by per picture while lost; default 0.05. */
  readonly growth?: number;
}

/** Nine points within the box: follow them, then give their tracks to `followBox`. */
export const anchorsOf = ({ frame, box }: DrawnBox): PointToFollow[] =>
  ANCHORS.flatMap((down) =>
    ANCHORS.map((across) => ({
      id: `box-${across}-${down}`,
      keyframes: [
        { frame, point: framePoint(box.left + across * box.width, box.top + down * box.height) },
      ],
    })),
  );

const median = (values: readonly number[]): number =>
  [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;

interface Motion {
  readonly du: number;
  readonly dv: number;
  /** How much farther apart the anchors are; 1 or more. */
  readonly scale: number;
}

interface Pair {
  readonly drawn: FramePoint;
  readonly now: FramePoint;
}

/** What the anchors that agree say; null where too few do. */
const motionOf = (pairs: readonly Pair[], anchors: number, size: number): Motion | null => {
  const du = median(pairs.map(({ drawn, now }) => now.u - drawn.u));
  const dv = median(pairs.map(({ drawn, now }) => now.v - drawn.v));
  const alike = pairs.filter(
    ({ drawn, now }) => Math.hypot(now.u - drawn.u - du, now.v - drawn.v - dv) <= ALIKE * size,
  );
  if (alike.length < Math.max(2, LEAST_SHARE * anchors)) return null;
  const ratios = alike.flatMap((a, n) =>
    alike.slice(n + 1).map((b) => {
      const before = Math.hypot(b.drawn.u - a.drawn.u, b.drawn.v - a.drawn.v);
      return Math.hypot(b.now.u - a.now.u, b.now.v - a.now.v) / before;
    }),
  );
  return { du, dv, scale: Math.max(1, median(ratios)) };
};

const movedBox = ({ left, top, width, height }: Box, { du, dv, scale }: Motion): Box => ({
  left: left + du - ((scale - 1) * width) / 2,
  top: top + dv - ((scale - 1) * height) / 2,
  width: width * scale,
  height: height * scale,
});

/** The part of the box within the picture; where that is nothing, the whole picture. */
const clipped = (box: Box, span: BoxSpan): Box =>
  boxWithin(box, span) ?? { left: 0, top: 0, width: span.width, height: span.height };

/**
 * A box drawn once, on every frame of the span, rising. It goes where its anchors surely went. On a
 * frame where too few are sure it stays at its last place and grows picture by picture, until it
 * covers everything: what should be hidden stays hidden.
 */
export const followBox = (
  drawn: DrawnBox,
  tracks: readonly Track[],
  span: BoxSpan,
): FollowedBox[] => {
  const anchors = anchorsOf(drawn);
  const size = Math.max(drawn.box.width, drawn.box.height);
  const places = tracks.map((track) => new Map(track.places.map((place) => [place.frame, place])));
  const pairsOn = (frame: FrameIndex): Pair[] =>
    anchors.flatMap(({ id, keyframes }) => {
      const at = tracks.findIndex((track) => track.id === id);
      const place = places[at]?.get(frame);
      const key = keyframes[0];
      return place?.point && place.state === 'sure' && key
        ? [{ drawn: key.point, now: place.point }]
        : [];
    });

  const boxes = new Map<number, FollowedBox>();
  const walk = (last: number, step: 1 | -1): void => {
    let known = drawn.box;
    let lostFor = 0;
    for (let n = drawn.frame as number; step * (last - n) >= 0; n += step) {
      const frame = n as FrameIndex;
      const motion: Motion | null =
        frame === drawn.frame
          ? { du: 0, dv: 0, scale: 1 }
          : motionOf(pairsOn(frame), anchors.length, size);
      if (motion) known = movedBox(drawn.box, motion);
      lostFor = motion ? 0 : lostFor + 1;
      const box = grown(known, lostFor * (span.growth ?? GROWTH) * size);
      boxes.set(n, { frame, box: clipped(box, span), state: motion ? 'sure' : 'lost' });
    }
  };
  walk(span.to, 1);
  walk(span.from, -1);
  return [...boxes.values()]
    .filter(({ frame }) => frame >= span.from && frame <= span.to)
    .sort((a, b) => a.frame - b.frame);
};
