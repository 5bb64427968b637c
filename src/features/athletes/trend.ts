import type { Side } from '#shared/contracts/primitives.ts';
import type { VisitRow } from '#shared/contracts/visits.ts';
import { degrees } from '#shared/geometry/units.ts';
import { retestChange } from '#shared/reading/compare.ts';
import { type Gates, sameGates } from '#shared/protocol/protocol.ts';

/** One measured visit of one side; angles in degrees, external positive. */
export type TrendPoint = {
  visitId: string;
  day: string;
  label: string;
  gates: Gates;
  change: number;
  /** 1.96 u_c */
  plusMinus: number;
  /** u_c */
  u: number;
  provisional: boolean;
};
export type Trend = Record<Side, TrendPoint[]>;

/** The measured visits of both sides, oldest first. A call by eye has no place here. */
export function trendOf(visits: readonly VisitRow[]): Trend {
  const oldestFirst = [...visits].sort((a, b) => a.day.localeCompare(b.day));
  const points = (side: Side) =>
    oldestFirst.flatMap(({ id, day, sides }): TrendPoint[] => {
      const reading = sides.find((own) => own.side === side)?.reading;
      if (!reading) return [];
      const { label, gates, change, plusMinus, u, provisional } = reading;
      if (change === null || plusMinus === null || u === null) return [];
      return [{ visitId: id, day, label, gates, change, plusMinus, u, provisional }];
    });
  return { right: points('right'), left: points('left') };
}

/** The points that can be compared: those read between the gates of the latest, and how many are left out. */
export function comparable(trend: Trend): { trend: Trend; gates: Gates | null; leftOut: number } {
  const all = [...trend.right, ...trend.left];
  const latest = all.reduce<TrendPoint | null>(
    (last, point) => (last && last.day >= point.day ? last : point),
    null,
  );
  if (!latest) return { trend, gates: null, leftOut: 0 };
  const { gates } = latest;
  const alike = (points: readonly TrendPoint[]) =>
    points.filter((point) => sameGates(point.gates, gates));
  const kept = { right: alike(trend.right), left: alike(trend.left) };
  return { trend: kept, gates, leftOut: all.length - kept.right.length - kept.left.length };
}

export type Since = {
  /** The earlier visit. */
  day: string;
  /** Degrees, later minus earlier. */
  difference: number;
  /** 1.96 √(u₁² + u₂²), degrees. */
  plusMinus: number;
  changed: boolean;
};

/** How the latest visit of a side stands against an earlier one: changed only beyond the joint error. */
export function since(earlier: TrendPoint, latest: TrendPoint): Since {
  const as = ({ change, u }: TrendPoint) => ({ d: degrees(change), uC: degrees(u) });
  const change = retestChange(as(earlier), as(latest));
  if (!change) throw new RangeError('A trend holds finite figures.');
  return {
    day: earlier.day,
    difference: change.value,
    plusMinus: change.halfWidth,
    changed: change.shown,
  };
}

/** Bounds of the turn axis, degrees, in steps of ten around every error bar and zero. */
export function turnBounds(trend: Trend): [low: number, high: number] {
  const points = [...trend.left, ...trend.right];
  const low = Math.min(-10, ...points.map(({ change, plusMinus }) => change - plusMinus));
  const high = Math.max(10, ...points.map(({ change, plusMinus }) => change + plusMinus));
  return [Math.floor(low / 10) * 10, Math.ceil(high / 10) * 10];
}

/** A calendar day as a number that grows by one a day. */
export const dayNumber = (day: string): number => Date.parse(day) / 86_400_000;
