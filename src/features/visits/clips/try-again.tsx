import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Clip } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { ErrorState } from '#src/ui/states.tsx';

type Trouble = NonNullable<Clip['trouble']>;

const whatNext = ({ nextTryAt }: Trouble): string => {
  if (nextTryAt === null) return 'The clip is kept, but it is not tried again by itself.';
  return Date.parse(nextTryAt) > Date.now()
    ? `The clip is kept and tried again by itself at ${moment(nextTryAt)}.`
    : 'The clip is kept and about to be tried again.';
};

/** A clip that the machine could not prepare: what happened, what happens next, and a way not to wait for it. */
export function TryAgain({ clip, trouble }: { clip: Clip; trouble: Trouble }) {
  const client = useQueryClient();
  const again = useMutation({
    mutationFn: () => call(routes.prepareAgain, { params: { id: clip.id } }),
    onSuccess: () =>
      client.invalidateQueries({ queryKey: visitOptions(clip.visitId).queryKey, exact: true }),
  });
  const ended = trouble.nextTryAt === null;
  return (
    <>
      <p className="text-note">
        <StateDot kind={ended ? 'bad' : 'wait'} wrap>
          {trouble.sentence} {whatNext(trouble)}
        </StateDot>
      </p>
      <Button className="mt-2" busy={again.isPending} onClick={() => again.mutate()}>
        {ended ? 'Try again' : 'Try now'}
      </Button>
      {again.isError && (
        <div className="mt-3">
          <ErrorState error={again.error} />
        </div>
      )}
    </>
  );
}
