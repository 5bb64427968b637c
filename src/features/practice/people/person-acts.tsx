import { useQueryClient } from '@tanstack/react-query';
import type { Person } from '#shared/contracts/people.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { useMe } from '#src/api/me.ts';
import { peopleQuery } from '#src/api/people.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { athletesOf, HandOver } from './hand-over.tsx';
import { ChangePerson } from './person-dialog.tsx';

/** What an owner can do with a person. */
export function PersonActs({ person, people }: { person: Person; people: readonly Person[] }) {
  return (
    <span className="flex flex-wrap gap-x-5 gap-y-3 tablet:justify-end">
      {person.deactivatedAt === null && <ChangePerson person={person} people={people} />}
      {person.athletes > 0 && <HandOver person={person} people={people} />}
      {person.oneTimeCodes && <ResetCodes person={person} />}
      {person.deactivatedAt === null ? (
        <Deactivate person={person} />
      ) : (
        <Reactivate person={person} />
      )}
    </span>
  );
}

type Act = (typeof routes)['deactivatePerson' | 'reactivatePerson' | 'resetCodes'];

/** Does something with a person, shows how the people stand then, and says what was done. */
const useAct = (id: string) => {
  const client = useQueryClient();
  const say = useStatus();
  return async (route: Act, done: string): Promise<void> => {
    client.setQueryData(peopleQuery.queryKey, await call(route, { params: { id } }));
    say(done);
  };
};

function Deactivate({ person: { id, name, athletes } }: { person: Person }) {
  const act = useAct(id);
  const isMe = useMe().user.id === id;
  return (
    <ConfirmButton
      look="plain"
      className="-my-2.5 !text-alarm"
      label={
        <>
          Deactivate <span className="sr-only">{name}</span>
        </>
      }
      title={isMe ? 'Deactivate your own account?' : `Deactivate ${name}?`}
      confirm="Deactivate"
      onConfirm={() =>
        act(routes.deactivatePerson, `${name} is deactivated and signed out everywhere.`)
      }
    >
      <p>
        {isMe ? 'You are' : `${name} is`} signed out everywhere at once and cannot sign in. What was
        done stays.
      </p>
      {athletes > 0 && (
        <p className="mt-2">
          {athletesOf(athletes)} will have no coach who can film or mark them until you hand them
          over.
        </p>
      )}
    </ConfirmButton>
  );
}

/** One's own codes are turned off on the page of one's account. */
function ResetCodes({ person: { id, name } }: { person: Person }) {
  const act = useAct(id);
  if (useMe().user.id === id) return null;
  return (
    <ConfirmButton
      look="plain"
      className="-my-2.5"
      label={
        <>
          Turn off codes <span className="sr-only">of {name}</span>
        </>
      }
      title={`Turn off the one-time codes of ${name}?`}
      confirm="Turn off"
      onConfirm={() =>
        act(
          routes.resetCodes,
          `${name} signs in with the password alone until the codes are on again.`,
        )
      }
    >
      <p>
        For somebody who lost phone and recovery codes. Make sure that it is {name} who asks you.
        They are signed out everywhere and told by letter; then the password alone signs them in.
      </p>
    </ConfirmButton>
  );
}

function Reactivate({ person: { id, name } }: { person: Person }) {
  const act = useAct(id);
  const say = useStatus();
  const reactivate = async () => {
    try {
      await act(routes.reactivatePerson, `${name} can sign in again.`);
    } catch (error) {
      say(error instanceof Error ? error.message : 'That did not work.');
    }
  };
  return (
    <Button look="plain" className="-my-2.5" onClick={() => void reactivate()}>
      Reactivate <span className="sr-only">{name}</span>
    </Button>
  );
}
