import { cx } from '#src/ui/class-names.ts';

export interface Moment {
  readonly frame: number;
  readonly name: string;
  readonly note: string;
}

const FOCUS = 'min-h-[44px] focus-visible:z-10';

/** The moments to stop at; the one on show is marked by a bar and said. */
export function MomentButtons({
  moments,
  current,
  onShow,
}: {
  moments: readonly Moment[];
  current: number | null;
  onShow: (frame: number) => void;
}) {
  return (
    <div role="group" aria-label="Stop at" className="flex border-y border-dusk-rule">
      {moments.map(({ frame, name, note }, n) => (
        <button
          key={name}
          type="button"
          aria-pressed={current === frame}
          onClick={() => onShow(frame)}
          className={cx(
            FOCUS,
            'relative min-w-0 flex-1 border-t-[3px] px-1 py-2 text-dusk-ink',
            n > 0 && 'border-l border-l-dusk-rule',
            current === frame ? 'border-t-dusk-ink bg-dusk-2' : 'border-t-transparent',
          )}
        >
          <span className="block text-sub font-bold">{name}</span>
          <span className="block text-note text-dusk-soft">{note}</span>
        </button>
      ))}
    </div>
  );
}

const SPEEDS = [
  { rate: 0.25, sign: '¼', name: 'A quarter of the speed' },
  { rate: 0.5, sign: '½', name: 'Half the speed' },
  { rate: 1, sign: '1', name: 'Own speed' },
] as const;

export function PlayButtons({
  playing,
  rate,
  onPlay,
  onRate,
}: {
  playing: boolean;
  rate: number;
  onPlay: () => void;
  onRate: (rate: number) => void;
}) {
  return (
    <div className="flex flex-wrap items-center justify-between gap-3 px-4 py-3">
      <button
        type="button"
        onClick={onPlay}
        className={cx(
          FOCUS,
          'min-w-[9em] rounded border border-dusk-edge px-4 font-bold text-dusk-ink hover:bg-dusk-2',
        )}
      >
        {playing ? 'Stop' : 'Play in a loop'}
      </button>
      <div role="group" aria-label="Speed" className="flex rounded border border-dusk-edge">
        {SPEEDS.map(({ rate: own, sign, name }) => (
          <button
            key={own}
            type="button"
            aria-label={name}
            aria-pressed={own === rate}
            onClick={() => onRate(own)}
            className={cx(
              FOCUS,
              'relative min-w-[44px] px-3 first:rounded-l-[3px] last:rounded-r-[3px]',
              own === rate ? 'bg-dusk-ink font-bold text-dusk' : 'text-dusk-ink hover:bg-dusk-2',
            )}
          >
            {sign}
          </button>
        ))}
      </div>
    </div>
  );
}
