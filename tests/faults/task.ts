import type { Place } from './place.ts';

/** What somebody does while a part of the instance is killed. */
export interface Task {
  readonly name: string;
  /** The kill comes within so many milliseconds of its beginning. */
  readonly within: number;
  /** Sets up what it needs, with everything running. */
  readonly prepare: (place: Place) => Promise<{
    /** Goes on, as a person's browser would, until all of it was acknowledged. */
    readonly act: () => Promise<void>;
    /** @throws where something that was acknowledged is not there */
    readonly kept: () => Promise<void>;
  }>;
}
