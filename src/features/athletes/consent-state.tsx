import type { Athlete } from '#shared/contracts/athletes.ts';
import { daysUntil, longDay } from '#src/ui/days.ts';
import { StateDot } from '#src/ui/state-dot.tsx';

/** A consent that ends within so many days is worth asking for again. Common practice, no source. */
const SOON_DAYS = 30;

/** Whether this athlete may be filmed today, and until when. */
export function ConsentState({
  athlete,
}: {
  athlete: Pick<Athlete, 'consentedTo' | 'consentUntil' | 'assentMissing'>;
}) {
  const { consentedTo, consentUntil, assentMissing } = athlete;
  if (assentMissing) return <StateDot kind="bad">the child’s yes is missing</StateDot>;
  if (!consentedTo.includes('assessment') || consentUntil === null)
    return <StateDot kind="bad">none</StateDot>;
  return daysUntil(consentUntil) <= SOON_DAYS ? (
    <StateDot kind="wait">lapses on {longDay(consentUntil)}</StateDot>
  ) : (
    <StateDot kind="done">until {longDay(consentUntil)}</StateDot>
  );
}
