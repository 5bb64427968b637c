export interface LiftPoint {
  /** Seconds from the curve's zero. */
  readonly time: number;
  /** As the marks say it, and smoothed as the line is drawn, degrees. */
  readonly lift: number;
  readonly line: number;
  /** ± (95 %); null where it is not known. */
  readonly halfWidth: number | null;
  /** The line does not continue from the point before. */
  readonly startsRun: boolean;
  /** Rests on marks that nobody has looked at: provisional. */
  readonly hollow: boolean;
}

export interface LiftCurve {
  /** Its zero is foot off; otherwise the first marked frame. */
  readonly fromFootOff: boolean;
  readonly points: readonly LiftPoint[];
}
