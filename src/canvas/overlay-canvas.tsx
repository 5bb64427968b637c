import { useEffect, useRef } from 'react';
import type { Primitive } from '#shared/overlay/types.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';

/** A rectangle of the source frame, px; `u` and `v` of its upper left corner. */
export interface ShownPart {
  readonly u: number;
  readonly v: number;
  readonly width: number;
  readonly height: number;
}

/** The overlay over a picture that fills the same box and shows the same part of the source frame. */
export function OverlayCanvas({
  primitives,
  part,
}: {
  primitives: readonly Primitive[];
  part: ShownPart;
}) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const element = canvas.current;
    if (!element) return;
    const paint = () => {
      const { width, height } = element.getBoundingClientRect();
      const unit = window.devicePixelRatio || 1;
      element.width = Math.round(width * unit);
      element.height = Math.round(height * unit);
      const context = element.getContext('2d');
      if (!context || element.width === 0) return;
      const scale = element.width / part.width;
      paintOverlay(context, primitives, {
        viewport: { scale, x: -part.u * scale, y: -part.v * scale },
        bounds: { width: element.width, height: element.height },
        unit,
      });
    };
    paint();
    const observer = new ResizeObserver(paint);
    observer.observe(element);
    return () => observer.disconnect();
  }, [primitives, part]);
  return (
    <canvas
      ref={canvas}
      aria-hidden="true"
      className="pointer-events-none absolute inset-0 h-full w-full"
    />
  );
}
