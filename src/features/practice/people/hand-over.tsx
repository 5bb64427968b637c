import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { handOverBody, type Person } from '#shared/contracts/people.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { peopleQuery } from '#src/api/people.queries.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { SelectField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

export const athletesOf = (count: number): string =>
  count === 1 ? '1 athlete' : `${count} athletes`;

/** Hands all athletes of a person to another. */
export function HandOver({ person, people }: { person: Person; people: readonly Person[] }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button look="plain" className="-my-2.5" onClick={() => setOpen(true)}>
        Hand over <span className="sr-only">the athletes of {person.name}</span>
      </Button>
      <Dialog
        open={open}
        title={`Hand over ${athletesOf(person.athletes)} of ${person.name}`}
        onClose={() => setOpen(false)}
      >
        <HandOverForm person={person} people={people} onDone={() => setOpen(false)} />
      </Dialog>
    </>
  );
}

function HandOverForm({
  person,
  people,
  onDone,
}: {
  person: Person;
  people: readonly Person[];
  onDone: () => void;
}) {
  const form = useZodForm(handOverBody, { to: '' });
  const client = useQueryClient();
  const say = useStatus();
  const takers = people.filter(
    ({ id, role, deactivatedAt }) =>
      id !== person.id && role !== 'supervisor' && deactivatedAt === null,
  );
  return (
    <Form
      form={form}
      className="space-y-5"
      send={async (body) => {
        const page = await call(routes.handOver, { params: { id: person.id }, body });
        client.setQueryData(peopleQuery.queryKey, page);
        await Promise.all([
          client.invalidateQueries({ queryKey: athletesKey }),
          client.invalidateQueries({ queryKey: todayQuery.queryKey }),
        ]);
        const taker = takers.find(({ id }) => id === body.to);
        say(`${athletesOf(person.athletes)} went to ${taker?.name ?? 'them'}.`);
        onDone();
      }}
    >
      <p>
        All go together, with their visits, clips and plans. What was done stays in the name of who
        did it. {person.name} sees them no longer.
      </p>
      <SelectField
        name="to"
        label="Who takes them over"
        options={[
          { value: '', label: takers.length === 0 ? 'There is nobody else' : 'Choose' },
          ...takers.map(({ id, name }) => ({ value: id, label: name })),
        ]}
      />
      <div className="flex flex-wrap gap-3">
        <Button
          type="submit"
          look="primary"
          busy={form.formState.isSubmitting}
          busyLabel="Handing over …"
        >
          Hand them over
        </Button>
        <Button onClick={onDone}>Leave it as it is</Button>
      </div>
    </Form>
  );
}
