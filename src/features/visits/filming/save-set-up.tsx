import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { routes } from '#shared/contracts/routes.ts';
import { setUpBody, type Visit } from '#shared/contracts/visits.ts';
import { call } from '#src/api/client.ts';
import { setUpsQuery } from '#src/api/visits.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

const nameOnly = setUpBody.pick({ name: true });

/** Keeps this visit's way of filming for the next one. */
export function SaveSetUp({ filming }: { filming: Visit['filming'] }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button look="plain" onClick={() => setOpen(true)}>
        Save as a set-up
      </Button>
      <Dialog open={open} title="Save as a set-up" onClose={() => setOpen(false)}>
        <NameForm filming={filming} onDone={() => setOpen(false)} />
      </Dialog>
    </>
  );
}

function NameForm({ filming, onDone }: { filming: Visit['filming']; onDone: () => void }) {
  const form = useZodForm(nameOnly, { name: '' });
  const client = useQueryClient();
  const say = useStatus();
  return (
    <Form
      form={form}
      send={async ({ name }) => {
        const { distanceMm } = filming;
        if (distanceMm === null) throw new Error('Write down the distance first.');
        await call(routes.addSetUp, { body: { ...filming, distanceMm, name } });
        await client.invalidateQueries({ queryKey: setUpsQuery.queryKey });
        say(`“${name}” is saved.`);
        onDone();
      }}
    >
      <TextField name="name" label="Name" hint="Where it stands: “Room 2, floor mark”." />
      <div className="mt-6 flex flex-wrap gap-3">
        <Button
          type="submit"
          look="primary"
          busy={form.formState.isSubmitting}
          busyLabel="Saving …"
        >
          Save it
        </Button>
        <Button onClick={onDone}>Leave</Button>
      </div>
    </Form>
  );
}
