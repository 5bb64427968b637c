import type { KeyboardEvent } from 'react';
import type { Matched } from '#shared/course/match-lifts.ts';
import { degrees } from '#src/ui/figures.ts';

const TEN = 10;

/** Where a key of the slider pattern leads; null for other keys. */
export const steppedTo = (key: string, at: number, count: number): number | null => {
  const to = {
    ArrowLeft: at - 1,
    ArrowDown: at - 1,
    ArrowRight: at + 1,
    ArrowUp: at + 1,
    PageUp: at + TEN,
    PageDown: at - TEN,
    Home: 0,
    End: count - 1,
  }[key];
  return to === undefined ? null : Math.max(0, Math.min(count - 1, to));
};

export const momentText = ({ part, first, second }: Matched): string =>
  `lift ${degrees((first.lift + second.lift) / 2, 0)}, ${part === 'rise' ? 'rising' : 'lowering'}`;

/** All matched moments in their order: the rise, then the way down. */
export function MomentSlider({
  moments,
  at,
  onGo,
}: {
  moments: readonly Matched[];
  at: number;
  onGo: (moment: number) => void;
}) {
  const now = moments[at];
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const to = steppedTo(event.key, at, moments.length);
    if (to === null) return;
    event.preventDefault();
    onGo(to);
  };
  return (
    <div className="mt-4">
      <p className="flex flex-wrap justify-between gap-x-4">
        <label htmlFor="matched-moment" className="font-bold">
          Moment
        </label>
        <span>{now && momentText(now)}</span>
      </p>
      <input
        id="matched-moment"
        type="range"
        min={0}
        max={moments.length - 1}
        value={at}
        aria-valuetext={now && momentText(now)}
        onKeyDown={onKeyDown}
        onChange={(event) => onGo(Number(event.target.value))}
        className="h-11 w-full accent-ink"
      />
    </div>
  );
}
