import { MOMENT_ORDER } from '#shared/records/engine-input.ts';
import { Problem } from '../../http/problem.ts';
import type { HandBoundaries } from './rep.entity.ts';

const WORDS = {
  quietStart: 'the start of the quiet stance',
  quietEnd: 'the end of the quiet stance',
  footOff: 'foot off',
  top: 'the top',
  topEnd: 'the end of the top',
  footDown: 'foot down',
} as const satisfies Record<(typeof MOMENT_ORDER)[number], string>;

/**
 * Moments that hands have moved must lie inside the rep and follow each other; two may share a frame, but for a
 * foot that is off and down.
 * @throws Problem 'boundaries-out-of-order'
 */
export const needOrder = (
  { startFrame, endFrame }: { readonly startFrame: number; readonly endFrame: number },
  moved: HandBoundaries,
): void => {
  if (endFrame <= startFrame)
    throw new Problem('boundaries-out-of-order', 'A rep ends after it starts.');
  let last: { frame: number; words: string } = { frame: startFrame, words: 'the start of the rep' };
  for (const moment of MOMENT_ORDER) {
    const frame = moved[moment];
    if (frame === undefined) continue;
    if (frame < last.frame)
      throw new Problem(
        'boundaries-out-of-order',
        `Frame ${frame} for ${WORDS[moment]} lies before ${last.words}, frame ${last.frame}.`,
      );
    last = { frame, words: WORDS[moment] };
  }
  if (last.frame > endFrame)
    throw new Problem(
      'boundaries-out-of-order',
      `Frame ${last.frame} for ${last.words} lies behind the end of the rep, frame ${endFrame}.`,
    );
};
