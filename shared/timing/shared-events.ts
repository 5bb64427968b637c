import { type Milliseconds, milliseconds } from './units.ts';

/** A moment of one lift that two clips of it both show. */
export const SHARED_EVENTS = ['clap', 'foot-off', 'top', 'foot-down'] as const;
export type SharedEvent = (typeof SHARED_EVENTS)[number];

/** When a clip shows a moment, on its own clock, and how far off that may be. */
export interface EventTime {
  readonly time: Milliseconds;
  /** From one frame of the clip to the next. */
  readonly step: Milliseconds;
  /** Standard uncertainty. */
  readonly u: Milliseconds;
}

/**
 * A time of the other clip, and how far it moves with one standard error of each moment that the clocks are tied
 * by, in the order of `events`. Times that hang on the same moment are off together.
 */
export interface MappedTime {
  readonly time: Milliseconds;
  readonly byEvent: readonly Milliseconds[];
}
export type EventTimes = { readonly [E in SharedEvent]?: EventTime | undefined };

/** Why two clips cannot show the same lift, or why nothing can tell. */
export type TieFault =
  /** Fewer than two moments that both clips show. */
  | { readonly code: 'few-shared-events'; readonly have: readonly SharedEvent[] }
  /** The two happen in one order in the one clip, and in the other or at once in the other. */
  | { readonly code: 'events-out-of-order'; readonly events: readonly [SharedEvent, SharedEvent] }
  /** Time between two moments, by either clip, ms; `allowed` is what frame steps and marks explain. */
  | {
      readonly code: 'durations-differ';
      readonly events: readonly [SharedEvent, SharedEvent];
      readonly own: Milliseconds;
      readonly other: Milliseconds;
      readonly allowed: Milliseconds;
    };

/** The clock of one clip read on the other’s. */
export interface ClockTie {
  /** Moments it hangs on, in the order in which they happen; at least two. */
  readonly events: readonly SharedEvent[];
  /** A time of the own clip on the other’s clock. */
  readonly onOther: (time: Milliseconds) => MappedTime;
}

interface Knot {
  readonly event: SharedEvent;
  readonly own: EventTime;
  readonly other: EventTime;
}

const known = (time: EventTime | undefined): time is EventTime =>
  time !== undefined &&
  Number.isFinite(time.time) &&
  Number.isFinite(time.step) &&
  Number.isFinite(time.u);

const faultBetween = (a: Knot, b: Knot): TieFault | null => {
  const events = [a.event, b.event] as const;
  const own = b.own.time - a.own.time;
  const other = b.other.time - a.other.time;
  if (own <= 0 || other <= 0) return { code: 'events-out-of-order', events };
  const u = Math.hypot(a.own.u, a.other.u, b.own.u, b.other.u);
  const allowed = a.own.step + a.other.step + 1.96 * u;
  return Math.abs(own - other) <= allowed
    ? null
    : {
        code: 'durations-differ',
        events,
        own: milliseconds(own),
        other: milliseconds(other),
        allowed: milliseconds(allowed),
      };
};

const onOther =
  (knots: readonly [Knot, ...Knot[]]) =>
  (time: Milliseconds): MappedTime => {
    const next = knots.findIndex(({ own }) => own.time >= time);
    const b = next < 0 ? knots.at(-1) : knots[next];
    const a = next <= 0 ? b : knots[next - 1];
    if (!a || !b) return { time: milliseconds(NaN), byEvent: [] };
    // before the first and after the last moment both clocks run alike
    const part = a === b ? 1 : (time - a.own.time) / (b.own.time - a.own.time);
    const share = (knot: Knot): number => (knot === b ? part : knot === a ? 1 - part : 0);
    return {
      time: milliseconds(
        a === b
          ? b.other.time + time - b.own.time
          : a.other.time + part * (b.other.time - a.other.time),
      ),
      byEvent: knots.map((knot) =>
        milliseconds(share(knot) * Math.hypot(knot.own.u, knot.other.u)),
      ),
    };
  };

/**
 * Ties the clocks of two clips of one lift by the moments that both show: piecewise linear between them. Clips
 * whose durations between these moments differ by more than frame steps and marks explain show different lifts, and
 * are refused with the figures.
 */
export const tieClocks = (own: EventTimes, other: EventTimes): ClockTie | TieFault => {
  const knots = SHARED_EVENTS.flatMap((event): Knot[] => {
    const here = own[event];
    const there = other[event];
    return known(here) && known(there) ? [{ event, own: here, other: there }] : [];
  }).sort((a, b) => a.own.time - b.own.time);
  const [first, ...rest] = knots;
  if (!first || rest.length === 0)
    return { code: 'few-shared-events', have: knots.map(({ event }) => event) };
  for (const [i, knot] of rest.entries()) {
    const fault = faultBetween(knots[i] ?? first, knot);
    if (fault) return fault;
  }
  return { events: knots.map(({ event }) => event), onOther: onOther([first, ...rest]) };
};

export const isTie = (tie: ClockTie | TieFault): tie is ClockTie => 'onOther' in tie;
