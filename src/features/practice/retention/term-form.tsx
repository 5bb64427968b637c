import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useWatch } from 'react-hook-form';
import { retentionTerm, type RetentionTerm } from '#shared/contracts/retention.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { retentionKey, retentionQuery } from '#src/api/retention.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { NumberField } from '#src/ui/form/number-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { Section } from '#src/ui/page.tsx';
import { useStatus } from '#src/ui/status.tsx';

/** The two terms; what is typed is told on, so that the preview below shows what it would do. */
export function TermForm({
  term,
  onTyped,
}: {
  term: RetentionTerm;
  onTyped: (keepMonths: number | null) => void;
}) {
  const client = useQueryClient();
  const say = useStatus();
  const form = useZodForm(retentionTerm, term);
  const typed = useWatch({ control: form.control, name: 'keepMonths' });
  useEffect(() => {
    const read = retentionTerm.shape.keepMonths.safeParse(typed ?? null);
    if (read.success) onTyped(read.data);
  }, [typed, onTyped]);
  const send = async (body: RetentionTerm) => {
    client.setQueryData(retentionQuery.queryKey, await call(routes.setRetention, { body }));
    await client.invalidateQueries({ queryKey: retentionKey });
    say('The term is set. Whoever is due goes within the hour.');
  };
  return (
    <Form form={form} send={send}>
      <Section
        title="Term"
        first
        margin={
          <>
            <p>Left empty, nobody is deleted by time alone. That is how a practice begins.</p>
            <p>How long records must be kept is a matter of your law. Redshank does not know it.</p>
          </>
        }
      >
        <div className="max-w-form space-y-6">
          <NumberField<RetentionTerm>
            name="keepMonths"
            label="Keep an athlete after the last visit"
            unit="months"
            emptyIsNull
            optional
            hint="Then the athlete goes with everything: clips, marks, readings, comments, links, consents."
          />
          <NumberField<RetentionTerm>
            name="withdrawalDays"
            label="Keep after filming was withdrawn"
            unit="days"
            hint="Until then clips are closed, and only a new consent takes the deletion back. A day that was named to somebody stays."
          />
          <Button
            type="submit"
            look="primary"
            busy={form.formState.isSubmitting}
            busyLabel="Saving …"
          >
            Set the term
          </Button>
        </div>
      </Section>
    </Form>
  );
}
