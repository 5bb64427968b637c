import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { Plan } from '#shared/contracts/plans.ts';
import { planOptions } from '#src/api/plans.queries.ts';
import { isProblem } from '#src/api/problem.ts';
import { useMay } from '#src/api/use-may.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { distance, shortDay } from '#src/ui/days.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { useHashTarget } from '#src/ui/use-hash-target.ts';
import { AnswersSection } from './answers-section.tsx';
import { CautionsOf } from './cautions-of.tsx';
import { ExercisesSection } from './exercises-section.tsx';
import { GivenSection } from './given-section.tsx';
import { GiveSection } from './give-section.tsx';
import { NoteForm } from './note-form.tsx';
import { OtherFindings } from './other-findings.tsx';
import { basisWords, signedOffWords, STATE_WORDS } from './plan-words.ts';
import { usePlanActs } from './use-plan-acts.ts';

/** `/plans/:id`: what to do until the retest, and what the athlete answers. */
export function PlanPage() {
  const { id = '' } = useParams();
  const plan = useQuery(planOptions(id));
  if (plan.data) return <Opened plan={plan.data} />;
  return (
    <Page title="Plan">
      {plan.isError ? (
        <ErrorState error={plan.error} onRetry={() => void plan.refetch()} />
      ) : (
        <Loading label="Loading the plan">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

function Opened({ plan }: { plan: Plan }) {
  const { athlete, visit, side, basis, because, rule, state, retestOn } = plan;
  const acts = usePlanActs(plan);
  const mayEdit = useMay(plan.coachId)('plan.edit');
  useHashTarget();
  const { title, from } = basisWords(basis);
  const signedOff = signedOffWords(plan.signedOff);
  const retestAlone = rule === null;
  return (
    <Page
      title={`${retestAlone ? 'Retest' : 'Plan'} for ${athlete.name}`}
      crumbs={[
        { label: athlete.name, to: paths.athlete(athlete.id) },
        { label: `visit of ${shortDay(visit.day)}`, to: paths.visit(visit.id) },
        { label: `${side} side`, to: paths.reading(visit.id, side) },
        { label: 'plan' },
      ]}
      lead={
        <p className="flex flex-wrap items-center gap-x-4 text-body">
          <span>Standing on the {side} leg.</span>
          <StateDot kind={STATE_WORDS[state].kind}>{STATE_WORDS[state].words}</StateDot>
          {retestOn !== null && <span className="text-soft">Retest {distance(retestOn)}</span>}
        </p>
      }
      actions={mayEdit && <ButtonLink to={paths.newVisit(athlete.id)}>New visit</ButtonLink>}
    >
      <CautionsOf of={plan} />
      <AnswersSection plan={plan} seePain={mayEdit ? acts.seePain : null} />
      <Section
        title="Starts from"
        note={from}
        margin={
          <p>
            {rule === null
              ? 'No exercise is chosen from what is not known.'
              : 'The practice’s rules suggest; you decide.'}{' '}
            An aid to trained judgement, not a diagnosis.
          </p>
        }
      >
        <p className="text-filled font-bold">“{title}”</p>
        <p>
          <StateDot kind={signedOff.kind}>{signedOff.words}</StateDot>
        </p>
        <p className="mt-1 max-w-lead">{because}</p>
        <OtherFindings plan={plan} again={mayEdit ? acts.again : null} />
      </Section>
      {!retestAlone && <ExercisesSection plan={plan} edit={mayEdit ? acts.edit : null} />}
      <NoteForm
        key={`${plan.note} ${plan.retestOn ?? ''}`}
        plan={plan}
        edit={mayEdit ? acts.edit : null}
      />
      {mayEdit && <GiveSection plan={plan} acts={acts} />}
      <GivenSection plan={plan} />
      {isProblem(acts.edit.error, 'edited-meanwhile') && (
        <p role="alert" className="sr-only">
          {acts.edit.error.message}
        </p>
      )}
    </Page>
  );
}
