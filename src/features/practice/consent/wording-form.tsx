import { useQueryClient } from '@tanstack/react-query';
import { useWatch } from 'react-hook-form';
import * as z from 'zod';
import { type ConsentWording, wordingBody, wordingTexts } from '#shared/contracts/consents.ts';
import { routes } from '#shared/contracts/routes.ts';
import { consentWordingQuery } from '#src/api/consents.queries.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextArea } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { Section } from '#src/ui/page.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { changedPassages, PASSAGES } from './passages.ts';

const fields = z.object({ ...wordingTexts.shape, note: wordingBody.shape.note });
type Fields = z.infer<typeof fields>;

/** The owner's form: every part of what is read out, what changes, and why. */
export function WordingForm({ current }: { current: ConsentWording }) {
  const client = useQueryClient();
  const say = useStatus();
  const before: Fields = { ...current.texts, note: '' };
  const form = useZodForm(fields, before);
  const typed = useWatch({ control: form.control }) as Fields;
  const changed = changedPassages(current.texts, typed);
  const send = async ({ note, ...texts }: Fields) => {
    const answer = await call(routes.changeConsentWording, {
      body: { after: current.version, texts, note },
    });
    client.setQueryData(consentWordingQuery.queryKey, answer);
    say(`Wording ${answer.current.version} is read out from now on.`);
  };
  return (
    <Form form={form} send={send}>
      <Section
        title="Wording"
        first
        margin={
          <>
            <p>
              Short sentences that a fourteen-year-old follows. A no to one purpose is as good as a
              yes.
            </p>
            <p>
              Redshank’s own wording is no legal advice: have yours read by somebody who knows your
              law.
            </p>
          </>
        }
      >
        <div className="max-w-form space-y-6">
          {PASSAGES.map(({ key, label, hint }) => (
            <TextArea<Fields> key={key} name={key} label={label} hint={hint} rows={3} />
          ))}
        </div>
      </Section>
      <Section
        title="What changes"
        margin={<p>Consents that were given keep their version and stay valid until their day.</p>}
      >
        {changed.length === 0 ? (
          <p className="text-soft">Nothing yet. Change a part above.</p>
        ) : (
          <>
            <ul className="list-disc pl-5">
              {changed.map((label) => (
                <li key={label}>{label}</li>
              ))}
            </ul>
            <div className="mt-4 max-w-lead">
              <TextArea<Fields>
                name="note"
                label="Why"
                hint="Everybody in the practice reads it beside the version."
              />
            </div>
            <div className="mt-5 flex flex-wrap gap-3">
              <Button
                type="submit"
                look="primary"
                busy={form.formState.isSubmitting}
                busyLabel="Saving …"
              >
                Make wording {current.version + 1}
              </Button>
              <Button onClick={() => form.reset(before)}>Put everything back</Button>
            </div>
          </>
        )}
      </Section>
    </Form>
  );
}
