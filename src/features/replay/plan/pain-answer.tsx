import { useState } from 'react';
import type { GivenPlan, PainBody } from '#shared/contracts/athlete-plan.ts';
import { Button } from '#src/ui/button.tsx';
import { Contact } from '../contact.tsx';
import { PainForm } from './pain-form.tsx';

/** Asks what hurts, above everything that could be ticked off; what is said goes to the coach alone. */
export function PainAnswer({
  plan,
  coach,
  contact,
  ...sending
}: {
  token: string;
  plan: GivenPlan;
  coach: string;
  contact: string;
  onEnded: () => void;
  onChanged: () => void;
}) {
  const [open, setOpen] = useState(false);
  const [said, setSaid] = useState<PainBody | null>(null);
  if (open)
    return (
      <PainForm
        {...sending}
        plan={plan}
        onSaid={(pain) => {
          setSaid(pain);
          setOpen(false);
        }}
        onClose={() => setOpen(false)}
      />
    );
  return (
    <div className="my-5 rounded border border-ink p-4 print:hidden">
      <div role="status">
        {said !== null && said.level === 0 && <p>Sent: nothing hurts. Thank you.</p>}
        {said !== null && said.level > 0 && (
          <>
            <p className="font-bold">Sent to {coach}. Stop what hurts.</p>
            <p>
              Leave the exercise out until you have spoken with {coach}.
              <Contact contact={contact} className="block" />
            </p>
            <p className="mt-1">
              Strong pain, pain at night, a fall, numbness, or a leg that will not carry you: go to
              a doctor today. This page examines nothing and calls nobody.
            </p>
          </>
        )}
      </div>
      <p className={said === null ? 'font-bold' : 'mt-3 font-bold'}>
        {said === null ? 'Does something hurt?' : 'Something to add?'}
      </p>
      <p className="text-soft">{coach} sees your answer. Nobody else with this link does.</p>
      <Button className="mt-2 w-full phone:w-auto" onClick={() => setOpen(true)}>
        Say how it feels
      </Button>
    </div>
  );
}
