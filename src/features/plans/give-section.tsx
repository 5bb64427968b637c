import { Link } from 'react-router-dom';
import type { Plan } from '#shared/contracts/plans.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import type { PlanActs } from './use-plan-acts.ts';

const LABELS = {
  draft: 'Give it to the athlete',
  given: 'Given as it stands',
  'changed-since': 'Give it as it stands now',
  stopped: 'Give it again',
} as const satisfies Record<Plan['state'], string>;

/** The one act by which the athlete gets the plan, and the one that stops it. */
export function GiveSection({ plan, acts: { give, stop } }: { plan: Plan; acts: PlanActs }) {
  const { state, missing, liveLinks, visit, side } = plan;
  const say = useStatus();
  return (
    <Section
      title="To the athlete"
      margin={
        <p>
          It stands on the athlete’s replay of this side as it was when it was given. Changes here
          reach nobody until it is given again.
        </p>
      }
    >
      <div className="max-w-form rounded border border-ink p-5">
        {missing.length > 0 && (
          <ul className="mb-3">
            {missing.map((line) => (
              <li key={line}>
                <StateDot kind="wait" wrap>
                  {line}
                </StateDot>
              </li>
            ))}
          </ul>
        )}
        <p>
          {liveLinks === 0
            ? 'No replay link of this side is open: '
            : liveLinks === 1
              ? 'One replay link of this side shows it: '
              : `${liveLinks} replay links of this side show it: `}
          <Link to={`${paths.reading(visit.id, side)}#replay`} className="tap">
            {liveLinks === 0 ? 'make one' : 'open the links'}
          </Link>
        </p>
        <div className="mt-4 flex flex-wrap gap-3">
          <Button
            look="primary"
            disabled={missing.length > 0 || state === 'given'}
            busy={give.isPending}
            onClick={() =>
              give.mutate(undefined, { onSuccess: () => say('The plan is given to the athlete.') })
            }
          >
            {LABELS[state]}
          </Button>
          {(state === 'given' || state === 'changed-since') && (
            <ConfirmButton
              label="Stop the plan"
              title="Stop the plan?"
              confirm="Stop it"
              onConfirm={async () => {
                await stop.mutateAsync(undefined);
                say('The plan is stopped.');
              }}
            >
              <p>
                The athlete’s page then says that nothing of it is to be done any more. Call them
                too: a page is only seen when it is opened.
              </p>
            </ConfirmButton>
          )}
        </div>
        {give.isError && (
          <div className="mt-4">
            <ErrorState error={give.error} />
          </div>
        )}
      </div>
    </Section>
  );
}
