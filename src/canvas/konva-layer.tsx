import type Konva from 'konva';
import { useEffect, useRef, type RefObject } from 'react';
import { Layer, Shape, Stage } from 'react-konva/lib/ReactKonvaCore';
import { type FramePoint, stagePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { MarkShape, Primitive } from '#shared/overlay/types.ts';
import type { Hand } from './hand.ts';
import { type Asked, hitRadii } from './hit-radius.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import { paintMark } from '#shared/overlay/paint-marks.ts';
import { type Size, toFrame, toStage, type Viewport } from './viewport.ts';

export type Moved = { readonly landmark: LandmarkId; readonly point: FramePoint } | null;

export interface KonvaLayerProps {
  size: Size;
  viewport: Viewport;
  hand: Hand;
  /** What is drawn, with one mark elsewhere while it is being moved. */
  draw: (moved: Moved) => readonly Primitive[];
  /** False where this person may only look. */
  movable: boolean;
  /** What a press is for; null where it is for nothing. A tap on a mark then places there, and only a drag moves it. */
  asked: Asked<FramePoint> | null;
  onPlace: (point: FramePoint) => void;
  onMove: (landmark: LandmarkId, point: FramePoint) => void;
  onSelect: (landmark: LandmarkId) => void;
  /** Set when a press has landed on a mark, so that the stage leaves it alone. */
  pressedRef: RefObject<boolean>;
}

type Owned = MarkShape & { readonly landmark: LandmarkId };
const ownsLandmark = (drawn: Primitive): drawn is Owned =>
  (drawn.kind === 'ring' || drawn.kind === 'diamond' || drawn.kind === 'bracket') &&
  drawn.landmark !== null &&
  drawn.state !== 'next';

const ORIGIN = stagePoint(0, 0);

/** The transparent stage over the picture: lines below, a node of its own for every mark above. */
export default function KonvaLayer(props: KonvaLayerProps) {
  const { size, viewport, hand, draw, asked } = props;
  const lines = useRef<Konva.Layer>(null);
  const marks = draw(null).filter(ownsLandmark);
  const places = marks.map((mark) => toStage(viewport, mark.at));
  const radii = hitRadii(
    marks.map(({ landmark }, n) => ({ landmark, at: places[n] ?? ORIGIN })),
    asked && { ...asked, expected: asked.expected && toStage(viewport, asked.expected) },
  );

  useEffect(() => hand.subscribe(() => lines.current?.batchDraw()), [hand]);

  return (
    <Stage width={size.width} height={size.height} className="absolute inset-0">
      <Layer ref={lines} listening={false}>
        <Shape
          sceneFunc={(context) =>
            paintOverlay(
              context._context,
              draw(hand.get().moved).filter((each) => !ownsLandmark(each)),
              { viewport, bounds: size },
            )
          }
        />
      </Layer>
      <Layer>
        {marks.map((mark, n) => (
          <MarkNode
            key={mark.landmark}
            {...props}
            mark={mark}
            place={places[n] ?? ORIGIN}
            radius={radii[n] ?? 0}
          />
        ))}
      </Layer>
    </Stage>
  );
}

/** A press that wanders less than this is a tap instead of a drag, CSS px. */
const DRAG_DISTANCE = 3;

function MarkNode({
  mark,
  place,
  radius,
  viewport,
  hand,
  movable,
  asked,
  onPlace,
  onMove,
  onSelect,
  pressedRef,
}: KonvaLayerProps & { mark: Owned; place: { x: number; y: number }; radius: number }) {
  const node = useRef<Konva.Shape>(null);
  const { landmark } = mark;
  const { x, y } = place;

  useEffect(() => {
    const put = () => {
      const shape = node.current;
      if (!shape || shape.isDragging()) return;
      const { moved } = hand.get();
      shape.position(moved?.landmark === landmark ? toStage(viewport, moved.point) : { x, y });
    };
    put();
    return hand.subscribe(put);
  }, [hand, landmark, viewport, x, y]);

  // Escape, or a second finger, puts the mark back as if it had not been touched
  useEffect(() => {
    const restore = () => {
      const shape = node.current;
      if (!shape?.isDragging()) return;
      hand.set({ moved: null, holding: false });
      shape.stopDrag();
      shape.position({ x, y });
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || !node.current?.isDragging()) return;
      event.stopPropagation();
      restore();
    };
    const onTouch = (event: TouchEvent) => {
      if (event.touches.length > 1) restore();
    };
    window.addEventListener('keydown', onKey, true);
    window.addEventListener('touchstart', onTouch);
    return () => {
      window.removeEventListener('keydown', onKey, true);
      window.removeEventListener('touchstart', onTouch);
    };
  }, [hand, x, y]);

  const here = (event: Konva.KonvaEventObject<DragEvent>) =>
    toFrame(viewport, stagePoint(event.target.x(), event.target.y()));
  return (
    <Shape
      ref={node}
      x={x}
      y={y}
      draggable={movable}
      dragDistance={DRAG_DISTANCE}
      sceneFunc={(context) => paintMark(context._context, mark, ORIGIN)}
      hitFunc={(context, shape) => {
        context.beginPath();
        if (radius > 0) context.arc(0, 0, radius, 0, 2 * Math.PI, false);
        context.closePath();
        context.fillStrokeShape(shape);
      }}
      fill="transparent"
      onPointerDown={(event) => {
        if (event.evt.button === 0) pressedRef.current = true;
      }}
      onPointerClick={(event) => {
        const at = event.target.getStage()?.getPointerPosition();
        if (!asked) onSelect(landmark);
        else if (at) onPlace(toFrame(viewport, stagePoint(at.x, at.y)));
      }}
      onDragStart={() => hand.set({ holding: true })}
      onDragMove={(event) => hand.set({ moved: { landmark, point: here(event) } })}
      onDragEnd={(event) => {
        const { moved } = hand.get();
        const point = here(event);
        hand.set({ moved: null, holding: false });
        if (moved) onMove(landmark, point);
      }}
    />
  );
}
