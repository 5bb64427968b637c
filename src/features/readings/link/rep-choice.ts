import type { NamedRep } from '../side-clips.ts';

/** `Rep 2`, with the clip's name where the side has several clips, and whether it was left out. */
export const repChoice = ({ rep, clip }: NamedRep, severalClips: boolean): string =>
  [
    `Rep ${rep.number}`,
    severalClips ? ` of ${clip.name}` : '',
    rep.excluded === null ? '' : ' (left out)',
    rep.markedFrames === 0 ? ' (not marked)' : '',
  ].join('');
