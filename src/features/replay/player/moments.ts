import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { Moment } from './player-buttons.tsx';

const wordsOf = ({ from, to }: Gates) =>
  [
    ['quiet', 'Quiet', 'before'],
    ['from', `${from}°`, 'on the way'],
    ['to', `${to}°`, to === 90 ? 'thigh level' : 'thigh up'],
    ['top', 'Top', 'highest'],
  ] as const;

/** The moments that this rep has and the span shows, in their order. */
export const momentsOf = ({ moments, gates, fromFrame, toFrame }: PublicReplay): Moment[] =>
  wordsOf(gates).flatMap(([key, name, note]) => {
    const frame = moments[key];
    return frame === null || frame < fromFrame || frame > toFrame ? [] : [{ frame, name, note }];
  });
