import {
  useEffect,
  useLayoutEffect,
  useRef,
  useSyncExternalStore,
  type KeyboardEvent,
} from 'react';
import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { Hand } from './hand.ts';
import { toStage, type Viewport } from './viewport.ts';

export type MarkHandle = PlacedHandle | AskedHandle;

export interface PlacedHandle {
  readonly asked: false;
  readonly landmark: LandmarkId;
  /** `Middle of the lifted knee, placed`. */
  readonly label: string;
  readonly at: FramePoint;
}

/** The cross for what is asked for: nothing is placed there yet. */
export interface AskedHandle {
  readonly asked: true;
  readonly label: string;
  readonly at: FramePoint;
}

/** Source px of one press of an arrow: a tenth with Alt, ten with Shift. */
const stepOf = (event: { altKey: boolean; shiftKey: boolean }): number =>
  event.altKey ? 0.1 : event.shiftKey ? 10 : 1;

const ARROWS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/**
 * The marks of this frame for the keyboard: Tab reaches each, arrows nudge it, Escape puts it back,
 * Delete takes it away. Held arrows are one gesture, which ends when the key comes up. They lie over
 * the picture but leave the pointer to the stage below.
 */
export function MarkHandles({
  handles,
  viewport,
  hand,
  onMove,
  onPlace,
  onRemove,
  onLeave,
}: {
  handles: readonly MarkHandle[];
  viewport: Viewport;
  hand: Hand;
  onMove: (landmark: LandmarkId, point: FramePoint) => void;
  onPlace: (point: FramePoint) => void;
  onRemove: (landmark: LandmarkId) => void;
  /** Escape with nothing to put back. */
  onLeave: () => void;
}) {
  const { moved, cross } = useSyncExternalStore(hand.subscribe, hand.get);
  const placeOf = (handle: MarkHandle): FramePoint =>
    handle.asked
      ? (cross ?? handle.at)
      : moved?.landmark === handle.landmark
        ? moved.point
        : handle.at;

  const finish = (handle: MarkHandle) => {
    const now = hand.get().moved;
    if (handle.asked || now?.landmark !== handle.landmark) return;
    hand.set({ moved: null });
    onMove(handle.landmark, now.point);
  };
  const onKeyDown = (handle: MarkHandle) => (event: KeyboardEvent) => {
    const arrow = ARROWS[event.key];
    if (arrow && !event.ctrlKey && !event.metaKey) {
      event.preventDefault();
      event.stopPropagation();
      const step = stepOf(event);
      const from = placeOf(handle);
      const point = framePoint(from.u + arrow[0] * step, from.v + arrow[1] * step);
      hand.set(handle.asked ? { cross: point } : { moved: { landmark: handle.landmark, point } });
    } else if (event.key === 'Enter' && handle.asked) {
      event.preventDefault();
      event.stopPropagation();
      onPlace(placeOf(handle));
    } else if ((event.key === 'Delete' || event.key === 'Backspace') && !handle.asked) {
      event.preventDefault();
      onRemove(handle.landmark);
    } else if (event.key === 'Escape') {
      event.stopPropagation();
      if (hand.get().moved) hand.set({ moved: null });
      else if (hand.get().cross) hand.set({ cross: null });
      else onLeave();
    }
  };

  return (
    <ul aria-label="Marks of this frame">
      {handles.map((handle) => {
        const { x, y } = toStage(viewport, placeOf(handle));
        return (
          // the cross stays one thing while leading goes on, or whoever places with it would lose their place
          <li key={handle.asked ? 'asked' : handle.landmark}>
            <button
              type="button"
              data-landmark={handle.asked ? undefined : handle.landmark}
              data-asked={handle.asked || undefined}
              className="pointer-events-none absolute size-7 -translate-x-1/2 -translate-y-1/2 rounded-full"
              style={{ left: x, top: y }}
              aria-label={handle.label}
              onKeyDown={onKeyDown(handle)}
              onKeyUp={() => finish(handle)}
              onBlur={() => {
                finish(handle);
                if (handle.asked) hand.set({ aim: null });
              }}
              onFocus={() => {
                // the magnifier follows the keyboard
                if (handle.asked) hand.set({ cross: placeOf(handle), aim: null });
              }}
            >
              {handle.asked && <NextRing onGone={onLeave} />}
            </button>
          </li>
        );
      })}
    </ul>
  );
}

/** The landmark asked for: larger, white, dashed, and the only thing that moves. */
function NextRing({ onGone }: { onGone: () => void }) {
  const ring = useRef<SVGSVGElement>(null);
  const latest = useRef(onGone);
  useEffect(() => {
    latest.current = onGone;
  });
  // once nothing is asked for, the cross goes while the keyboard is on it: the focus must not go with it
  useLayoutEffect(() => {
    const cross = ring.current?.closest('button');
    return () => {
      if (cross && cross === document.activeElement) latest.current();
    };
  }, []);
  return (
    <svg
      ref={ring}
      viewBox="-18 -18 36 36"
      width="36"
      height="36"
      fill="none"
      aria-hidden="true"
      className="absolute left-1/2 top-1/2 -translate-x-1/2 -translate-y-1/2 motion-safe:animate-breathe"
    >
      <circle r="14" strokeWidth="6.5" className="stroke-dusk/80" />
      <circle r="14" strokeWidth="2.4" strokeDasharray="4 3.5" className="stroke-sheet" />
    </svg>
  );
}
