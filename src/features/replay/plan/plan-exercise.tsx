import { useId, useState } from 'react';
import type { AthletePlanItem } from '#shared/contracts/athlete-plan.ts';
import { Button } from '#src/ui/button.tsx';
import { cx } from '#src/ui/class-names.ts';
import { ExerciseDrawing } from '#src/ui/exercise-drawing.tsx';
import { ExerciseFacts } from '#src/ui/exercise-facts.tsx';
import { doseWords } from '#src/ui/exercise-words.ts';
import { TickDays } from './tick-days.tsx';

/** One exercise: the drawing for the right leg, how much, what to think of, and the days on which it was done. */
export function PlanExercise({
  item,
  newStage,
  done,
  onTick,
}: {
  item: AthletePlanItem;
  newStage: boolean;
  done: readonly string[];
  onTick: (day: string) => Promise<void>;
}) {
  const [open, setOpen] = useState(false);
  const id = useId();
  const { exercise, name, side, dose, cues, cue, stage } = item;
  return (
    <li className="break-inside-avoid border-t border-rule py-6 first:border-0 print:flow-root print:py-4">
      {newStage && (
        <p className="text-note text-soft">
          {stage === 1 ? 'Begin with' : `Step ${stage}, once what comes before is easy`}
        </p>
      )}
      <h3 className="text-lead font-bold">{name}</h3>
      <p>
        Standing leg: <b>{side}</b>. {doseWords(dose)}.
      </p>
      <div className="mt-3 max-w-[480px] print:float-right print:mb-2 print:ml-6 print:mt-0 print:w-[220px]">
        <ExerciseDrawing exercise={exercise} side={side} />
      </div>
      <ul className="mt-3 list-disc pl-5">
        {(cue === '' ? cues : [cue, ...cues]).map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
      <TickDays name={name} done={done} onTick={onTick} />
      <Button
        look="plain"
        className="print:hidden"
        aria-expanded={open}
        aria-controls={id}
        aria-label={`How it is done: ${name}`}
        onClick={() => setOpen(!open)}
      >
        How it is done
      </Button>
      <div id={id} className={cx('mt-2 print:clear-both print:block', !open && 'hidden')}>
        <ExerciseFacts exercise={item} cue={null} />
      </div>
    </li>
  );
}
