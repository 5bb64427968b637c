import { useEffect, useRef, type RefObject } from 'react';
import type { Primitive } from '#shared/overlay/types.ts';
import { paintOverlay } from '#src/canvas/overlay-painter.ts';
import type { Crop } from './crop.ts';

/** The video with the overlay over it, both showing the same part of the source frame. */
export function Picture({
  video,
  src,
  poster,
  label,
  size,
  crop,
  primitives,
  onFailed,
}: {
  video: RefObject<HTMLVideoElement | null>;
  src: string;
  poster: string;
  label: string;
  /** Of the source frame, px. */
  size: { readonly width: number; readonly height: number };
  crop: Crop;
  primitives: readonly Primitive[];
  onFailed: () => void;
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
      const scale = element.width / crop.width;
      paintOverlay(context, primitives, {
        viewport: { scale, x: -crop.u * scale, y: -crop.v * scale },
        bounds: { width: element.width, height: element.height },
        unit,
      });
    };
    paint();
    const observer = new ResizeObserver(paint);
    observer.observe(element);
    return () => observer.disconnect();
  }, [primitives, crop]);
  return (
    <div
      className="relative mx-auto w-full overflow-hidden print:hidden"
      style={{
        aspectRatio: `${crop.width} / ${crop.height}`,
        maxWidth: `calc(72dvh * ${crop.width / crop.height})`,
      }}
    >
      <video
        ref={video}
        src={src}
        poster={poster}
        muted
        playsInline
        preload="auto"
        aria-label={label}
        onError={onFailed}
        className="absolute max-w-none"
        style={{
          width: `${(100 * size.width) / crop.width}%`,
          height: `${(100 * size.height) / crop.height}%`,
          left: `${(-100 * crop.u) / crop.width}%`,
          top: `${(-100 * crop.v) / crop.height}%`,
        }}
      />
      <canvas ref={canvas} aria-hidden="true" className="absolute inset-0 h-full w-full" />
    </div>
  );
}
