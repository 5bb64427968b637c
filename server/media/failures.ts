/** Faults of the machine or of the caller, not of the clip: the same file may well work later. */
export type MediaFailureCode =
  /** the caller's signal was raised */
  | 'cancelled'
  /** ffmpeg or ffprobe is not installed */
  | 'tool-missing'
  | 'no-space'
  /** no frame of the original stands at the asked time */
  | 'frame-not-found'
  /** ffmpeg did something that its arguments do not explain */
  | 'tool-failed';

const sentences: Record<MediaFailureCode, string> = {
  cancelled: 'The work was cancelled.',
  'tool-missing': 'ffmpeg and ffprobe are not installed: apt-get install ffmpeg.',
  'no-space': 'The disk is full: free some space, then prepare the clip again.',
  'frame-not-found': 'The original holds no frame at this time.',
  'tool-failed': 'ffmpeg stopped without a reason that is known here.',
};

/** `detail` is for the log: tool output without the clip's name. */
export class MediaFailure extends Error {
  override readonly name = 'MediaFailure';
  readonly code: MediaFailureCode;
  readonly detail: string;

  constructor(code: MediaFailureCode, detail = '') {
    super(sentences[code]);
    this.code = code;
    this.detail = detail;
  }
}
