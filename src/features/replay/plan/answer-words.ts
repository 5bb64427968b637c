import type { Answered } from '../replay-api.ts';

/** What to do where an answer was not kept. */
export const NOT_KEPT: Record<Exclude<Answered, 'kept' | 'gone'>, string> = {
  changed: 'Your plan has changed meanwhile. Load this page again.',
  'too-many-tries': 'That were many answers at once. Wait a quarter of an hour, then try again.',
  offline: 'There is no connection, so it is not sent. Try again when there is one.',
  broken: 'It could not be sent. Try again in a minute.',
};
