import * as z from 'zod';
import type { Plan, PlanItem } from '#shared/contracts/plans.ts';
import { planItemBody } from '#shared/contracts/plans.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { NumberField } from '#src/ui/form/number-field.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';
import { nameOf, withItem } from './plan-words.ts';
import type { PlanActs } from './use-plan-acts.ts';

const shape = z.object({
  dose: planItemBody.shape.dose,
  stage: planItemBody.shape.stage,
  cue: planItemBody.shape.cue,
});

/** Dose, step and a cue of the coach's own. */
export function ItemForm({
  plan,
  item,
  edit,
  onDone,
}: {
  plan: Plan;
  item: PlanItem;
  edit: PlanActs['edit'];
  onDone: () => void;
}) {
  const { dose, stage, cue } = item;
  const form = useZodForm(shape, { dose, stage, cue });
  const say = useStatus();
  return (
    <Form
      form={form}
      className="mt-2 max-w-form space-y-4 border-l border-rule pl-4"
      send={async (values) => {
        await edit.mutateAsync({ items: withItem(plan, item.exercise, values) });
        say(`${nameOf(item)} is saved.`);
        onDone();
      }}
    >
      <div className="flex flex-wrap gap-x-8 gap-y-4">
        <NumberField name="dose.sets" label="Sets" unit="" />
        <NumberField
          name="dose.repetitions"
          label="Repetitions"
          hint="or seconds"
          unit="a set"
          emptyIsNull
        />
        <NumberField
          name="dose.holdSeconds"
          label="Hold"
          hint="or repetitions"
          unit="seconds"
          emptyIsNull
        />
        <NumberField name="dose.restSeconds" label="Rest" unit="seconds" />
        <NumberField name="dose.daysPerWeek" label="Days" unit="a week" />
        <NumberField name="stage" label="Step" unit="" />
      </div>
      <TextField name="cue" label="Your own cue" optional />
      <div className="flex flex-wrap gap-3">
        <Button type="submit" busy={edit.isPending}>
          Save
        </Button>
        <Button look="plain" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </Form>
  );
}
