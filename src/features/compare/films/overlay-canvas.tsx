import { useEffect, useRef } from 'react';
import type { Primitive } from '#shared/overlay/types.ts';
import { paintOverlay } from '#src/canvas/overlay-painter.ts';
import type { Size } from '#src/canvas/viewport.ts';

/** The overlay over a picture that fills the same box. */
export function OverlayCanvas({
  primitives,
  size,
}: {
  primitives: readonly Primitive[];
  /** Of the source frame, px. */
  size: Size;
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
      paintOverlay(context, primitives, {
        viewport: { scale: element.width / size.width, x: 0, y: 0 },
        bounds: { width: element.width, height: element.height },
        unit,
      });
    };
    paint();
    const observer = new ResizeObserver(paint);
    observer.observe(element);
    return () => observer.disconnect();
  }, [primitives, size]);
  return (
    <canvas
      ref={canvas}
      aria-hidden="true"
      className="pointer-events-none absolute inset-0 h-full w-full"
    />
  );
}
