import type { ClipFiles } from './clip.entity.ts';

/** Everything of one clip lies under this prefix, so that deleting it leaves nothing. */
export const clipPrefix = (practiceId: string, clipId: string): string =>
  `${practiceId}/clips/${clipId}`;

export const clipFiles = (practiceId: string, clipId: string) => {
  const prefix = clipPrefix(practiceId, clipId);
  return {
    original: `${prefix}/original`,
    bench: `${prefix}/bench.mp4`,
    replay: `${prefix}/replay.mp4`,
    poster: `${prefix}/poster.jpg`,
    strip: `${prefix}/strip.jpg`,
  } as const satisfies ClipFiles;
};

/** What a replay whose head is hidden shows: by the replay, for its span, and by the version of the box. */
export const hiddenFiles = (
  practiceId: string,
  clipId: string,
  replayId: string,
  headId: string,
) => {
  const path = `${clipPrefix(practiceId, clipId)}/hidden/${replayId}-${headId}`;
  return { replay: `${path}.mp4`, poster: `${path}.jpg` } as const;
};

/** The film of a link with drawing and reading in its picture, for the athlete to keep. */
export const keptFilmKey = (practiceId: string, clipId: string, filmId: string): string =>
  `${clipPrefix(practiceId, clipId)}/kept/${filmId}.mp4`;

/** Pictures that are made when first asked for, and kept. */
export const frameKey = (practiceId: string, clipId: string, index: number): string =>
  `${clipPrefix(practiceId, clipId)}/frames/${index}.jpg`;
export const sheetKey = (practiceId: string, clipId: string, index: number): string =>
  `${clipPrefix(practiceId, clipId)}/sheets/${index}.jpg`;
