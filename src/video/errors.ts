/**
 * What can go wrong between a clip's address and its picture on the canvas.
 *
 * - `unsupported`  this browser cannot decode the copy; a fallback may
 * - `network`      the bytes did not arrive after several tries
 * - `signed-out`   the server asks for a sign-in
 * - `gone`         the copy is no longer there, or not for this person
 * - `changed`      the copy was prepared anew while it was open
 * - `damaged`      the bytes arrived but hold no picture for that frame
 * - `mismatch`     the copy and its list of frame times do not belong together
 * - `stalled`      the decoder stopped answering, also after it was made anew
 * - `inexact`      the browser kept showing another frame than the one asked for
 * - `no-such-frame` the index lies outside the clip
 * - `closed`       the clip was closed while a frame was on its way
 */
export type VideoErrorCode =
  | 'unsupported'
  | 'network'
  | 'signed-out'
  | 'gone'
  | 'changed'
  | 'damaged'
  | 'mismatch'
  | 'stalled'
  | 'inexact'
  | 'no-such-frame'
  | 'closed';

/** One sentence a coach can act on, per code. */
const ADVICE = {
  unsupported:
    'This browser cannot show the clip frame by frame. Use a current Chrome, Edge, Safari or Firefox over https.',
  network: 'The clip could not be loaded. Check the connection, then try again.',
  'signed-out': 'You have been signed out. Sign in again to see the clip.',
  gone: 'The clip is no longer here. Go back to the visit and open it from there.',
  changed: 'The clip was prepared anew. Reload the page to see the new version.',
  damaged: 'This part of the clip cannot be read. Ask for the clip to be prepared again.',
  mismatch: 'The clip and its list of frames do not match. Ask for the clip to be prepared again.',
  stalled: 'The browser stopped decoding. Close other tabs that show video, then reload the page.',
  inexact:
    'The browser showed another frame than the one asked for. Try again, or use Chrome or Edge.',
  'no-such-frame': 'That frame lies outside the clip. Choose one within it.',
  closed: 'The clip was closed. Open it again.',
} as const satisfies Record<VideoErrorCode, string>;

/** `message` says what to do; `detail` is for logs and tests and holds no names. */
export class VideoError extends Error {
  readonly code: VideoErrorCode;
  readonly detail: string;

  constructor(code: VideoErrorCode, detail = '', cause?: unknown) {
    super(ADVICE[code], { cause });
    this.name = 'VideoError';
    this.code = code;
    this.detail = detail;
  }
}

/** What an aborted wait rejects with; the same as `fetch` gives, so that callers treat both alike. */
export const abortReason = (signal: AbortSignal): Error =>
  signal.reason instanceof Error
    ? signal.reason
    : new DOMException('The frame is no longer wanted.', 'AbortError');
