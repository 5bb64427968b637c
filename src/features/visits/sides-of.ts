import type { Clip } from '#shared/contracts/clips.ts';
import type { Side } from '#shared/contracts/primitives.ts';

/** The sides that were filmed: a clip without a side of its own may hold both. Refused clips show nothing. */
export const sidesOf = (clips: readonly Pick<Clip, 'state' | 'supportSide'>[]): Side[] =>
  (['right', 'left'] as const).filter((side) =>
    clips.some(
      ({ state, supportSide }) =>
        state !== 'refused' && (supportSide === null || supportSide === side),
    ),
  );
