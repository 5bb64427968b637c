import type { Plan } from '#shared/contracts/plans.ts';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { Fold } from '#src/ui/fold.tsx';
import { FindingCard } from './finding-card.tsx';
import type { PlanActs } from './use-plan-acts.ts';

/** What is found otherwise, or was found since: the plan can be based on that instead. */
export function OtherFindings({ plan, again }: { plan: Plan; again: PlanActs['again'] | null }) {
  if (plan.findings.length === 0) return null;
  const measured = plan.findings.some(({ basis }) => basis.kind === 'reading');
  const since =
    plan.basis.kind === 'reading' ? 'The reading now says something else' : 'What was measured';
  return (
    <div className="mt-3">
      <Fold title={measured ? since : 'What was seen by eye'}>
        <ul className="mt-2">
          {plan.findings.map((finding) => (
            <FindingCard
              key={finding.basis.kind}
              finding={finding}
              action={
                again && (
                  <ConfirmButton
                    look="secondary"
                    label="Base the plan on this"
                    title="Base the plan on this?"
                    confirm="Suggest anew"
                    onConfirm={() => again.mutateAsync(finding.basis.kind)}
                  >
                    <p>
                      The exercises are suggested anew: doses, order and cues that you changed here
                      go. What the athlete has got, ticks and answers stay.
                    </p>
                  </ConfirmButton>
                )
              }
            />
          ))}
        </ul>
      </Fold>
    </div>
  );
}
