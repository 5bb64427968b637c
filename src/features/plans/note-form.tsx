import * as z from 'zod';
import type { Plan } from '#shared/contracts/plans.ts';
import { planEdit } from '#shared/contracts/plans.ts';
import { Button } from '#src/ui/button.tsx';
import { longDay } from '#src/ui/days.ts';
import { Form } from '#src/ui/form/form.tsx';
import { TextArea, TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { Section } from '#src/ui/page.tsx';
import { useStatus } from '#src/ui/status.tsx';
import type { PlanActs } from './use-plan-acts.ts';

const shape = z.object({
  retestOn: planEdit.shape.retestOn.unwrap(),
  note: planEdit.shape.note.unwrap(),
});

/** The day of the retest, and what the coach says to the athlete with the plan. */
export function NoteForm({ plan, edit }: { plan: Plan; edit: PlanActs['edit'] | null }) {
  const { retestOn, note } = plan;
  const form = useZodForm(shape, { retestOn, note });
  const say = useStatus();
  return (
    <Section
      title="Retest and note"
      note="both shown to the athlete"
      margin={<p>The retest is filmed with the same set-up, or its change says nothing.</p>}
    >
      {edit ? (
        <Form
          form={form}
          className="max-w-form space-y-4"
          send={async (values) => {
            await edit.mutateAsync(values);
            say('Saved.');
          }}
        >
          <TextField name="retestOn" type="date" label="Day of the retest" emptyIsNull />
          <TextArea name="note" label="To the athlete" optional />
          <Button type="submit" busy={edit.isPending}>
            Save
          </Button>
        </Form>
      ) : (
        <>
          <p>{retestOn === null ? 'No day is set yet.' : longDay(retestOn)}</p>
          {note !== '' && <p className="mt-1 whitespace-pre-line">“{note}”</p>}
        </>
      )}
    </Section>
  );
}
