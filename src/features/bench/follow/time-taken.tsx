import { useStore } from 'zustand';
import { decimal } from '#src/ui/figures.ts';
import { useBenchDocument, useBenchTools } from '../bench-context.ts';
import { useReading } from '../reading/use-reading.ts';
import type { Clock, Following } from './following.ts';

/** `42 s`, `3 min 5 s`. */
export const spell = (ms: number): string => {
  const seconds = Math.max(1, Math.round(ms / 1000));
  const minutes = Math.floor(seconds / 60);
  return minutes === 0 ? `${seconds} s` : `${minutes} min ${seconds % 60} s`;
};

/** How long each part took, as far as it was done since the Bench was opened; null where none was. */
export const timeWords = (
  { firstTouch, lastTouch, followed, looked }: Clock,
  readingMs: number | null,
  preparedSeconds: number | null,
): string | null => {
  if (firstTouch === null || lastTouch === null || followed === null) return null;
  const parts = [
    preparedSeconds === null ? null : `preparing the clip ${spell(1000 * preparedSeconds)}`,
    `marking ${spell(lastTouch - firstTouch)}`,
    `following ${spell(followed - lastTouch)}`,
    looked === null || looked < followed ? null : `looking ${spell(looked - followed)}`,
    readingMs === null ? null : `the reading ${decimal(readingMs / 1000)} s`,
  ].filter((part) => part !== null);
  return `This took: ${parts.join(', ')}.`;
};

export function TimeTaken() {
  const { follow } = useBenchTools();
  return follow ? <Taken follow={follow} /> : null;
}

function Taken({ follow }: { follow: Following }) {
  const clock = useStore(follow.store, (state) => state.clock);
  const { tookMs } = useReading();
  const { clip } = useBenchDocument();
  const words = timeWords(clock, tookMs, clip.preparedSeconds);
  return words === null ? null : <p className="mt-2 text-soft">{words}</p>;
}
