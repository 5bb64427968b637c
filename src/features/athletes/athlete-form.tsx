import type * as z from 'zod';
import { athleteBody } from '#shared/contracts/athletes.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { today } from '#src/ui/days.ts';
import { Form } from '#src/ui/form/form.tsx';
import { LengthField } from '#src/ui/form/length-field.tsx';
import { TextArea, TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';

type Typed = z.input<typeof athleteBody>;
export type AthleteValues = z.output<typeof athleteBody>;

const EMPTY: Typed = {
  givenName: '',
  familyName: '',
  birthDate: '',
  heightMm: null,
  sport: '',
  cautions: '',
  contactEmail: null,
};

/** What is known of an athlete, for adding and for changing. */
export function AthleteForm({
  initial = EMPTY,
  submit,
  back,
  send,
}: {
  initial?: Typed;
  /** The words on the button. */
  submit: string;
  /** Where leaving without a change leads. */
  back: string;
  send: (values: AthleteValues) => Promise<unknown>;
}) {
  const form = useZodForm(athleteBody, initial);
  return (
    <Form form={form} send={send} className="max-w-form space-y-6">
      <div className="grid gap-6 phone:grid-cols-2">
        <TextField<Typed> name="givenName" label="Given name" />
        <TextField<Typed> name="familyName" label="Family name" />
      </div>
      <TextField<Typed>
        name="birthDate"
        type="date"
        max={today()}
        label="Date of birth"
        hint="Under 18, a guardian gives the consent and somebody they trust is in the room."
      />
      <LengthField<Typed>
        name="heightMm"
        unit="cm"
        label="Body height"
        optional
        hint="Barefoot. It gives the scale where no rod stands in the picture."
      />
      <TextField<Typed> name="sport" label="Sport or group" optional />
      <TextField<Typed>
        name="contactEmail"
        type="email"
        inputMode="email"
        label="E-mail"
        optional
        emptyIsNull
        hint="Of the athlete, or of the guardian of a minor."
      />
      <TextArea<Typed>
        name="cautions"
        label="Be careful with"
        optional
        hint="Shown wherever filming or exercises are planned. Only what is needed for that."
      />
      <div className="flex flex-wrap gap-3 pt-2">
        <Button
          type="submit"
          look="primary"
          busy={form.formState.isSubmitting}
          busyLabel="Saving …"
        >
          {submit}
        </Button>
        <ButtonLink look="plain" to={back} className="px-2">
          Leave without saving
        </ButtonLink>
      </div>
    </Form>
  );
}
