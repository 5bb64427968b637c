import { boxAround } from '#shared/geometry/boxes.ts';
import type { DrawnHead, FollowedHead } from '#shared/head/head-track.ts';
import { frameIndex } from '#shared/timing/units.ts';
import type { Size } from '#src/canvas/viewport.ts';
import { anchorsOf, followBox } from '#src/tracking/core/follow-box.ts';
import type { Track, Tracker } from '#src/tracking/types.ts';

/** How sure the anchors that hold a box on a frame are: the mean of those that are sure. */
const confidenceOn = (tracks: readonly Track[], frame: number): number => {
  const sure = tracks.flatMap(({ places }) =>
    places.flatMap((place) =>
      place.frame === frame && place.state === 'sure' ? [place.confidence] : [],
    ),
  );
  return sure.length === 0 ? 0 : sure.reduce((sum, value) => sum + value, 0) / sure.length;
};

/** Where one drawn box surely went, as far as the boxes drawn before and after it. */
export const surelyFollowed = (
  { frame, box }: DrawnHead,
  tracks: readonly Track[],
  span: { readonly from: number; readonly to: number },
  picture: Size,
): FollowedHead[] => {
  const bounds = { from: frameIndex(span.from), to: frameIndex(span.to), ...picture };
  return followBox({ frame: frameIndex(frame), box }, tracks, bounds).flatMap((each) =>
    each.state === 'sure' && each.frame !== frame
      ? [{ frame: each.frame, box: each.box, confidence: confidenceOn(tracks, each.frame) }]
      : [],
  );
};

/** Where two drawn boxes lead to the same frame, both places are covered. */
export const joined = (lists: readonly (readonly FollowedHead[])[]): FollowedHead[] => {
  const heads = new Map<number, FollowedHead>();
  for (const head of lists.flat()) {
    const other = heads.get(head.frame);
    heads.set(
      head.frame,
      other
        ? {
            frame: head.frame,
            box: boxAround(head.box, other.box),
            confidence: Math.min(head.confidence, other.confidence),
          }
        : head,
    );
  }
  return [...heads.values()].sort((a, b) => a.frame - b.frame);
};

/** The frames between the boxes drawn before and after a frame, or the ends of the clip. */
export const reachOf = (
  frame: number,
  drawn: readonly DrawnHead[],
  last: number,
): { readonly from: number; readonly to: number } => {
  const frames = drawn.map((head) => head.frame);
  return {
    from: Math.max(0, ...frames.filter((each) => each < frame).map((each) => each + 1)),
    to: Math.min(last, ...frames.filter((each) => each > frame).map((each) => each - 1)),
  };
};

/**
 * Follows every drawn box both ways until the next one.
 * @param onProgress part of the way, 0 to 1
 */
export const followHeads = async (
  tracker: Tracker,
  drawn: readonly DrawnHead[],
  { last, picture }: { readonly last: number; readonly picture: Size },
  options: { readonly signal: AbortSignal; readonly onProgress: (part: number) => void },
): Promise<FollowedHead[]> => {
  const lists: FollowedHead[][] = [];
  for (const [n, head] of drawn.entries()) {
    const span = reachOf(head.frame, drawn, last);
    const points = anchorsOf({ frame: frameIndex(head.frame), box: head.box });
    const { tracks } = await tracker.follow(
      { points, from: frameIndex(span.from), to: frameIndex(span.to) },
      {
        signal: options.signal,
        onProgress: ({ done, total }) =>
          options.onProgress((n + done / Math.max(1, total)) / drawn.length),
      },
    );
    lists.push(surelyFollowed(head, tracks, span, picture));
  }
  return joined(lists);
};
