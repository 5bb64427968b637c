import type { Erasure } from '#shared/contracts/retention.ts';
import { moment } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';
import { heldWords, WHY_WORDS } from './retention-words.ts';

/** That somebody was erased, and how much; who it was is known no more. */
export function ErasuresSection({ erasures }: { erasures: readonly Erasure[] }) {
  return (
    <Section title="Erased" margin={<p>No name is kept. The number is that of the audit trail.</p>}>
      {erasures.length === 0 ? (
        <p className="text-soft">Nobody was erased yet.</p>
      ) : (
        <ul>
          {erasures.map((erasure) => (
            <li key={erasure.id} className="border-b border-rule py-2.5 first:pt-0 last:border-0">
              {erasure.doneAt === null ? (
                <StateDot kind="wait">being erased: files are still being deleted</StateDot>
              ) : (
                <StateDot kind="done">erased {moment(erasure.doneAt)}</StateDot>
              )}
              <p className="text-note text-soft">
                {heldWords(erasure)}; {WHY_WORDS[erasure.why]}
                {erasure.askedBy ? ` by ${erasure.askedBy.name}` : ''}.{' '}
                <span className="break-all">{erasure.athleteId}</span>
              </p>
            </li>
          ))}
        </ul>
      )}
    </Section>
  );
}
