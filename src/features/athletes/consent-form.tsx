import { useQueryClient } from '@tanstack/react-query';
import { useWatch } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import type * as z from 'zod';
import { type Athlete, consentBody, minorsConsentBody } from '#shared/contracts/athletes.ts';
import type { ConsentWording, Purpose } from '#shared/contracts/consents.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { today, yearsOn } from '#src/ui/days.ts';
import { CheckboxField, SegmentedField } from '#src/ui/form/choice-fields.tsx';
import { Fault } from '#src/ui/form/field-frame.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { useStatus } from '#src/ui/status.tsx';
import { PURPOSES, PURPOSE_WORDS } from '#src/ui/words.ts';

type Typed = z.input<typeof consentBody>;

/** Nothing of the wording is repeated here; it is read out above each box. */
const noteOf = (purpose: Purpose, { texts }: ConsentWording): string =>
  purpose === 'assessment' ? `${texts[purpose]} Nothing works without this.` : texts[purpose];

/** Who agreed to what, to these words. */
export function ConsentForm({
  athlete,
  wording,
  next,
}: {
  athlete: Athlete;
  wording: ConsentWording;
  next: string;
}) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useStatus();
  const form = useZodForm(athlete.minor ? minorsConsentBody : consentBody, {
    // a minor cannot give it alone; nothing else is chosen beforehand
    givenBy: athlete.minor ? 'guardian' : 'athlete',
    guardianName: null,
    guardianRelation: null,
    assent: false,
    purposes: [],
    validUntil: yearsOn(today(), 1),
    wordingId: wording.id,
    how: '',
  });
  const byGuardian = useWatch({ control: form.control, name: 'givenBy' }) === 'guardian';
  const purposesFault = form.formState.errors.purposes?.message;

  const send = async (body: z.output<typeof consentBody>) => {
    const guardian =
      body.givenBy === 'guardian' ? {} : { guardianName: null, guardianRelation: null };
    await call(routes.recordConsent, {
      params: { id: athlete.id },
      body: { ...body, ...guardian },
    });
    await Promise.all([
      client.invalidateQueries({ queryKey: athletesKey }),
      client.invalidateQueries({ queryKey: todayQuery.queryKey }),
    ]);
    say('The consent is recorded.');
    await navigate(next);
  };
  return (
    <Form form={form} send={send} className="max-w-form space-y-7">
      <div className="space-y-2 border-l-[3px] border-rule pl-3.5">
        <p className="whitespace-pre-line">{wording.texts.intro}</p>
        {athlete.minor && <p className="whitespace-pre-line">{wording.texts.minors}</p>}
        <p className="whitespace-pre-line">{wording.texts.withdrawal}</p>
        <p className="text-note text-soft">
          Wording {wording.version} of the practice, read out or shown before anything is ticked.
        </p>
      </div>
      {athlete.minor ? (
        <p>
          {athlete.givenName} is under 18: a guardian gives the consent, and {athlete.givenName} is
          asked as well.
        </p>
      ) : (
        <SegmentedField<Typed>
          name="givenBy"
          legend="Given by"
          choices={[
            { value: 'athlete', label: `${athlete.givenName}` },
            { value: 'guardian', label: 'A guardian' },
          ]}
        />
      )}
      {byGuardian && (
        <div className="grid gap-6 phone:grid-cols-2">
          <TextField<Typed> name="guardianName" label="Guardian’s name" emptyIsNull />
          <TextField<Typed> name="guardianRelation" label="Relation" optional emptyIsNull />
        </div>
      )}
      <fieldset>
        <legend className="mb-1 font-bold">They agree to</legend>
        {purposesFault !== undefined && <Fault>{purposesFault}</Fault>}
        {PURPOSES.map((purpose) => (
          <CheckboxField<Typed>
            key={purpose}
            name="purposes"
            value={purpose}
            label={PURPOSE_WORDS[purpose]}
            note={noteOf(purpose, wording)}
            quiet
          />
        ))}
      </fieldset>
      {athlete.minor && (
        <CheckboxField<Typed>
          name="assent"
          label={`${athlete.givenName} was asked in words that fit their age, and said yes`}
          note="Where they said no, nothing is recorded and nothing is filmed."
        />
      )}
      <TextField<Typed>
        name="validUntil"
        type="date"
        label="Valid until"
        hint="You are reminded before it lapses. After that day nothing new is filmed and no link opens; what is there stays until its term ends."
      />
      <TextField<Typed>
        name="how"
        label="How it was given"
        optional
        hint="On paper, kept in the file; on the tablet; by letter … A scan of the paper can be added afterwards."
      />
      <div className="flex flex-wrap gap-3">
        <Button
          type="submit"
          look="primary"
          busy={form.formState.isSubmitting}
          busyLabel="Saving …"
        >
          Record the consent
        </Button>
        <ButtonLink look="plain" to={paths.athlete(athlete.id)} className="px-2">
          Leave without saving
        </ButtonLink>
      </div>
    </Form>
  );
}
