import { useQueryClient } from '@tanstack/react-query';
import { useWatch, type DefaultValues } from 'react-hook-form';
import { routes } from '#shared/contracts/routes.ts';
import { SAFETY_QUESTIONS, type Visit } from '#shared/contracts/visits.ts';
import { call } from '#src/api/client.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { CheckboxField } from '#src/ui/form/choice-fields.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { Caution } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import {
  safetyFormFor,
  unanswered,
  yesAnswers,
  type SafetyTyped,
  type SafetyValues,
} from './safety-schema.ts';
import { adviceFor } from './safety-words.ts';
import { YesNo } from './yes-no.tsx';

/** Asked before anything else, at every visit. Any yes stops the filming unless a clinician has cleared it. */
export function SafetyForm({
  visit,
  onSaved,
  onLeave,
}: {
  visit: Visit;
  onSaved: () => void;
  /** Given where an earlier check is being asked anew. */
  onLeave?: () => void;
}) {
  const { id, name, minor } = { ...visit.athlete, name: visit.athlete.name.split(' ')[0] };
  const client = useQueryClient();
  const say = useStatus();
  // unanswered is no value of the contract: that is what makes it a fault
  const form = useZodForm(safetyFormFor(minor), unanswered(minor) as DefaultValues<SafetyTyped>);
  const answers: Partial<Record<string, boolean>> =
    useWatch({ control: form.control, name: 'answers' }) ?? {};
  const yes = yesAnswers(answers);

  const send = async (body: SafetyValues) => {
    const cleared = yes.length > 0 ? body.clearedBy : null;
    const params = { id: visit.id };
    const saved = await call(routes.answerSafety, {
      params,
      body: { ...body, clearedBy: cleared },
    });
    client.setQueryData(
      visitOptions(visit.id).queryKey,
      (page) => page && { ...page, visit: saved },
    );
    say(
      saved.safety?.mayFilm === true
        ? 'The safety check is recorded.'
        : 'Recorded. Do not film today.',
    );
    onSaved();
  };
  return (
    <Form form={form} send={send} key={id}>
      <p className="mb-2">Ask {name} before anything else, aloud, and wait for each answer.</p>
      {SAFETY_QUESTIONS.map((question) => (
        <YesNo key={question} question={question} />
      ))}
      {yes.length > 0 && (
        <div className="my-5 space-y-4" role="status">
          <Caution title="Do not film.">
            Speak with the person who treats {name}.
            {yes.map((question) => {
              const advice = adviceFor(question, minor);
              return advice === null ? null : <span key={question}> {advice}</span>;
            })}
          </Caution>
          <TextField<SafetyTyped>
            name="clearedBy"
            emptyIsNull
            label="Cleared by a clinician"
            hint="Only where a named clinician has said that this test may be done: who, and when. Leave it empty otherwise."
          />
        </div>
      )}
      <div className="mt-4">
        <CheckboxField<SafetyTyped>
          name="supportWithinReach"
          label="A chair or a wall is within reach, on the side of the standing leg"
        />
        <CheckboxField<SafetyTyped>
          name="knowsWhenToStop"
          label={`${name} knows to stop on pain, pinching or dizziness`}
        />
        {minor && (
          <CheckboxField<SafetyTyped>
            name="chaperone"
            label={`${name} is under 18: a guardian or a chaperone is in the room`}
          />
        )}
      </div>
      <p className="mt-4 text-note text-soft">
        Close-fitting shorts. {name} may place the dots and pointers; ask before you touch.
      </p>
      <div className="mt-5 flex flex-wrap gap-3">
        <Button
          type="submit"
          look="primary"
          busy={form.formState.isSubmitting}
          busyLabel="Saving …"
        >
          {yes.length > 0 ? 'Record the answers' : 'Record the safety check'}
        </Button>
        {onLeave && (
          <Button look="plain" className="px-2" onClick={onLeave}>
            Keep the earlier check
          </Button>
        )}
      </div>
    </Form>
  );
}
