import { useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { liftText } from '#shared/overlay/figures.ts';
import { courseScale } from '#shared/plots/course-scale.ts';
import { LIFT_RANGE } from '#shared/plots/course-scale.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { frameAtLift, liftAt } from '../model/hill.ts';
import { goTo } from '../store/bench-store.ts';

/**
 * The course as a way to move: drag along it and the clip follows; as a slider over the lift of the
 * rise, arrows go from one marked frame to the next.
 */
export function CourseTravel({ children }: { children: ReactNode }) {
  const { store, times } = useBenchTools();
  const { protocol } = useBenchDocument();
  const { current } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const box = useRef<HTMLDivElement>(null);
  const hill = current?.hill ?? [];
  const time = times[frame];
  const lift = time === undefined ? null : liftAt(hill, time);
  if (!current || hill.length < 2) return <>{children}</>;

  const to = (wanted: Degrees) => {
    const next = frameAtLift(hill, wanted, times);
    if (next !== null) goTo(store, next);
  };
  const follow = (event: PointerEvent) => {
    const bounds = box.current?.getBoundingClientRect();
    if (!bounds || bounds.width === 0) return;
    const { x } = courseScale(Math.floor(bounds.width), bounds.height, [], gatesOf(protocol.rules));
    to(degrees(x.invert(event.clientX - bounds.left)));
  };
  const rising = current.frames.filter((each) => each.phase === 'rise' && each.lift !== null);
  const onKeyDown = (event: KeyboardEvent) => {
    const by = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1 }[event.key];
    const ends = event.key === 'Home' ? rising[0] : event.key === 'End' ? rising.at(-1) : null;
    if (by === undefined && !ends) return;
    event.preventDefault();
    const next =
      ends ??
      (by === 1
        ? rising.find((each) => each.frame > frame)
        : rising.findLast((each) => each.frame < frame));
    if (next) goTo(store, next.frame);
  };
  return (
    <div
      ref={box}
      role="slider"
      tabIndex={0}
      aria-label="Along the course, by lift"
      aria-orientation="horizontal"
      aria-valuemin={LIFT_RANGE[0]}
      aria-valuemax={LIFT_RANGE[1]}
      aria-valuenow={lift === null ? LIFT_RANGE[0] : Math.round(lift)}
      aria-valuetext={
        lift === null
          ? `frame ${frame}, lift not known`
          : `lift ${liftText(lift, current.rep.view === 'front', 0)}, frame ${frame}`
      }
      className="cursor-ew-resize touch-pan-y select-none"
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        store.setState({ playing: false });
        follow(event);
      }}
      onPointerMove={(event) => {
        if (event.currentTarget.hasPointerCapture(event.pointerId)) follow(event);
      }}
    >
      {children}
    </div>
  );
}
