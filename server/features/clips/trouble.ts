import type { Clip as ClipShape, TroubleCode } from '#shared/contracts/clips.ts';
import { MediaFailure } from '#server/media/failures.ts';
import type { Clip } from './clip.entity.ts';

const RETRY_AFTER_S = [15, 60, 300, 1800] as const;

/** After so many preparations that the machine did not bring to an end, a person has to ask for the next. */
export const MOST_TRIES = RETRY_AFTER_S.length + 1;

/** @param tries begun so far, the one that failed included; null: it is not tried again by itself */
export const nextTry = (tries: number, now: Date): Date | null => {
  const seconds = RETRY_AFTER_S[Math.max(1, tries) - 1];
  return seconds === undefined ? null : new Date(now.getTime() + seconds * 1000);
};

/** Waits for a person: no further try is due. */
export const HELD = { state: 'waiting', trouble: { $ne: null }, nextTryAt: null } as const;

export const isHeld = ({ state, trouble, nextTryAt }: Clip): boolean =>
  state === 'waiting' && Boolean(trouble) && !nextTryAt;

const systemCode = (error: unknown): unknown =>
  error instanceof Error && 'code' in error ? error.code : undefined;

/** What an error of preparation means for whoever waits for the clip. */
export const troubleOf = (error: unknown): TroubleCode => {
  const code = systemCode(error);
  if (code === 'no-space' || code === 'ENOSPC' || code === 'EDQUOT') return 'no-space';
  if (error instanceof MediaFailure && code === 'tool-missing') return 'tool-missing';
  return 'machine';
};

const SENTENCES: Record<TroubleCode, string> = {
  'no-space':
    'The server’s disk is full, so this clip could not be prepared. Ask whoever runs Redshank to free some space.',
  'tool-missing':
    'The server has no ffmpeg, which prepares clips. Ask whoever runs Redshank to install it.',
  interrupted:
    'The server stopped each time while it prepared this clip, perhaps for want of memory. A shorter clip, or one of 1080p, needs less.',
  machine:
    'The server could not prepare this clip, and the fault is not the clip’s. The server’s log says more.',
};

/** The sentence of a stored trouble, told anew from its code. */
export const presentTrouble = ({
  state,
  trouble,
  nextTryAt,
}: Pick<Clip, 'state' | 'trouble' | 'nextTryAt'>): ClipShape['trouble'] =>
  state === 'waiting' && trouble
    ? { code: trouble, sentence: SENTENCES[trouble], nextTryAt: nextTryAt?.toISOString() ?? null }
    : null;
