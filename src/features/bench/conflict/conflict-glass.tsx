import { useEffect, useRef } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import { roleIn } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { shapeAt } from '#shared/overlay/mark-shapes.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import { paintPicture } from '#src/canvas/picture-board.ts';
import { useSize } from '#src/canvas/use-size.ts';
import { toStage, type Viewport } from '#src/canvas/viewport.ts';
import { useBenchModel, useBenchTools } from '../bench-context.ts';

interface Party {
  readonly value: MarkValue | null;
  readonly tag: string;
}

const HEIGHT = 166;

const pointOf = ({ value }: Party): FramePoint | null =>
  value?.to === 'point' ? value.point : null;

/** Both marks in one glass, large enough to hold them, each with a white tag of initials. */
export function ConflictGlass({
  landmark,
  mine,
  theirs,
}: {
  landmark: LandmarkId;
  mine: Party;
  theirs: Party;
}) {
  const { board, frameSize } = useBenchTools();
  const { view } = useBenchModel();
  const box = useRef<HTMLDivElement>(null);
  const canvas = useRef<HTMLCanvasElement>(null);
  const size = useSize(box);
  const a = pointOf(mine) ?? pointOf(theirs);
  const b = pointOf(theirs) ?? a;
  const width = size?.width ?? 0;
  const viewport: Viewport | null = a && b && width > 0 ? glassOver(a, b, width) : null;

  useEffect(() => {
    const paint = () => {
      const context = canvas.current?.getContext('2d');
      if (!context || !canvas.current || !viewport || !a || !b) return;
      const ratio = window.devicePixelRatio;
      canvas.current.width = Math.round(width * ratio);
      canvas.current.height = Math.round(HEIGHT * ratio);
      context.setTransform(ratio, 0, 0, ratio, 0, 0);
      paintPicture(context, board, frameSize, viewport);
      const role = roleIn(landmark, view);
      const drawn: Primitive[] = [
        { kind: 'line', from: a, to: b, role: 'note', state: 'placed' },
        ...[pointOf(mine), pointOf(theirs)].flatMap((point) =>
          point ? [shapeAt(role, 'placed', point, landmark)] : [],
        ),
      ];
      paintOverlay(context, drawn, { viewport, bounds: { width, height: HEIGHT } });
    };
    paint();
    return board.subscribe(paint);
  });

  return (
    <div ref={box} className="relative mt-2 overflow-hidden rounded-[2px] bg-dusk">
      <canvas ref={canvas} aria-hidden="true" style={{ width: '100%', height: HEIGHT }} />
      {viewport &&
        [mine, theirs].map((party, n) => {
          const point = pointOf(party);
          if (!point || party.tag === '') return null;
          const { x, y } = toStage(viewport, point);
          const left = n === 0;
          return (
            <span
              key={n}
              className="absolute -translate-y-1/2 rounded-[3px] bg-sheet px-1.5 text-caption font-bold text-ink"
              style={{
                top: Math.max(14, Math.min(HEIGHT - 14, y + (left ? -16 : 16))),
                ...(left ? { right: width - x + 14 } : { left: x + 14 }),
              }}
            >
              {party.tag}
            </span>
          );
        })}
    </div>
  );
}

/** A viewport that holds both points with room around them, never beyond eight times. */
const glassOver = (a: FramePoint, b: FramePoint, width: number): Viewport => {
  const span = Math.max(Math.abs(a.u - b.u) / width, Math.abs(a.v - b.v) / HEIGHT);
  const scale = Math.min(8, span === 0 ? 8 : 0.4 / span);
  return {
    scale,
    x: width / 2 - (scale * (a.u + b.u)) / 2,
    y: HEIGHT / 2 - (scale * (a.v + b.v)) / 2,
  };
};
