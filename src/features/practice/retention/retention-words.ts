import type { ErasureReason } from '#shared/contracts/retention.ts';

const count = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;

/** `1.2 GB`: steps of a thousand, as file managers count. */
export const bytesWords = (bytes: number): string => {
  const [unit, per] = bytes >= 1e9 ? ['GB', 1e9] : bytes >= 1e6 ? ['MB', 1e6] : ['kB', 1e3];
  return `${(bytes / Number(per)).toFixed(bytes >= 1e9 ? 1 : 0)} ${unit}`;
};

/** What goes with somebody: `3 visits, 5 clips (1.2 GB)`. */
export const heldWords = ({
  visits,
  clips,
  bytes,
}: {
  visits: number;
  clips: number;
  bytes: number;
}): string =>
  `${count(visits, 'visit', 'visits')}, ${clips === 0 ? 'no clip' : `${count(clips, 'clip', 'clips')} (${bytesWords(bytes)})`}`;

export const WHY_WORDS: Record<ErasureReason, string> = {
  asked: 'asked for',
  withdrawn: 'filming was withdrawn',
  term: 'the term ended',
};
