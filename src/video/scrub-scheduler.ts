export interface ScrubScheduler<T> {
  /** Asks for a place; replaces what was asked for and not yet begun. */
  want(place: T): void;
  /** Settles when nothing is in flight and nothing wanted. */
  idle(): Promise<void>;
  /** Forgets what was wanted and aborts what is in flight. */
  stop(): void;
}

/**
 * One request in flight, then the newest wanted: while a pointer sweeps, the frames in between are
 * never begun, and what is shown is at most one request behind the pointer.
 * `show` gets a signal that fires only on `stop`; a rejection goes to `failed` and ends nothing.
 */
export const createScrubScheduler = <T>(
  show: (place: T, signal: AbortSignal) => Promise<void>,
  failed: (error: unknown, place: T) => void,
): ScrubScheduler<T> => {
  let inFlight: Promise<void> | null = null;
  let wanted: { place: T } | null = null;
  let stopper = new AbortController();

  const drain = async (): Promise<void> => {
    while (wanted) {
      const { place } = wanted;
      wanted = null;
      const { signal } = stopper;
      try {
        await show(place, signal);
      } catch (error) {
        if (!signal.aborted) failed(error, place);
      }
    }
  };

  return {
    want(place) {
      wanted = { place };
      inFlight ??= drain().finally(() => {
        inFlight = null;
      });
    },
    async idle() {
      while (inFlight) await inFlight;
    },
    stop() {
      wanted = null;
      stopper.abort();
      stopper = new AbortController();
    },
  };
};
