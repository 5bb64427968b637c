/** A person of the practice who has the same clip open. */
export interface Other {
  readonly id: string;
  readonly name: string;
  /** When they last said so, ms of this tab's clock. */
  readonly at: number;
}

/** How often a tab says that it has the clip open, ms. */
export const SAY_EVERY_MS = 25_000;
/** Three times unheard: gone without a word, as with a lost connection. A hidden tab speaks once a minute. */
const FORGET_AFTER_MS = 3 * SAY_EVERY_MS;

/** The others after one of them spoke. */
export const heard = (
  others: readonly Other[],
  {
    by,
    here,
  }: { readonly by: { readonly id: string; readonly name: string }; readonly here: boolean },
  now: number,
): readonly Other[] => {
  const rest = others.filter(({ id }) => id !== by.id);
  return here ? [...rest, { ...by, at: now }] : rest;
};

/** Those who have said so lately; the same list where nobody is to be forgotten. */
export const stillHere = (others: readonly Other[], now: number): readonly Other[] => {
  const left = others.filter(({ at }) => now - at < FORGET_AFTER_MS);
  return left.length === others.length ? others : left;
};

/** `Ines Falk is on this clip too`; null where nobody is. */
export const othersWords = (others: readonly Other[]): string | null => {
  const [first, second, ...more] = [...others].sort((a, b) => a.name.localeCompare(b.name));
  if (!first) return null;
  if (!second) return `${first.name} is on this clip too`;
  if (more.length === 0) return `${first.name} and ${second.name} are on this clip too`;
  return `${first.name} and ${more.length + 1} others are on this clip too`;
};
