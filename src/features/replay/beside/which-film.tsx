import type { EarlierLift } from '#shared/contracts/replay-parts.ts';
import { shortDay } from '#src/ui/days.ts';
import { cx } from '#src/ui/class-names.ts';

/** This lift alone, or the earlier one beside it. */
export function WhichFilm({
  before,
  beside,
  onChoose,
}: {
  before: EarlierLift;
  beside: boolean;
  onChoose: (beside: boolean) => void;
}) {
  if (before.head !== 'shown' && before.head !== 'hidden')
    return (
      <p className="bg-dusk px-4 py-2 text-note text-dusk-soft print:hidden">
        Your lift of {shortDay(before.visitDay)} stands here beside this one once its film is
        prepared. Look in again later.
      </p>
    );
  const choices = [
    [false, 'This lift'],
    [true, `Beside ${shortDay(before.visitDay)}`],
  ] as const;
  return (
    <div role="group" aria-label="Film" className="flex bg-dusk print:hidden">
      {choices.map(([value, words]) => (
        <button
          key={words}
          type="button"
          aria-pressed={beside === value}
          onClick={() => onChoose(value)}
          className={cx(
            'relative min-h-[44px] flex-1 border-b-[3px] px-2 focus-visible:z-10',
            beside === value
              ? 'border-b-dusk-ink font-bold text-dusk-ink'
              : 'border-b-transparent text-dusk-soft hover:bg-dusk-2',
          )}
        >
          {words}
        </button>
      ))}
    </div>
  );
}
