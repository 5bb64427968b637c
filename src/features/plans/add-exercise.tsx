import { useId, useState } from 'react';
import type { Plan } from '#shared/contracts/plans.ts';
import { EXERCISES } from '#shared/plan/library.ts';
import { sideOf } from '#shared/plan/sides.ts';
import { Button } from '#src/ui/button.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { bodyOf } from './plan-words.ts';
import type { PlanActs } from './use-plan-acts.ts';

/** One more from the library, at the end of the list and with the library's dose. */
export function AddExercise({ plan, edit }: { plan: Plan; edit: PlanActs['edit'] }) {
  const id = useId();
  const say = useStatus();
  const left = EXERCISES.filter(
    (exercise) => !plan.items.some((item) => item.exercise === exercise.id),
  );
  const [wanted, setWanted] = useState('');
  const chosen = left.find((exercise) => exercise.id === wanted) ?? left[0];
  if (!chosen) return <p className="mt-5 text-soft">Every exercise of the library is in it.</p>;
  const add = () =>
    edit.mutate(
      {
        items: [
          ...plan.items.map(bodyOf),
          {
            exercise: chosen.id,
            stage: plan.items.at(-1)?.stage ?? 1,
            side: sideOf(chosen.side.stands, plan.side),
            sideConfirmed: false,
            dose: chosen.dose,
          },
        ],
      },
      { onSuccess: () => say(`${chosen.name} is added.`) },
    );
  return (
    <div className="mt-5 flex max-w-form flex-wrap items-end gap-3">
      <div className="min-w-0 grow">
        <label htmlFor={id} className="font-bold">
          Another exercise
        </label>
        <select
          id={id}
          value={chosen.id}
          onChange={(event) => setWanted(event.target.value)}
          className={FIELD_BOX}
        >
          {left.map((exercise) => (
            <option key={exercise.id} value={exercise.id}>
              {exercise.name}
            </option>
          ))}
        </select>
      </div>
      <Button busy={edit.isPending} onClick={add}>
        Add
      </Button>
    </div>
  );
}
