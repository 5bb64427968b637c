import { VideoError, type VideoErrorCode } from '#src/video/errors.ts';
import type { RefusalCode } from './types.ts';

/**
 * - `bad-request` the request contradicts itself (a frame outside the clip, a point without keyframes)
 * - `no-exact-pictures` this browser cannot name the frame it shows, so nothing is followed
 * - `crashed` the worker ended
 * - the rest is said by `src/video`
 */
export type TrackingErrorCode = VideoErrorCode | 'bad-request' | 'no-exact-pictures' | 'crashed';

/** One sentence a coach can act on, per code of our own. */
const ADVICE = {
  'bad-request': 'These marks cannot be followed. Choose a frame and a mark within the clip.',
  'no-exact-pictures':
    'This browser cannot follow marks. Use a current Chrome, Edge, Safari or Firefox over https, or mark by hand.',
  crashed: 'Following stopped unexpectedly. Your marks are kept. Reload the page to try again.',
} as const;

type OwnCode = keyof typeof ADVICE;
const isOwn = (code: TrackingErrorCode): code is OwnCode => code in ADVICE;

/** `message` says what to do; `detail` is for logs and tests and holds no names. */
export class TrackingError extends Error {
  readonly code: TrackingErrorCode;
  readonly detail: string;

  constructor(code: TrackingErrorCode, detail = '', cause?: unknown) {
    super(isOwn(code) ? ADVICE[code] : new VideoError(code).message, { cause });
    this.name = 'TrackingError';
    this.code = code;
    this.detail = detail;
  }
}

/** What to tell the person whose touch was refused. */
export const REFUSAL_WORDS: Readonly<Record<RefusalCode, string>> = {
  'nothing-to-hold-on-to': 'Nothing to hold on to here: put a dot, or mark by hand.',
  'only-an-edge': 'Only an edge here, a mark would slide along it: put a dot, or mark by hand.',
  'at-the-border': 'Too near the edge of the picture to follow: mark by hand.',
  outside: 'This place is outside the picture.',
};
