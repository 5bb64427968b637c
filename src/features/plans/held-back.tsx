import { useId, useState } from 'react';
import type { Plan, PlanItem } from '#shared/contracts/plans.ts';
import { Button } from '#src/ui/button.tsx';
import { dayOf } from '#src/ui/days.ts';
import { Fault, FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { Caution } from '#src/ui/states.tsx';
import { heldBackWords, MAY_NOT_WORDS, nameOf, withItem } from './plan-words.ts';
import type { PlanActs } from './use-plan-acts.ts';

/** Why an exercise is held back for this athlete, and the deliberate way past it where the rules allow one. */
export function HeldBack({
  plan,
  item,
  edit,
}: {
  plan: Plan;
  item: PlanItem;
  edit: PlanActs['edit'] | null;
}) {
  if (item.heldBack.length === 0) return null;
  const { decision, undecided, mayNot } = item;
  const decide = (despite: string | null) =>
    edit?.mutate({ items: withItem(plan, item.exercise, { despite }) });
  return (
    <div className="mt-3 max-w-lead">
      <Caution title={undecided ? 'Held back.' : 'Used all the same.'}>
        {heldBackWords(item, plan.safety !== null)}
        {decision && (
          <span className="block">
            {undecided ? 'Decided before another answer stood against it: ' : ''}“{decision.reason}”{' '}
            <span className="text-soft">
              {decision.by.name}, {dayOf(decision.at)}
            </span>
          </span>
        )}
        {mayNot !== null && undecided && <span className="block">{MAY_NOT_WORDS[mayNot]}</span>}
        {edit && !undecided && (
          <Button
            look="plain"
            aria-label={`Hold ${nameOf(item)} back again`}
            onClick={() => decide(null)}
          >
            Hold it back again
          </Button>
        )}
        {edit && undecided && mayNot === null && <AllTheSame item={item} onDecide={decide} />}
      </Caution>
    </div>
  );
}

const SHORTEST = 10;

function AllTheSame({ item, onDecide }: { item: PlanItem; onDecide: (reason: string) => void }) {
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const [fault, setFault] = useState(false);
  const id = useId();
  if (!open)
    return (
      <Button
        look="plain"
        aria-label={`Use ${nameOf(item)} all the same`}
        onClick={() => setOpen(true)}
      >
        Use it all the same
      </Button>
    );
  return (
    <form
      noValidate
      className="mt-2"
      onSubmit={(event) => {
        event.preventDefault();
        const words = reason.trim();
        setFault(words.length < SHORTEST);
        if (words.length >= SHORTEST) onDecide(words);
      }}
    >
      <label htmlFor={id} className="font-bold">
        Why is it right for this athlete?
      </label>
      <p className="text-note text-soft">
        It is kept with your name and never shown to the athlete.
      </p>
      <textarea
        id={id}
        rows={2}
        maxLength={400}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        aria-invalid={fault}
        aria-describedby={fault ? `${id}-fault` : undefined}
        className={FIELD_BOX}
      />
      <div role="alert">
        {fault && (
          <Fault id={`${id}-fault`}>Write a reason of at least {SHORTEST} characters.</Fault>
        )}
      </div>
      <div className="mt-2 flex flex-wrap gap-3">
        <Button type="submit">Use it all the same</Button>
        <Button look="plain" onClick={() => setOpen(false)}>
          Leave it held back
        </Button>
      </div>
    </form>
  );
}
