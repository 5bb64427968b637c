import {
  gatesOf,
  type ReadingRules,
  sameGates,
  STANDARD_GATES,
  STANDARD_RULES,
} from '#shared/protocol/protocol.ts';
import { gateRange } from '#src/ui/gate-words.ts';
import { Caution } from '#src/ui/states.tsx';

/** What the study does not speak for; nothing where it speaks for all. */
export function Unstudied({ rules }: { rules: ReadingRules }) {
  const other = !sameGates(gatesOf(rules), STANDARD_GATES);
  const lowered = (['early', 'before', 'turnIn', 'flat'] as const).some(
    (limit) => rules[limit] < STANDARD_RULES[limit],
  );
  if (!other && !lowered) return null;
  return (
    <div className="mt-4 max-w-lead space-y-3">
      {other && (
        <Caution title={`Worked out for ${gateRange(STANDARD_GATES)} only.`}>
          The assumed errors, the smallest change that can be told from none, and how often an early
          turn is found hold for these gates. With others every reading says so, and its ± is a
          guide. Readings between different gates are not compared.
        </Caution>
      )}
      {lowered && (
        <Caution title="Less sure than the study.">
          A reading that needs less is found more often and is wrong more often. Every reading says
          so.
        </Caution>
      )}
    </div>
  );
}
