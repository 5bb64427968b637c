import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Navigate, useNavigate, useParams } from 'react-router-dom';
import { side as sideShape, type Side } from '#shared/contracts/primitives.ts';
import type { PlanStart } from '#shared/contracts/plans.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { planOptions, plansKey, planStartOptions } from '#src/api/plans.queries.ts';
import { ApiProblem, isProblem } from '#src/api/problem.ts';
import { useMay } from '#src/api/use-may.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { shortDay } from '#src/ui/days.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { CautionsOf } from './cautions-of.tsx';
import { FindingCard } from './finding-card.tsx';

/** What a plan of one side could start from; with a plan there already, the way to it. */
export function PlanStartPage() {
  const { id = '', side: asked } = useParams();
  const side = sideShape.safeParse(asked);
  if (!side.success)
    return (
      <Page title="Plan">
        <ErrorState error={new ApiProblem('not-found')} />
      </Page>
    );
  return <OfSide key={`${id} ${side.data}`} visitId={id} side={side.data} />;
}

function OfSide({ visitId, side }: { visitId: string; side: Side }) {
  const start = useQuery(planStartOptions(visitId, side));
  if (start.data?.planId) return <Navigate replace to={paths.plan(start.data.planId)} />;
  if (start.data) return <Start start={start.data} />;
  if (isProblem(start.error, 'call-first'))
    return (
      <Page
        title="Plan"
        crumbs={[{ label: 'visit', to: paths.visit(visitId) }, { label: `${side} side` }]}
      >
        <Empty
          title="The call by eye comes first"
          action={
            <ButtonLink look="primary" to={paths.call(visitId, side)}>
              Make the call
            </ButtonLink>
          }
        >
          A plan starts from what was seen or measured, standing on the {side} leg.
        </Empty>
      </Page>
    );
  return (
    <Page title="Plan">
      {start.isError ? (
        <ErrorState error={start.error} onRetry={() => void start.refetch()} />
      ) : (
        <Loading label="Loading what was found" />
      )}
    </Page>
  );
}

function Start({ start }: { start: PlanStart }) {
  const { athlete, visit, side, findings } = start;
  const mayEdit = useMay(start.coachId)('plan.edit');
  const client = useQueryClient();
  const navigate = useNavigate();
  const make = useMutation({
    mutationFn: (from: 'reading' | 'call') =>
      call(routes.makePlan, { params: { id: visit.id, side }, body: { from } }),
    onSuccess: (plan) => {
      client.setQueryData(planOptions(plan.id).queryKey, plan);
      void client.invalidateQueries({ queryKey: plansKey });
      void navigate(paths.plan(plan.id), { replace: true });
    },
  });
  return (
    <Page
      title={`Plan for ${athlete.name}`}
      crumbs={[
        { label: athlete.name, to: paths.athlete(athlete.id) },
        { label: `visit of ${shortDay(visit.day)}`, to: paths.visit(visit.id) },
        { label: `${side} side`, to: paths.reading(visit.id, side) },
        { label: 'plan' },
      ]}
      lead={`Standing on the ${side} leg. Choose what the plan starts from; the rules suggest, you decide.`}
    >
      <CautionsOf of={start} />
      <Section
        title="What was found"
        first
        margin={
          <p>
            An aid to trained judgement, not a diagnosis. Local codes and licensed practice come
            first.
          </p>
        }
      >
        <ul>
          {findings.map((finding) => (
            <FindingCard
              key={finding.basis.kind}
              finding={finding}
              action={
                mayEdit && (
                  <Button
                    look={finding === findings[0] ? 'primary' : 'secondary'}
                    busy={make.isPending}
                    onClick={() => make.mutate(finding.basis.kind)}
                  >
                    {finding.suggestion.kind === 'plan'
                      ? 'Make this plan'
                      : 'Plan the retest alone'}
                  </Button>
                )
              }
            />
          ))}
        </ul>
        {!mayEdit && <p className="mt-4 text-soft">The athlete’s coach makes the plan.</p>}
        {make.isError && (
          <div className="mt-4">
            <ErrorState error={make.error} />
          </div>
        )}
      </Section>
    </Page>
  );
}
