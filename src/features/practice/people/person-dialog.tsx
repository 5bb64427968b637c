import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Role } from '#shared/contracts/accounts.ts';
import type { PeoplePage, Person } from '#shared/contracts/people.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { peopleQuery } from '#src/api/people.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Checkbox } from '#src/ui/checkbox.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Segmented } from '#src/ui/segmented.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { ROLES } from './role-words.ts';

/** Changes what a person is here and, of a supervisor, whose athletes they see. */
export function ChangePerson({ person, people }: { person: Person; people: readonly Person[] }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button look="plain" className="-my-2.5" onClick={() => setOpen(true)}>
        Change <span className="sr-only">{person.name}</span>
      </Button>
      <Dialog open={open} title={person.name} onClose={() => setOpen(false)}>
        <RoleForm person={person} people={people} onDone={() => setOpen(false)} />
      </Dialog>
    </>
  );
}

function RoleForm({
  person,
  people,
  onDone,
}: {
  person: Person;
  people: readonly Person[];
  onDone: () => void;
}) {
  const client = useQueryClient();
  const say = useStatus();
  const [role, setRole] = useState<Role>(person.role);
  const [coachIds, setCoachIds] = useState<readonly string[]>(person.coachIds);
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const coaches = people.filter(
    ({ id, role: is, deactivatedAt, athletes }) =>
      id !== person.id &&
      ((is !== 'supervisor' && deactivatedAt === null) || athletes > 0 || coachIds.includes(id)),
  );
  const save = async () => {
    setBusy(true);
    setError(null);
    try {
      const page: PeoplePage = await call(routes.changePerson, {
        params: { id: person.id },
        body: { role, ...(role === 'supervisor' ? { coachIds: [...coachIds] } : {}) },
      });
      client.setQueryData(peopleQuery.queryKey, page);
      say(`${person.name} is changed. It holds at once.`);
      onDone();
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  return (
    <div className="space-y-5">
      <Segmented legend="Role" cards choices={ROLES} value={role} onChange={setRole} />
      {role === 'supervisor' && (
        <fieldset>
          <legend className="font-bold">Sees the athletes of</legend>
          {coaches.length === 0 && <p className="text-soft">There is no coach yet.</p>}
          {coaches.map(({ id, name }) => (
            <Checkbox
              key={id}
              label={name}
              checked={coachIds.includes(id)}
              onChange={({ target }) =>
                setCoachIds((ids) =>
                  target.checked ? [...ids, id] : ids.filter((each) => each !== id),
                )
              }
            />
          ))}
        </fieldset>
      )}
      {error !== null && <ErrorState error={error} />}
      <div className="flex flex-wrap gap-3">
        <Button look="primary" busy={busy} busyLabel="Saving …" onClick={() => void save()}>
          Save
        </Button>
        <Button onClick={onDone}>Leave it as it is</Button>
      </div>
    </div>
  );
}
