import { lazy, Suspense, useEffect, useRef, type ReactNode, type RefObject } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import type { Hand } from './hand.ts';
import type { Asked } from './hit-radius.ts';
import type { Moved } from './konva-layer.tsx';
import type { PictureBoard } from './picture-board.ts';
import { PictureLayer } from './picture-layer.tsx';
import { useGestures } from './use-gestures.ts';
import { useSize } from './use-size.ts';
import { beyondCopy, fit, resized, type Size, type Viewport } from './viewport.ts';

const KonvaLayer = lazy(() => import('./konva-layer.tsx'));

export interface Shown {
  readonly viewport: Viewport;
  /** Of the stage, CSS px. */
  readonly size: Size;
}

export interface ClipStageProps {
  /** Upright source frame, px. */
  frame: Size;
  /** The prepared copy, px. */
  copy: Size;
  board: PictureBoard;
  /** Address of this frame at the phone's own resolution; fetched only where the copy would blur. */
  fullFrameUrl: string | null;
  /** Null shows the whole frame. */
  viewport: Viewport | null;
  onViewport: (viewport: Viewport) => void;
  hand: Hand;
  draw: (moved: Moved) => readonly Primitive[];
  /** What a press beside the marks is for; null: it moves the picture. */
  asked: Asked<FramePoint> | null;
  movable: boolean;
  onPlace: (point: FramePoint) => void;
  /** Every place that a held pointer passes. */
  onPass?: (point: FramePoint) => void;
  onMove: (landmark: LandmarkId, point: FramePoint) => void;
  onSelect: (landmark: LandmarkId) => void;
  /** A press anywhere on the stage, so that the page can take the focus there. */
  onPress: () => void;
  /** Told when the stage has got another width, CSS px. */
  onMeasured?: (width: number) => void;
  /** Told what is on show, for what happens outside of painting. */
  shownRef: RefObject<Shown | null>;
  /** Stands over the picture, in its coordinates: slider, handles. */
  children: (shown: Shown) => ReactNode;
  className?: string;
}

const WHOLE: Viewport = { scale: 1, x: 0, y: 0 };

/** The clip: picture below, transparent stage above, one viewport for both. */
export function ClipStage({ children, className, shownRef, ...props }: ClipStageProps) {
  const { frame, copy, board, hand, draw, movable, asked } = props;
  const { onViewport, onPlace, onMove, onSelect, onPress } = props;
  const stage = useRef<HTMLDivElement>(null);
  const pressedRef = useRef(false);
  const size = useSize(stage);
  const viewport = props.viewport ?? (size ? fit(frame, size) : WHOLE);
  useKeptPlace(size, props.viewport, frame, onViewport);
  const gestures = useGestures({
    stage,
    size,
    frame,
    viewport,
    hand,
    mode: asked ? 'place' : 'pan',
    pressedRef,
    onViewport,
    onPlace,
    onPass: props.onPass,
    onPress,
  });
  const width = size?.width ?? null;
  const { onMeasured } = props;
  useEffect(() => {
    if (width !== null) onMeasured?.(width);
  }, [width, onMeasured]);
  useEffect(() => {
    shownRef.current = size && { viewport, size };
  });
  const sharper = size !== null && beyondCopy(viewport, frame, copy, window.devicePixelRatio);
  return (
    <div
      ref={stage}
      className={`relative touch-none select-none overflow-hidden bg-[#000] ${className ?? ''}`}
      // the press itself must not take the focus away from the slider or a mark
      onMouseDown={(event) => event.preventDefault()}
      {...gestures}
    >
      {size && (
        <>
          <PictureLayer
            {...{ board, frame, copy, viewport }}
            fullFrameUrl={sharper ? props.fullFrameUrl : null}
          />
          <Suspense>
            <KonvaLayer
              {...{
                size,
                viewport,
                hand,
                draw,
                movable,
                asked,
                onPlace,
                onMove,
                onSelect,
                pressedRef,
              }}
            />
          </Suspense>
          {children({ viewport, size })}
        </>
      )}
    </div>
  );
}

/** Keeps the same place in the middle when the stage changes its size. */
function useKeptPlace(
  size: Size | null,
  viewport: Viewport | null,
  frame: Size,
  onViewport: (viewport: Viewport) => void,
) {
  const before = useRef<Size | null>(null);
  useEffect(() => {
    const was = before.current;
    before.current = size;
    if (!size || !was || !viewport) return;
    if (was.width === size.width && was.height === size.height) return;
    onViewport(resized(viewport, was, frame, size));
  }, [size, viewport, frame, onViewport]);
}
