import type { StagePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';

/** What the next press on the bare picture is for, where it is for anything. */
export interface Asked<P> {
  /** Null for a tool that draws: then no mark takes hold. */
  readonly landmark: LandmarkId | null;
  /** Where it is expected; null where nothing says so. */
  readonly expected: P | null;
}

interface Standing {
  readonly landmark: LandmarkId;
  readonly at: StagePoint;
}

/** Half of a 44 px target. */
const LARGEST = 22;
/** Marks nearer than this to each other are told apart by enlarging. */
const SMALLEST = 9;
/**
 * While a landmark is asked for: its place may lie close beside a mark that stands, as the tip of a thigh pointer
 * and the end of its strap are 10 px apart in the whole picture.
 */
const LARGEST_BESIDE = 14;
const SMALLEST_BESIDE = 5;
const BESIDE_UNKNOWN = 8;

const apart = (a: StagePoint, b: StagePoint): number => Math.hypot(b.x - a.x, b.y - a.y);
const between = (least: number, value: number, most: number): number =>
  Math.max(least, Math.min(most, value));

/**
 * How near to each mark a press belongs to it, CSS px: a drag from there moves it. A mark's
 * reach ends half way to its nearest neighbour and to where the asked one is expected. The asked one itself is
 * placed again, not taken hold of: its reach is 0.
 */
export const hitRadii = (marks: readonly Standing[], asked: Asked<StagePoint> | null): number[] =>
  marks.map(({ landmark, at }) => {
    if (asked && (asked.landmark === null || asked.landmark === landmark)) return 0;
    const others = marks.filter(
      (other) => other.landmark !== landmark && other.landmark !== asked?.landmark,
    );
    const neighbour = Math.min(...others.map((other) => apart(at, other.at))) / 2;
    if (!asked) return between(SMALLEST, neighbour, LARGEST);
    if (!asked.expected) return Math.min(BESIDE_UNKNOWN, Math.max(SMALLEST_BESIDE, neighbour));
    const toAsked = apart(at, asked.expected) / 2;
    return between(SMALLEST_BESIDE, Math.min(neighbour, toAsked), LARGEST_BESIDE);
  });
