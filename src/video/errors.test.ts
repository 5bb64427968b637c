import { describe, expect, it } from 'vitest';
import { abortReason, VideoError } from './errors.ts';

describe('VideoError', () => {
  it('says what to do and keeps the detail apart', () => {
    const cause = new Error('socket');
    const error = new VideoError('network', 'status 503', cause);
    expect(error.message).toBe(
      'The clip could not be loaded. Check the connection, then try again.',
    );
    expect(error).toMatchObject({ code: 'network', detail: 'status 503', cause });
  });
});

describe('abortReason', () => {
  it('is the reason that was given', () => {
    const reason = new VideoError('closed');
    expect(abortReason(AbortSignal.abort(reason))).toBe(reason);
  });

  it('is an AbortError where the reason is no error', () => {
    expect(abortReason(AbortSignal.abort('left the page'))).toMatchObject({ name: 'AbortError' });
  });
});
