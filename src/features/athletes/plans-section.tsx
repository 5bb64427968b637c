import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Athlete } from '#shared/contracts/athletes.ts';
import type { PlanRow } from '#shared/contracts/plans.ts';
import { athletePlansOptions } from '#src/api/plans.queries.ts';
import { isProblem } from '#src/api/problem.ts';
import { useMay } from '#src/api/use-may.ts';
import { distance, shortDay } from '#src/ui/days.ts';
import { howOften } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { StateDot, type StateKind } from '#src/ui/state-dot.tsx';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';

const STATES: Record<PlanRow['state'], [StateKind, string]> = {
  draft: ['wait', 'not given yet'],
  given: ['done', 'given'],
  'changed-since': ['wait', 'changed since it was given'],
  stopped: ['bad', 'stopped'],
};

/** Every plan of this athlete, what was answered to it, and when the retest is. */
export function PlansSection({ athlete }: { athlete: Athlete }) {
  const plans = useQuery(athletePlansOptions(athlete.id));
  const may = useMay(athlete.coach.id);
  // what was filmed is closed: the page says so elsewhere
  if (isProblem(plans.error, 'consent-withdrawn', 'supervision-not-agreed')) return null;
  return (
    <Section id="plans" title="Plans" note="what to do until the retest">
      {plans.isError && !plans.data && (
        <ErrorState error={plans.error} onRetry={() => void plans.refetch()} />
      )}
      {plans.isPending && (
        <Loading label="Loading the plans">
          <SkeletonLines count={2} />
        </Loading>
      )}
      {plans.data?.items.length === 0 && (
        <Empty title="No plan yet">
          A plan starts on the page of one side, from its reading or from what was seen.
        </Empty>
      )}
      <ul>
        {plans.data?.items.map((plan) => (
          <OnePlan
            key={plan.id}
            plan={plan}
            athleteId={athlete.id}
            mayFilm={may('visit.add') && athlete.consentedTo.includes('assessment')}
          />
        ))}
      </ul>
    </Section>
  );
}

function OnePlan({
  plan,
  athleteId,
  mayFilm,
}: {
  plan: PlanRow;
  athleteId: string;
  mayFilm: boolean;
}) {
  const { id, visit, side, state, exercises, retest, retestOn, painUnseen, ticksThisWeek } = plan;
  const [kind, words] = STATES[state];
  return (
    <li className="border-b border-rule py-3 first:pt-0 last:border-0">
      <p className="flex flex-wrap items-start gap-x-4">
        <Link to={paths.plan(id)} className="tap font-bold">
          {side} support, {shortDay(visit.day)}
        </Link>
        <StateDot kind={kind}>{words}</StateDot>
        {painUnseen > 0 && (
          <Link to={`${paths.plan(id)}#pain`} className="tap">
            <StateDot kind="wait">something hurts</StateDot>
          </Link>
        )}
      </p>
      <p className="text-note text-soft">
        {retest ? 'a retest alone' : `${exercises} exercise${exercises === 1 ? '' : 's'}`}
        {retestOn !== null && `, retest ${distance(retestOn)}`}
        {ticksThisWeek > 0 && `, ticked off ${howOften(ticksThisWeek)} this week`}
        {retestOn !== null && mayFilm && (
          <>
            .{' '}
            <Link to={paths.newVisit(athleteId, visit.id)} className="tap">
              Prepare the retest
            </Link>
          </>
        )}
      </p>
    </li>
  );
}
