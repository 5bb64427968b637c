import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { Moment } from './player-buttons.tsx';

const WORDS = [
  ['quiet', 'Quiet', 'before'],
  ['sixty', '60°', 'on the way'],
  ['ninety', '90°', 'thigh level'],
  ['top', 'Top', 'highest'],
] as const;

/** The moments that this rep has and the span shows, in their order. */
export const momentsOf = ({ moments, fromFrame, toFrame }: PublicReplay): Moment[] =>
  WORDS.flatMap(([key, name, note]) => {
    const frame = moments[key];
    return frame === null || frame < fromFrame || frame > toFrame ? [] : [{ frame, name, note }];
  });
