/** Engines a reading can be made with, oldest first. A stored reading names its own and keeps it. */
export const ENGINES = [1, 2, 3] as const;
export type EngineVersion = (typeof ENGINES)[number];

/** The engine of new readings and of `evaluate`: the newest that the study shows to be better. */
export const CURRENT_ENGINE: EngineVersion = 3;

/** The engine a word names; null where there is none. */
export const engineOf = (word: string | undefined): EngineVersion | null =>
  ENGINES.find((engine) => String(engine) === word) ?? null;
