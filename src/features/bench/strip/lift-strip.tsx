import { useRef, type PointerEvent } from 'react';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';
import { useSize } from '#src/canvas/use-size.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { useNextFrame } from '../lead/use-suggestion.ts';
import type { BenchModel } from '../model/bench-model.ts';
import { drawnHill, liftAt } from '../model/hill.ts';
import { goTo } from '../store/bench-store.ts';
import { isDraft } from '../model/draft.ts';
import { StripFound } from './strip-found.tsx';
import { momentsOf } from './moments.ts';
import { StripHill } from './strip-hill.tsx';
import { type StripLayout, stripLayout } from './strip-layout.ts';
import { StripMoments } from './strip-moments.tsx';
import { StripNotches } from './strip-notches.tsx';
import { StripPins } from './strip-pins.tsx';
import { StripPreviews } from './strip-previews.tsx';
import { StripReps } from './strip-reps.tsx';

/** The rep on show, or the whole clip while reps are named. */
const spanOf = (
  { current }: BenchModel,
  whole: boolean,
  count: number,
): readonly [FrameIndex, FrameIndex] =>
  whole || !current
    ? [frameIndex(0), frameIndex(count - 1)]
    : [frameIndex(current.rep.startFrame), frameIndex(current.rep.endFrame)];

/**
 * Under clip and course: the rep as a hill of lift with its gates, a notch per marked frame, pins
 * of comments and the moments of the rep. Before anything is marked it is plain time with pictures.
 */
export function LiftStrip() {
  const { times } = useBenchTools();
  const { comments } = useBenchDocument();
  const model = useBenchModel();
  const naming = useBench((state) => state.desk === 'reps');
  const box = useRef<HTMLDivElement>(null);
  const size = useSize(box);
  const draft = isDraft(model.current);
  const whole = naming || draft || !model.current;
  const [from, to] = spanOf(model, whole, times.length);
  // the row of pins takes room from the hill only where a pin stands
  const pins = comments.some(({ fromFrame }) => from <= fromFrame && fromFrame <= to);
  return (
    <div ref={box} className="bench-strip">
      {size && <Strip whole={whole} layout={stripLayout(size, [from, to], times, pins)} />}
    </div>
  );
}

function Strip({ whole, layout }: { whole: boolean; layout: StripLayout }) {
  const { store, times } = useBenchTools();
  const { may } = useBenchDocument();
  const { protocol } = useBenchDocument();
  const model = useBenchModel();
  const { current, figures, reps } = model;
  const shownReps =
    isDraft(current) && current ? [current] : whole ? reps : current ? [current] : [];
  const frame = useBench((state) => state.frame);
  const next = useNextFrame();
  const { x, y, base, left, right, width, height, compact, from, to } = layout;
  const hill =
    figures && current && current.hill.length > 1 && !whole ? drawnHill(current.frames) : null;
  const moments =
    current && !whole ? momentsOf(current.rep, current.course?.phases ?? null, times) : [];
  const time = times[frame];
  const lift = hill && time !== undefined ? liftAt(hill, time) : null;
  const inside = from <= frame && frame <= to;
  const nextInside = next && from <= next.frame && next.frame <= to && !whole;
  const nextTime = next ? times[next.frame] : undefined;
  const nextLift = hill && nextTime !== undefined ? liftAt(hill, nextTime) : null;

  const follow = (event: PointerEvent) => {
    const bounds = event.currentTarget.getBoundingClientRect();
    store.setState({ playing: false });
    goTo(store, layout.frameAtX(event.clientX - bounds.left));
  };
  return (
    <div
      className="relative h-full cursor-ew-resize touch-pan-y select-none"
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        follow(event);
      }}
      onPointerMove={(event) => {
        if (event.currentTarget.hasPointerCapture(event.pointerId)) follow(event);
      }}
    >
      {!hill && <StripPreviews layout={layout} />}
      <StripPins layout={layout} />
      <svg
        className="plot pointer-events-none absolute inset-0"
        width={width}
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        aria-hidden="true"
      >
        {hill && (
          <StripHill
            hill={hill}
            layout={layout}
            gates={gatesOf(protocol.rules)}
            fromFront={model.view === 'front'}
            sayBlind={!nextInside || nextLift !== null}
          />
        )}
        <path d={`M${left} ${base}H${right}`} className="plot-axis" />
        {moments.length === 0 &&
          !whole &&
          layout.ticks.map((tick) => (
            <g key={tick.text}>
              <path d={`M${tick.x} ${base}v6`} className="plot-axis" />
              <text x={tick.x} y={base + 22} textAnchor="middle">
                {tick.text}
              </text>
            </g>
          ))}
        <StripNotches reps={shownReps} led={model.led} layout={layout} />
        {nextInside && next.frame !== frame && (
          <g>
            <path
              d={`M${x(next.frame)} ${nextLift === null ? base - 30 : y(nextLift)}V${base}`}
              strokeDasharray="3 3"
              strokeWidth="1.25"
              className="stroke-ink"
            />
            <circle
              cx={x(next.frame)}
              cy={nextLift === null ? base - 38 : y(nextLift)}
              r="8"
              strokeDasharray="3 3"
              strokeWidth="1.5"
              className="fill-mud stroke-ink motion-safe:animate-breathe"
            />
            {!compact && (
              <text x={x(next.frame) + 14} y={base - 22} className="plot-over plot-strong">
                next: frame {next.frame}
              </text>
            )}
          </g>
        )}
        {inside && (
          <g>
            <path
              d={`M${x(frame)} ${layout.tagTop}V${base + 6}`}
              strokeWidth="2"
              className="stroke-ink"
            />
            {lift !== null && (
              <circle
                cx={x(frame)}
                cy={y(lift)}
                r="5.5"
                strokeWidth="2"
                className="fill-ink stroke-mud"
              />
            )}
            {!compact && (
              <FrameTag x={x(frame)} y={layout.tagTop} text={`frame ${frame}`} right={right} />
            )}
          </g>
        )}
      </svg>
      {whole && <StripReps layout={layout} />}
      {whole && <StripFound layout={layout} />}
      {current && !whole && (
        <StripMoments rep={current.rep} moments={moments} layout={layout} movable={may.mark} />
      )}
    </div>
  );
}

const TAG = 84;

function FrameTag({ x, y, text, right }: { x: number; y: number; text: string; right: number }) {
  const at = x + TAG > right ? x - TAG : x;
  return (
    <>
      <rect x={at} y={y} width={TAG} height="22" className="fill-ink" />
      <text x={at + TAG / 2} y={y + 16} textAnchor="middle" className="fill-mud font-bold">
        {text}
      </text>
    </>
  );
}
