import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import * as z from 'zod';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

const fields = z.object({ name: z.string() });
type Fields = z.infer<typeof fields>;

/** Asks for the name, typed by hand: what is erased does not come back. */
export function EraseDialog({
  athlete,
  onClose,
}: {
  athlete: { id: string; name: string };
  onClose: () => void;
}) {
  const client = useQueryClient();
  const say = useStatus();
  const [done, setDone] = useState(false);
  const form = useZodForm(
    fields.refine(({ name }) => name.trim().replaceAll(/\s+/g, ' ') === athlete.name, {
      path: ['name'],
      message: `Type the name exactly: ${athlete.name}`,
    }),
    { name: '' },
  );
  const send = async ({ name }: Fields) => {
    await call(routes.eraseAthlete, { params: { id: athlete.id }, body: { name } });
    setDone(true);
    say('Erased. Nobody sees anything of it any more; the files are being deleted.');
    onClose();
    await client.invalidateQueries();
  };
  return (
    <Dialog open={!done} title={`Erase ${athlete.name}?`} onClose={onClose}>
      <p>
        Everything of this person goes at once and for good: clips, pictures, marks, readings,
        calls, comments, links, consents and their scans. Offer them an export first.
      </p>
      <p className="mt-2">
        What stays is one line in the audit trail without a name. Copies in back-ups made before
        stay in them until those are deleted.
      </p>
      <Form form={form} send={send} className="mt-5 space-y-5">
        <TextField<Fields> name="name" label={`Type ${athlete.name} to erase it`} />
        <div className="flex flex-wrap gap-3">
          <Button
            type="submit"
            look="danger"
            busy={form.formState.isSubmitting}
            busyLabel="Erasing …"
          >
            Erase for good
          </Button>
          <Button onClick={onClose}>Keep it</Button>
        </div>
      </Form>
    </Dialog>
  );
}
