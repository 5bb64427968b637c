import { isMirrored } from '#shared/plan/sides.ts';
import { otherSide, type Side } from '#shared/landmarks/types.ts';
import { DRAWINGS } from '#shared/plan/drawings.ts';
import { jointsOf } from '#shared/plan/figure/body.ts';
import {
  type ExerciseDrawing as Drawing,
  FRAME,
  inFrame,
  labelOf,
  type Position,
} from '#shared/plan/figure/drawing.ts';
import { outlineOf, type PartLook } from '#shared/plan/figure/outline.ts';
import type { ExerciseId } from '#shared/plan/library.ts';
import { ExerciseProp } from './exercise-prop.tsx';
import { SoleDrawing } from './sole-drawing.tsx';

/** Support leg in vermilion, lifted leg in teal, the rest in ink. */
const LOOKS: Record<PartLook, string> = {
  support: 'fill-shank-pale stroke-shank',
  lifted: 'fill-tide-pale stroke-tide',
  body: 'fill-sheet stroke-ink',
  load: 'fill-ink stroke-ink',
};

/** Two positions of an exercise, drawn for the leg it is for. */
export function ExerciseDrawing({ exercise, side }: { exercise: ExerciseId; side: Side }) {
  const drawing = DRAWINGS[exercise];
  const mirrored = isMirrored(side);
  return (
    <svg
      viewBox={`0 0 ${2 * FRAME.width} ${FRAME.height}`}
      role="img"
      aria-label={labelOf(drawing, side, otherSide(side))}
      className="block h-auto w-full border-b border-rule"
      fill="none"
      stroke="var(--color-ink)"
      strokeWidth="1.5"
      strokeLinecap="round"
      strokeLinejoin="round"
    >
      {drawing.positions.map((position, n) => (
        <g key={n} transform={`translate(${n * FRAME.width} 0)`}>
          <text x="4" y="14" stroke="none" className="fill-soft text-[13px]">
            <tspan className="fill-ink font-bold">{n + 1}</tspan> {position.name}
          </text>
          {'sole' in position ? (
            <SoleDrawing mirrored={mirrored} />
          ) : (
            <Figure drawing={drawing} position={position} mirrored={mirrored} />
          )}
        </g>
      ))}
      <path d={`M${FRAME.width} 24V${FRAME.height - 8}`} className="stroke-rule" />
    </svg>
  );
}

function Figure({
  drawing,
  position: { pose, props = [], load, arrow },
  mirrored,
}: {
  drawing: Drawing;
  position: Position;
  mirrored: boolean;
}) {
  const place = inFrame(drawing, mirrored);
  const scale = place([1, 0])[0] - place([0, 0])[0];
  const parts = outlineOf(jointsOf(pose), place, Math.abs(scale), load);
  return (
    <>
      {props.map((prop, n) => (
        <ExerciseProp key={n} prop={prop} place={place} />
      ))}
      <path d={`M8 ${FRAME.floor}H${FRAME.width - 8}`} className="stroke-soft" />
      {parts.map(({ look, path }, n) => (
        <path key={n} d={path} className={LOOKS[look]} />
      ))}
      {arrow && <Arrow from={place(arrow[0])} to={place(arrow[1])} />}
    </>
  );
}

type Point = readonly [number, number];

function Arrow({ from, to }: { from: Point; to: Point }) {
  const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
  const barb = (turn: number) =>
    `M${to[0]} ${to[1]}l${-7 * Math.cos(angle + turn)} ${-7 * Math.sin(angle + turn)}`;
  return (
    <path
      d={`M${from[0]} ${from[1]}L${to[0]} ${to[1]}${barb(0.5)}${barb(-0.5)}`}
      className="stroke-ink"
      strokeWidth="2"
    />
  );
}
