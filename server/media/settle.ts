import { type FrameMatch, matchFrames } from './match-frames.ts';
import type { ProbedClip } from './probe.ts';
import { MediaRefusal } from './refusals.ts';
import type { FrameTable } from './types.ts';
import type { ValidClip } from './validate.ts';

/** What came out of decoding. */
export interface Decoded {
  readonly frames: FrameTable;
  /** frames that ffmpeg itself calls corrupt */
  readonly corruptFrames: number;
}

/** Frames between a key frame and the part after it may lean on pictures before that key frame. */
const corruptBeforePart = 16;

/**
 * Compares decoded with promised frames; the tools' exit code says nothing about it.
 * @throws MediaRefusal truncated, damaged, only-header where frames are lost and that was not accepted;
 * no-timestamps where a frame came out at an instant that was not promised
 */
export function settle(
  clip: ProbedClip,
  { expected, span }: ValidClip,
  decoded: Decoded,
  acceptRemains: boolean,
): FrameMatch {
  const match = matchFrames(expected, clip.picture.timeBase, decoded.frames);
  // its own frames contradict its list of them
  if (!match) throw new MediaRefusal('no-timestamps', {});
  const tolerated = clip.discarded + (span ? corruptBeforePart : 0);
  const corrupt = Math.max(0, decoded.corruptFrames - tolerated);
  if (decoded.frames.ticks.length < 2) throw new MediaRefusal('only-header', {});
  if (acceptRemains || match.lost.length + corrupt === 0) return match;

  const perFrame = clip.facts.duration / clip.facts.frameCount;
  const haveSeconds = (decoded.frames.us.at(-1) ?? 0) / 1e6 + perFrame;
  const firstLost = match.lost[0];
  const atEndOnly = firstLost !== undefined && firstLost === expected.length - match.lost.length;
  if (clip.file.cut && atEndOnly && corrupt === 0)
    throw new MediaRefusal('truncated', {
      haveSeconds,
      expectedSeconds: clip.declaredSeconds ?? clip.facts.duration,
    });
  throw new MediaRefusal('damaged', {
    fromSeconds: firstLost === undefined ? null : secondsAt(clip, expected[firstLost]),
    lostFrames: match.lost.length + corrupt,
    haveSeconds: haveSeconds - (match.lost.length - (atEndOnly ? match.lost.length : 0)) * perFrame,
  });
}

const secondsAt = ({ facts, picture }: ProbedClip, tick = facts.startOffset.ticks) =>
  ((tick - facts.startOffset.ticks) * picture.timeBase.num) / picture.timeBase.den;
