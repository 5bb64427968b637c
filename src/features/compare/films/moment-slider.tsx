import type { KeyboardEvent } from 'react';
import type { Matched } from '#shared/course/match-lifts.ts';
import { degrees } from '#src/ui/figures.ts';
import { steppedTo } from '#src/ui/stepped-to.ts';

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
