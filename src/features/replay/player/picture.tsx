import type { RefObject } from 'react';
import type { Primitive } from '#shared/overlay/types.ts';
import { OverlayCanvas } from '#src/canvas/overlay-canvas.tsx';
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
      <OverlayCanvas primitives={primitives} part={crop} />
    </div>
  );
}
