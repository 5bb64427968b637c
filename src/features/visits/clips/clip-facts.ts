import type { Clip } from '#shared/contracts/clips.ts';
import { fileSize } from '#src/ui/figures.ts';

/** `240 frames per second, 1080 × 1920, 7.2 s`; null until the clip was looked into. */
export function factsOfClip(clip: Clip): string | null {
  const { frameRate, width, height, durationSeconds } = clip;
  const parts = [
    frameRate === null
      ? null
      : frameRate.variable
        ? `about ${Math.round(frameRate.perSecond)} frames per second, varying`
        : `${Math.round(frameRate.perSecond)} frames per second`,
    width === null || height === null ? null : `${width} × ${height}`,
    durationSeconds === null ? null : `${durationSeconds.toFixed(1)} s`,
  ].filter((part) => part !== null);
  return parts.length === 0 ? null : parts.join(', ');
}

/** `IMG_2290.MOV, 48 MB, mirrored, two reps` */
export function fileLine(clip: Clip): string {
  const reps = clip.repCount === 0 ? null : clip.repCount === 1 ? '1 rep' : `${clip.repCount} reps`;
  return [clip.name, fileSize(clip.bytes), clip.mirrored ? 'mirrored' : null, reps]
    .filter((part) => part !== null)
    .join(', ');
}
