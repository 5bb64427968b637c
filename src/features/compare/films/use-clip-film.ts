import type { ClipWithFrames } from '#shared/contracts/clips.ts';
import { timesOf } from '#shared/records/engine-input.ts';
import { clipSourceOf } from '#src/api/clip-source.ts';
import { type Film, useFilm } from '#src/canvas/matched/use-film.ts';

/** The prepared copy of one clip, frame by frame. */
export const useClipFilm = (clip: ClipWithFrames): Film =>
  useFilm(clip.id, () => {
    const { copy, frames } = clip;
    return copy && frames ? clipSourceOf(clip, copy, timesOf(frames)) : null;
  });
