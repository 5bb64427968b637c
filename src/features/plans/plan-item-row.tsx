import { useState } from 'react';
import type { Plan, PlanItem } from '#shared/contracts/plans.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { sideLines } from '#shared/plan/sides.ts';
import { Button } from '#src/ui/button.tsx';
import { ExerciseDrawing } from '#src/ui/exercise-drawing.tsx';
import { ExerciseFacts } from '#src/ui/exercise-facts.tsx';
import { doseWords } from '#src/ui/exercise-words.ts';
import { Fold } from '#src/ui/fold.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { HeldBack } from './held-back.tsx';
import { ItemForm } from './item-form.tsx';
import { SideChoice } from './side-choice.tsx';
import { bodyOf, nameOf } from './plan-words.ts';
import type { PlanActs } from './use-plan-acts.ts';

/** One exercise of a plan: the drawing, its dose and side, what stands against it, and what can be done to it. */
export function PlanItemRow({
  plan,
  item,
  edit,
  newStage,
  onUp,
  onDown,
}: {
  plan: Plan;
  item: PlanItem;
  edit: PlanActs['edit'] | null;
  newStage: boolean;
  onUp: (() => void) | null;
  onDown: (() => void) | null;
}) {
  const [changing, setChanging] = useState(false);
  const say = useStatus();
  const exercise = exerciseOf(item.exercise);
  const remove = () => {
    const items = plan.items.filter((each) => each !== item).map(bodyOf);
    edit?.mutate({ items }, { onSuccess: () => say(`${exercise.name} is taken out.`) });
  };
  return (
    <li className="border-b border-rule py-6 first:pt-0">
      {newStage && <p className="mb-3 text-note text-soft">Step {item.stage}</p>}
      <div className="grid gap-x-8 gap-y-4 tablet:grid-cols-[minmax(0,360px)_minmax(0,1fr)]">
        <div className="print:max-w-[300px]">
          <ExerciseDrawing exercise={item.exercise} side={item.side} />
        </div>
        <div>
          <h3 className="text-lead font-bold">{exercise.name}</h3>
          <p>{doseWords(item.dose)}</p>
          {item.cue !== '' && <p className="mt-1">“{item.cue}”</p>}
          <p className="mt-1 max-w-lead text-soft">{exercise.purpose}</p>
          <HeldBack plan={plan} item={item} edit={edit} />
          <SideChoice plan={plan} item={item} edit={edit} />
          {edit && (
            <div className="mt-1 flex flex-wrap gap-x-5">
              <Button
                look="plain"
                aria-expanded={changing}
                aria-label={`Change ${nameOf(item)}`}
                onClick={() => setChanging(!changing)}
              >
                Change
              </Button>
              <Button
                look="plain"
                aria-label={`${nameOf(item)} earlier`}
                disabled={onUp === null}
                onClick={() => onUp?.()}
              >
                Earlier
              </Button>
              <Button
                look="plain"
                aria-label={`${nameOf(item)} later`}
                disabled={onDown === null}
                onClick={() => onDown?.()}
              >
                Later
              </Button>
              <Button look="plain" aria-label={`Take out ${nameOf(item)}`} onClick={remove}>
                Take out
              </Button>
            </div>
          )}
          {edit && changing && (
            <ItemForm plan={plan} item={item} edit={edit} onDone={() => setChanging(false)} />
          )}
          <Fold title="How it is done">
            <div className="mt-2">
              <ExerciseFacts
                exercise={{ ...exercise, sideLines: sideLines(exercise.side, item.side) }}
              />
            </div>
          </Fold>
        </div>
      </div>
    </li>
  );
}
