import { deriveReading } from '#shared/reading/derive.ts';
import { type FrameOffer, nextFrames, type UnmarkedFrame } from '#shared/reading/next-frame.ts';
import type { ReadingInput, ReadingResult } from '#shared/reading/types.ts';

/** The reading's thousands of draws, away from the page. */
export interface ReadingQuestion {
  readonly n: number;
  readonly input: ReadingInput;
  readonly unmarked: readonly UnmarkedFrame[];
}
export interface ReadingAnswer {
  readonly n: number;
  readonly result: ReadingResult;
  /** The best few; a page shows one. */
  readonly offers: readonly FrameOffer[];
}

const OFFERS = 5;

addEventListener('message', (event: MessageEvent<ReadingQuestion>) => {
  const { n, input, unmarked } = event.data;
  const result = deriveReading(input);
  const answer: ReadingAnswer = {
    n,
    result,
    offers: nextFrames(result, unmarked).slice(0, OFFERS),
  };
  postMessage(answer);
});
