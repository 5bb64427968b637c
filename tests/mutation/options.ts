export interface MutationOptions {
  readonly rooms: readonly string[];
  /** Names of files without their ending; empty: all of the rooms. */
  readonly files: readonly string[];
  /** How many mutants, drawn by the seed; null: all. */
  readonly sample: number | null;
  readonly seed: number;
  /** Without the slow tests, which few faults need. */
  readonly quick: boolean;
}

export const ROOMS = ['measures', 'course', 'reading'] as const;
export const USAGE =
  'npm run mutate -- [--room measures|course|reading]… [--file NAME]… [--sample N] [--seed N] [--quick]';

/** Options of the command line; null where one is unknown or not a whole number. */
export const mutationOptions = (given: readonly string[]): MutationOptions | null => {
  const args = given.filter((word) => word !== '--quick');
  const rooms: string[] = [];
  const files: string[] = [];
  let sample: number | null = null;
  let seed = 1;
  for (let i = 0; i < args.length; i += 2) {
    const value = args[i + 1];
    if (value === undefined) return null;
    const number = Number(value);
    const whole = Number.isInteger(number) && number >= 1;
    if (args[i] === '--room' && ROOMS.some((room) => room === value)) rooms.push(value);
    else if (args[i] === '--file') files.push(value);
    else if (args[i] === '--sample' && whole) sample = number;
    else if (args[i] === '--seed' && whole) seed = number;
    else return null;
  }
  return {
    rooms: rooms.length > 0 ? rooms : ROOMS,
    files,
    sample,
    seed,
    quick: args.length < given.length,
  };
};
