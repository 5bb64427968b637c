import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { SidePage } from '#shared/contracts/readings.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athleteOptions } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { sideReadingOptions, sidesKey } from '#src/api/readings.queries.ts';
import { useMay } from '#src/api/use-may.ts';
import { Button } from '#src/ui/button.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { listed } from '#src/ui/listed.ts';
import { useStatus } from '#src/ui/status.tsx';

/** Everything that a reading made now would take in the place of what this one was made with. */
const newerWords = ({ newerMarkError, newerProtocol, newerEngine }: SidePage): string =>
  listed(
    [
      newerMarkError && `${newerMarkError.px.toFixed(1)} px`,
      newerProtocol && `protocol ${newerProtocol.version}`,
      newerEngine !== null && `engine ${newerEngine}`,
    ].filter((each) => typeof each === 'string'),
  );

/** Makes the reading anew with what is known now; for whoever may. Both are kept. */
export function ReadAgain({ page }: { page: SidePage }) {
  const client = useQueryClient();
  const say = useStatus();
  const { visit, side, athlete } = page;
  const person = useQuery(athleteOptions(athlete.id));
  const may = useMay(person.data?.coach.id);
  const again = useMutation({
    mutationFn: () => call(routes.renewReading, { params: { id: visit.id, side } }),
    onSuccess: (answer) => {
      client.setQueryData(sideReadingOptions(visit.id, side).queryKey, answer);
      say('Read again. The earlier reading stays in the history.');
      return client.invalidateQueries({ queryKey: sidesKey(visit.id), refetchType: 'none' });
    },
  });
  if (!may('reading.renew')) return null;
  return (
    <>
      <Button
        className="mt-3"
        busy={again.isPending}
        busyLabel="Reading…"
        onClick={() => again.mutate()}
      >
        Read again with {newerWords(page)}
      </Button>
      {again.isError && (
        <div className="mt-3">
          <ErrorState error={again.error} />
        </div>
      )}
    </>
  );
}
