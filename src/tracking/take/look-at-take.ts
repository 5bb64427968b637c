import { type Seconds, seconds } from '#shared/timing/units.ts';
import { dotsOn } from './dots.ts';
import { seeTake, type TakeJudged } from './judge-take.ts';
import type { TakeSource } from './take-source.ts';
import { type Answer, cannotTell, type TakePicture } from './types.ts';

export interface TakeLook extends TakeJudged {
  readonly dots: Answer<{ readonly dots: number }>;
  /** Of the clip, from its start; shorter than the clip where the time was up. */
  readonly lookedAt: Seconds;
  readonly length: Seconds;
}

/** How far: as much as is seen while a person waits beside it, or all of it however long that takes. */
export type Reach = 'quick' | 'whole';

/** What is not seen by then is left out, and said to be. */
const PATIENCE_MS: Record<Reach, number> = { quick: 8000, whole: Infinity };

/** Rejects with what the source rejects with. */
export const lookAtTake = async (
  source: TakeSource,
  reach: Reach,
  now: () => number,
): Promise<TakeLook> => {
  const until = now() + PATIENCE_MS[reach];
  const pictures: TakePicture[] = [];
  for await (const picture of source.pictures()) {
    pictures.push(picture);
    if (now() > until) break;
  }
  const { judged, movement, stillPicture } = seeTake(pictures);
  const still = stillPicture === null ? undefined : pictures[stillPicture];
  const dots =
    movement && still
      ? dotsOn(movement, await source.whole(still.at))
      : cannotTell(judged.still.told === 'cannot-tell' ? judged.still.why : 'never-still');
  const [last, before] = [pictures.at(-1), pictures.at(-2)];
  const step = last && before ? last.at - before.at : 0;
  return {
    ...judged,
    dots,
    length: source.length,
    lookedAt: seconds(Math.min(source.length, (last?.at ?? 0) + step)),
  };
};
