import { checkLength, type ProbedClip } from './probe.ts';
import { tickAtOrAfter } from './rational.ts';
import { MediaRefusal } from './refusals.ts';
import type { TickSpan } from './tick-span.ts';
import type { Part } from './types.ts';

/** What of a probed clip is to be prepared. */
export interface ValidClip {
  /** ticks of the frames that a sound file must yield, ascending */
  readonly expected: readonly number[];
  /** null prepares the whole clip */
  readonly span: TickSpan | null;
}

export interface ValidateOptions {
  readonly part?: Part;
  readonly acceptRemains?: boolean;
}

/**
 * Judges a clip by its numbers before anything is decoded.
 * @throws MediaRefusal truncated, damaged, part-outside, too-long
 */
export function validate(clip: ProbedClip, options: ValidateOptions = {}): ValidClip {
  if (!options.acceptRemains) checkComplete(clip);
  const { ticks } = clip.frames;
  const span = options.part ? spanOf(clip, options.part) : null;
  const expected = span ? ticks.filter((tick) => tick >= span.from && tick < span.to) : ticks;
  if (span && expected.length < 2) throw outside(clip, options.part);
  checkLength(expected.length, clip.facts);
  return { expected, span };
}

/** A file that promises more than it holds ends early, whatever its tools say. */
function checkComplete({ declaredSeconds, haveSeconds, file, facts }: ProbedClip): void {
  const perFrame = facts.duration / facts.frameCount;
  // headers round; sound may end a little after the picture
  const missing = (declaredSeconds ?? 0) - haveSeconds > Math.max(1.5 * perFrame, 0.1);
  if (!missing) {
    if (file.cut && declaredSeconds === null)
      throw new MediaRefusal('truncated', { haveSeconds: facts.duration, expectedSeconds: null });
    return;
  }
  if (!file.cut && file.demuxer === 'matroska')
    throw new MediaRefusal('damaged', {
      fromSeconds: facts.duration,
      lostFrames: null,
      haveSeconds: facts.duration,
    });
  throw new MediaRefusal('truncated', {
    haveSeconds: facts.duration,
    expectedSeconds: declaredSeconds,
  });
}

function spanOf(clip: ProbedClip, part: Part): TickSpan {
  const { timeBase, ticks: first } = clip.facts.startOffset;
  const known = Number.isFinite(part.from) && Number.isFinite(part.to);
  if (!known || part.from < 0 || part.to <= part.from || part.from >= clip.facts.duration)
    throw outside(clip, part);
  return {
    from: first + tickAtOrAfter(part.from, timeBase),
    to: first + tickAtOrAfter(part.to, timeBase),
  };
}

const outside = (clip: ProbedClip, part: Part | undefined) =>
  new MediaRefusal('part-outside', {
    from: part?.from ?? 0,
    to: part?.to ?? 0,
    seconds: clip.facts.duration,
  });
