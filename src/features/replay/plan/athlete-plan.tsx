import { useState } from 'react';
import type { AthletePlan as Given } from '#shared/contracts/athlete-plan.ts';
import { longDay } from '#src/ui/days.ts';
import { sendTick } from '../replay-api.ts';
import { NOT_KEPT } from './answer-words.ts';
import { PainAnswer } from './pain-answer.tsx';
import { PlanExercise } from './plan-exercise.tsx';

/** What to do until the retest: what hurts is asked first, then each exercise with its days to tick off. */
export function AthletePlan({
  token,
  given,
  coach,
  contact,
  onEnded,
  onChanged,
}: {
  token: string;
  given: Given;
  coach: string;
  contact: string;
  onEnded: () => void;
  /** The plan is not the one on this page any more. */
  onChanged: () => void;
}) {
  const { plan } = given;
  const [ticks, setTicks] = useState(given.ticks);
  const [fault, setFault] = useState<string | null>(null);
  const newer = given.newerGivenAt !== null && (
    <p className="mb-4 border-l-[3px] border-ochre py-1 pl-4">
      <b className="text-ochre">There is a newer plan.</b> It was given to you on{' '}
      {longDay(given.newerGivenAt.slice(0, 10))}, after a later test, and takes the place of this
      one. Ask {coach} for its link.
    </p>
  );
  if (plan === null)
    return (
      <section aria-label="Your plan" className="border-t border-rule py-6">
        {newer}
        <h2 className="text-lead font-bold">Your plan is stopped</h2>
        <p className="mt-1">Do none of its exercises any more. {coach} tells you how to go on.</p>
      </section>
    );
  const tick = async (exercise: (typeof plan.items)[number]['exercise'], day: string) => {
    const done = !ticks.some((each) => each.exercise === exercise && each.day === day);
    setFault(null);
    const answer = await sendTick(token, { exercise, day, done });
    if (typeof answer !== 'string') setTicks([...answer]);
    else if (answer === 'gone') onEnded();
    else {
      setFault(NOT_KEPT[answer]);
      if (answer === 'changed') onChanged();
    }
  };
  return (
    <section aria-label="Your plan" className="border-t border-rule py-6">
      {newer}
      <h2 className="break-after-avoid text-filled font-bold">
        {plan.items.length === 0 ? 'Your next test' : 'Your plan'}
      </h2>
      <p className="mt-1">
        {plan.items.length === 0 ? 'You are filmed again on' : 'Until you are filmed again on'}{' '}
        <b>{longDay(plan.retestOn)}</b>.
      </p>
      {plan.note !== '' && <p className="mt-2 whitespace-pre-line">“{plan.note}”</p>}
      {plan.items.length > 0 && (
        <p className="mt-4 border-l-[3px] border-ochre pl-4">{plan.stop}</p>
      )}
      <PainAnswer
        token={token}
        plan={plan}
        coach={coach}
        contact={contact}
        onEnded={onEnded}
        onChanged={onChanged}
      />
      <div role="alert">
        {fault !== null && <p className="py-2 font-bold text-alarm">{fault}</p>}
      </div>
      <ol>
        {plan.items.map((item, n) => (
          <PlanExercise
            key={item.exercise}
            item={item}
            newStage={plan.items[n - 1]?.stage !== item.stage}
            done={ticks.filter(({ exercise }) => exercise === item.exercise).map(({ day }) => day)}
            onTick={(day) => tick(item.exercise, day)}
          />
        ))}
      </ol>
    </section>
  );
}
