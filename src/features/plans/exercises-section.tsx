import { Link } from 'react-router-dom';
import type { Plan } from '#shared/contracts/plans.ts';
import { Section } from '#src/ui/page.tsx';
import { Button } from '#src/ui/button.tsx';
import { paths } from '#src/ui/paths.ts';
import { inWords } from '#src/ui/figures.ts';
import { Empty, ErrorState } from '#src/ui/states.tsx';
import { AddExercise } from './add-exercise.tsx';
import { PlanItemRow } from './plan-item-row.tsx';
import { bodyOf } from './plan-words.ts';
import type { PlanActs } from './use-plan-acts.ts';

/** The exercises in their order, and the way to add another. */
export function ExercisesSection({ plan, edit }: { plan: Plan; edit: PlanActs['edit'] | null }) {
  const { items } = plan;
  const unconfirmed = items.filter(({ sideConfirmed }) => !sideConfirmed).length;
  const confirmAll = () =>
    edit?.mutate({ items: items.map((item) => ({ ...bodyOf(item), sideConfirmed: true })) });
  const move = (from: number, to: number) => {
    const list = items.map(bodyOf);
    const [moved] = list.splice(from, 1);
    if (moved) list.splice(to, 0, moved);
    edit?.mutate({ items: list });
  };
  return (
    <Section
      title="Exercises"
      note={
        <Link to={paths.exercises()} className="tap">
          the library and its rules
        </Link>
      }
      wide
    >
      {edit?.isError && (
        <div className="mb-5">
          <ErrorState error={edit.error} title="Not saved." />
        </div>
      )}
      {items.length === 0 && (
        <Empty title="No exercise">Add one from the library, or base the plan on a finding.</Empty>
      )}
      {edit && unconfirmed > 1 && (
        <div className="mb-5 flex flex-wrap items-center gap-x-5 gap-y-2">
          <Button onClick={confirmAll} busy={edit.isPending}>
            Confirm all {inWords(unconfirmed)} sides
          </Button>
          <p className="text-note text-soft">As the rules set them; each can still be turned.</p>
        </div>
      )}
      <ol>
        {items.map((item, n) => (
          <PlanItemRow
            key={item.exercise}
            plan={plan}
            item={item}
            edit={edit}
            newStage={item.stage !== items[n - 1]?.stage}
            onUp={n > 0 ? () => move(n, n - 1) : null}
            onDown={n < items.length - 1 ? () => move(n, n + 1) : null}
          />
        ))}
      </ol>
      {edit && <AddExercise plan={plan} edit={edit} />}
    </Section>
  );
}
