/** Bytes sent at a moment, ms. */
export type Sample = { at: number; bytes: number };

/** The rate is taken over so long, so that one slow second does not make the figure jump. */
const WINDOW_MS = 12_000;
/** Sooner there is nothing to go by. */
const FIRST_MS = 1_500;

/** Adds a sample and forgets those that the window has left; one older than the window stays as its start. */
export function withSample(samples: readonly Sample[], sample: Sample): Sample[] {
  const start = samples.findLastIndex(({ at }) => at <= sample.at - WINDOW_MS);
  return [...samples.slice(Math.max(0, start)), sample];
}

/** Seconds until `total` bytes are sent at the rate of the window; null where that is not known yet. */
export function secondsLeft(samples: readonly Sample[], total: number): number | null {
  const first = samples[0];
  const last = samples.at(-1);
  if (first === undefined || last === undefined || last.at - first.at < FIRST_MS) return null;
  const rate = ((last.bytes - first.bytes) / (last.at - first.at)) * 1000;
  return rate > 0 ? (total - last.bytes) / rate : null;
}
