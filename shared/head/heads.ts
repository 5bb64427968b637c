import { boxAround, boxWithin, type Box, grown } from '#shared/geometry/boxes.ts';
import { type DrawnHead, type HeadTrack, SURE_HEAD } from './head-track.ts';

/** What hides the head on one frame. */
export interface HeadOnFrame {
  readonly frame: number;
  /** Within the picture; the whole picture where nothing smaller is sure to cover the head. */
  readonly box: Box;
  readonly state: 'drawn' | 'followed' | 'lost';
}

/** Frames in a row, both inclusive. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

const knownHeads = ({ drawn, followed }: HeadTrack): Map<number, HeadOnFrame> => {
  const known = new Map<number, HeadOnFrame>();
  for (const { frame, box, confidence } of followed)
    if (confidence >= SURE_HEAD) known.set(frame, { frame, box, state: 'followed' });
  // a hand overrules what was followed
  for (const { frame, box } of drawn) known.set(frame, { frame, box, state: 'drawn' });
  return known;
};

/**
 * Covers the last box known before and the first known after, grown by the distance to the nearer:
 * whichever of them the head left, and wherever it went in between.
 */
const lostBox = (
  frame: number,
  before: DrawnHead | null,
  after: DrawnHead | null,
  growth: number,
): Box | null => {
  const [nearest] = [before, after]
    .filter((head) => head !== null)
    .sort((a, b) => Math.abs(a.frame - frame) - Math.abs(b.frame - frame));
  if (!nearest) return null;
  const around = before && after ? boxAround(before.box, after.box) : nearest.box;
  const size = Math.max(
    ...[before, after].flatMap((head) => (head ? [head.box.width, head.box.height] : [])),
  );
  return grown(around, growth * size * Math.abs(nearest.frame - frame));
};

/** What hides the head on every frame that was looked through, rising. Nothing where no box is known at all. */
export const headsOf = (track: HeadTrack): HeadOnFrame[] => {
  const { fromFrame, toFrame, width, height, growth } = track;
  const known = knownHeads(track);
  const order = [...known.values()].sort((a, b) => a.frame - b.frame);
  const whole = { left: 0, top: 0, width, height };
  const heads: HeadOnFrame[] = [];
  let next = 0;
  for (let frame = fromFrame; frame <= toFrame; frame += 1) {
    while ((order[next]?.frame ?? Infinity) <= frame) next += 1;
    const here = known.get(frame);
    const box = here?.box ?? lostBox(frame, order[next - 1] ?? null, order[next] ?? null, growth);
    if (!box) return [];
    heads.push({ frame, box: boxWithin(box, track) ?? whole, state: here?.state ?? 'lost' });
  }
  return heads;
};

/** Rising frames as rows of neighbours. */
const stretchesOf = (frames: readonly number[]): Stretch[] => {
  const found: { from: number; to: number }[] = [];
  for (const frame of frames) {
    const last = found.at(-1);
    if (last?.to === frame - 1) last.to = frame;
    else found.push({ from: frame, to: frame });
  }
  return found;
};

/** Where the head was lost and a grown box covers it: what a person has to look at first. */
export const lostStretches = (heads: readonly HeadOnFrame[]): Stretch[] =>
  stretchesOf(heads.flatMap(({ frame, state }) => (state === 'lost' ? [frame] : [])));

/** Frames of a span without any box. Empty: the head is covered on all of them. */
export const uncovered = (track: HeadTrack | null, { from, to }: Stretch): Stretch[] => {
  const covered = new Set(track ? headsOf(track).map(({ frame }) => frame) : []);
  const all = Array.from({ length: to - from + 1 }, (_, n) => from + n);
  return stretchesOf(all.filter((frame) => !covered.has(frame)));
};
