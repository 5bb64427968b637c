/** After so many a piece of work is given up until a person asks for it again. */
export const MOST_TRIES = 4;

/**
 * The count with one more try; null where there is none left. Work that was begun as often as may be and neither
 * ended nor failed took its worker along each time, and might take the next one as well.
 */
export const withNextTry = (tries: number): number | null =>
  tries >= MOST_TRIES ? null : tries + 1;

/** The count after an error, and whether that was the last try. A worker's stop is no try. */
export const afterError = (
  tries: number,
  { aborted }: Pick<AbortSignal, 'aborted'>,
): { readonly tries: number; readonly wasLast: boolean } =>
  aborted
    ? { tries: Math.max(0, tries - 1), wasLast: false }
    : { tries, wasLast: tries >= MOST_TRIES };
