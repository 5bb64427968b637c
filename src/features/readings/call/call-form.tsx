import { useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import * as z from 'zod';
import { callBody, seen, type Seen } from '#shared/contracts/calls.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { routes } from '#shared/contracts/routes.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { sidesKey } from '#src/api/readings.queries.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { useProtocol } from '#src/api/use-protocol.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { CheckboxField, SegmentedField } from '#src/ui/form/choice-fields.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextArea } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { useStatus } from '#src/ui/status.tsx';
import { SEEN_WORDS } from '#src/ui/words.ts';
import { roseWords } from '#src/ui/gate-words.ts';
import { type Gates, gatesOf } from '#shared/protocol/protocol.ts';
import {
  CONFIDENCE_WORDS,
  SEEN_SUBSTITUTIONS,
  seenNotes,
  SUBSTITUTION_WORDS,
} from '../words/seen-words.ts';

/** The same rules as the contract; its own words for what is not chosen yet. */
const callForm = callBody.extend({
  seen: z.enum(seen.options, { error: 'Choose what you saw; unsure is an answer too.' }),
  confidence: z.enum(callBody.shape.confidence.options, { error: 'Say how sure you are.' }),
});

const choicesOf = (gates: Gates | null) => {
  const notes = seenNotes(gates);
  return seen.options.map((value: Seen) => ({
    value,
    label: SEEN_WORDS[value],
    note: notes[value],
  }));
};
const CONFIDENCES = callBody.shape.confidence.options.map((value) => ({
  value,
  label: CONFIDENCE_WORDS[value],
}));

export function CallForm({ visitId, side }: { visitId: string; side: Side }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useStatus();
  const protocol = useProtocol();
  const gates = protocol && gatesOf(protocol);
  const form = useZodForm(callForm, { substitutions: [], handsFelt: '' });
  const send = async (body: z.output<typeof callForm>) => {
    await call(routes.recordCall, { params: { id: visitId, side }, body });
    void client.invalidateQueries({ queryKey: todayQuery.queryKey });
    void client.invalidateQueries({ queryKey: athletesKey });
    await client.invalidateQueries({ queryKey: sidesKey(visitId) });
    say('The call is saved.');
    await navigate(paths.reading(visitId, side));
  };
  return (
    <Form form={form} send={send} className="space-y-7">
      <SegmentedField
        name="seen"
        legend={`The ${side} hip, the one stood on, while the ${otherSide(side)} thigh ${gates ? roseWords(gates) : 'rose'}`}
        choices={choicesOf(gates)}
        cards
      />
      <SegmentedField name="confidence" legend="How sure" choices={CONFIDENCES} />
      <fieldset>
        <legend className="font-bold">
          What else moved <span className="font-normal text-soft">tick what you saw</span>
        </legend>
        <div className="mt-1 grid gap-x-8 phone:grid-cols-2">
          {SEEN_SUBSTITUTIONS.map((value) => (
            <CheckboxField
              key={value}
              name="substitutions"
              value={value}
              label={SUBSTITUTION_WORDS[value]}
              quiet
            />
          ))}
        </div>
      </fieldset>
      <TextArea
        name="handsFelt"
        label="What the hands felt"
        hint="Kept and shown; never used in a computation."
        optional
      />
      <div>
        <div className="flex flex-wrap gap-3">
          <Button
            type="submit"
            look="primary"
            busy={form.formState.isSubmitting}
            busyLabel="Saving…"
          >
            Save the call
          </Button>
          <ButtonLink to={paths.visit(visitId)}>Back to the visit</ButtonLink>
        </div>
        <p className="mt-3 text-note text-soft">
          A saved call is not changed. A second look is added beside it, with its time.
        </p>
      </div>
    </Form>
  );
}
