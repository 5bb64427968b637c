import { MediaFailure } from './failures.ts';
import { MediaRefusal } from './refusals.ts';

/** How a tool ended. Its exit code alone proves nothing: damaged input ends with 0 as well. */
export interface ToolOutcome {
  readonly exitCode: number | null;
  readonly signal: string | null;
  /** last lines of its complaints */
  readonly complaints: readonly string[];
}

/** Complaints that speak of the machine or of the limits rather than of the clip. */
export function throwForMachine(outcome: ToolOutcome): void {
  const text = outcome.complaints.join('\n');
  if (/No space left on device|Disk quota exceeded/.test(text)) throw new MediaFailure('no-space');
  if (outcome.signal === 'SIGXCPU' || outcome.signal === 'SIGXFSZ')
    throw new MediaRefusal('too-costly', {});
  if (outcome.exitCode !== 0 && /Cannot allocate memory|malloc .* failed/.test(text))
    throw new MediaRefusal('too-costly', {});
  if (
    /failed to execute|No such file or directory.*(ffmpeg|ffprobe)|(ffmpeg|ffprobe)['’]?: No such file/.test(
      text,
    )
  )
    throw new MediaFailure('tool-missing');
}

/** For the log: the last complaints without paths, which may hold a person's name. */
export const withoutPaths = (complaints: readonly string[]): string =>
  complaints
    .slice(-8)
    .join(' | ')
    .replace(/(?:\/[^\s/:'"]+)+/g, '…')
    .slice(0, 800);
