import { useState } from 'react';
import { dayBack, longDay } from '#src/ui/days.ts';

const DAYS = 7;

const weekday = (day: string) =>
  new Intl.DateTimeFormat('en-GB', { weekday: 'short' }).format(new Date(`${day}T12:00:00`));

/** The last seven days, each to be tapped once the exercise was done on it; today comes last. */
export function TickDays({
  name,
  done,
  onTick,
}: {
  name: string;
  done: readonly string[];
  onTick: (day: string) => Promise<void>;
}) {
  const [sending, setSending] = useState<string | null>(null);
  const days = Array.from({ length: DAYS }, (_, n) => dayBack(DAYS - 1 - n));
  const tick = async (day: string) => {
    if (sending !== null) return;
    setSending(day);
    await onTick(day);
    setSending(null);
  };
  return (
    <fieldset className="mt-4 print:hidden">
      <legend className="text-note text-soft">
        Done on<span className="sr-only">, {name}</span>
      </legend>
      <div className="mt-1 grid max-w-[480px] grid-cols-7 gap-1">
        {days.map((day, n) => {
          const pressed = done.includes(day);
          return (
            <button
              key={day}
              type="button"
              aria-pressed={pressed}
              aria-busy={sending === day || undefined}
              aria-label={n === DAYS - 1 ? `today, ${longDay(day)}` : longDay(day)}
              onClick={() => void tick(day)}
              className={`flex min-h-[56px] flex-col items-center justify-center rounded border text-caption ${
                pressed
                  ? 'border-reed bg-reed-pale font-bold text-ink'
                  : n === DAYS - 1
                    ? 'border-ink text-ink'
                    : 'border-edge text-soft'
              }`}
            >
              <span>{n === DAYS - 1 ? 'today' : weekday(day)}</span>
              <svg width="16" height="16" viewBox="0 0 16 16" aria-hidden="true">
                {pressed ? (
                  <path
                    d="M3 8.5 6.5 12 13 4.5"
                    fill="none"
                    stroke="currentColor"
                    strokeWidth="2.4"
                  />
                ) : (
                  <circle cx="8" cy="8" r="2" fill="currentColor" />
                )}
              </svg>
            </button>
          );
        })}
      </div>
    </fieldset>
  );
}
