import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { useMe } from '#src/api/me.ts';
import { secondMarkingsOptions } from '#src/api/reliability.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useBenchDocument } from '../bench-context.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { FrameChoice } from './frame-choice.tsx';
import { PastMarkings } from './past-markings.tsx';

/** Has frames of a rep marked again without sight of the first marks. */
export function MarkAgain({ own }: { own: BenchRep }) {
  const { number } = own.rep;
  const [search] = useSearchParams();
  // a link of the reading page asks for it at once
  const [open, setOpen] = useState(search.get('again') === String(number));
  return (
    <>
      <Button look="plain" onClick={() => setOpen(true)}>
        Mark again, blind
      </Button>
      {open && (
        <Dialog open title={`Mark rep ${number} again, blind`} onClose={() => setOpen(false)}>
          <MarkAgainForm repId={own.rep.id} onClose={() => setOpen(false)} />
        </Dialog>
      )}
    </>
  );
}

function MarkAgainForm({ repId, onClose }: { repId: string; onClose: () => void }) {
  const { user } = useMe();
  const { protocol } = useBenchDocument();
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useStatus();
  const list = useQuery(secondMarkingsOptions(repId));
  const [chosenMarker, setMarker] = useState<string | null>(null);
  const [frames, setFrames] = useState<readonly number[] | null>(null);
  const people = list.data?.people ?? [];
  const marker =
    chosenMarker ?? people.find(({ id }) => id === user.id)?.id ?? people[0]?.id ?? null;
  const start = useMutation({
    mutationFn: () =>
      call(routes.startSecondMarking, {
        params: { id: repId },
        body: { markerId: marker, frames: frames === null ? null : [...frames] },
      }),
    onSuccess: async (made) => {
      await client.invalidateQueries({ queryKey: secondMarkingsOptions(repId).queryKey });
      if (made.mine) return navigate(paths.secondMarking(made.id));
      say(`${made.marker.name} is asked. It waits on their reliability page.`);
      onClose();
    },
  });
  if (list.isPending) return <Loading label="Loading" />;
  if (list.isError) return <ErrorState error={list.error} onRetry={() => void list.refetch()} />;
  const { items, markedFrames } = list.data;
  const mine = items.find((each) => each.mine && each.finishedAt === null);
  if (mine)
    return (
      <>
        <p>
          You have a second marking of this rep to finish: {mine.framesDone} of {mine.frames} frames
          are done.
        </p>
        <div className="mt-6 flex flex-wrap gap-3">
          <ButtonLink look="primary" to={paths.secondMarking(mine.id)}>
            Go on
          </ButtonLink>
          <Button onClick={onClose}>Not now</Button>
        </div>
        <PastMarkings items={items} />
      </>
    );
  return (
    <>
      <p className="mb-3">
        The same frames are marked a second time, in a shuffled order, with the first marks hidden.
        What differs is the marking error. <Link to={paths.reliability()}>Reliability so far</Link>
      </p>
      {people.length > 1 && (
        <fieldset className="mb-4">
          <legend className="font-bold">Who marks</legend>
          {people.map(({ id, name }) => (
            <label key={id} className="flex min-h-[44px] items-center gap-3 border-b border-rule">
              <input
                type="radio"
                name="marker"
                className="size-5 flex-none accent-ink"
                checked={marker === id}
                onChange={() => setMarker(id)}
              />
              {id === user.id ? `${name} (you)` : name}
            </label>
          ))}
        </fieldset>
      )}
      <FrameChoice
        marked={markedFrames}
        chosen={frames}
        gates={gatesOf(protocol.rules)}
        onChoose={setFrames}
      />
      {start.isError && (
        <div className="mt-4">
          <ErrorState error={start.error} />
        </div>
      )}
      <div className="mt-6 flex flex-wrap gap-3">
        <Button
          look="primary"
          disabled={marker === null || frames?.length === 0 || markedFrames.length === 0}
          busy={start.isPending}
          onClick={() => start.mutate()}
        >
          {marker === user.id ? 'Start marking' : 'Ask for it'}
        </Button>
        <Button onClick={onClose}>Not now</Button>
      </div>
      {markedFrames.length === 0 && (
        <p className="mt-2 text-note text-soft">Nothing on this rep was placed by hand yet.</p>
      )}
      <PastMarkings items={items} />
    </>
  );
}
