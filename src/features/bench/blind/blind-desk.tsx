import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useSyncExternalStore } from 'react';
import { useNavigate } from 'react-router-dom';
import { routes } from '#shared/contracts/routes.ts';
import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import { call } from '#src/api/client.ts';
import { secondMarkingOptions, secondMarkingsOptions } from '#src/api/reliability.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { inWords } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { ErrorState } from '#src/ui/states.tsx';
import { useBench, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { useBlind } from './blind-context.ts';
import { useProgress } from './use-progress.ts';

/** The frames in their order, and how the second marking ends. */
export function BlindDesk({ second }: { second: SecondMarkingDocument }) {
  const { store, queue } = useBenchTools();
  const { order } = useBlind();
  const { done, of } = useProgress();
  const frame = useBench((state) => state.frame);
  const { marks: waiting } = useSyncExternalStore(queue.subscribe, queue.snapshot);
  const { id } = second.summary;
  const unsent = waiting.filter((each) => each.repId === id).length;
  return (
    <div className="max-w-[38em] pt-3">
      <h2 className="text-sub font-bold tablet:text-body">Frames, in a shuffled order</h2>
      <p className="mt-1 text-note text-soft">
        The first marks stay hidden until you have finished, and so does all that follows from them.
      </p>
      <ol className="mt-3 flex flex-wrap gap-2">
        {order.map((each, n) => (
          <li key={each.frame}>
            <button
              type="button"
              aria-current={each.frame === frame ? 'step' : undefined}
              aria-label={`Frame ${n + 1} of ${of}, ${each.done ? 'done' : 'to mark'}`}
              onClick={() => goTo(store, each.frame)}
              className={`grid min-h-[44px] min-w-[52px] place-items-center rounded border px-2 leading-5 hover:bg-sheet ${
                each.frame === frame ? 'border-2 border-ink font-bold' : 'border-edge'
              }`}
            >
              <span>{n + 1}</span>
              <span className="text-caption text-soft">{each.done ? 'done' : 'to go'}</span>
            </button>
          </li>
        ))}
      </ol>
      <Finish second={second} left={of - done} unsent={unsent} />
      <GiveUp second={second} />
    </div>
  );
}

function Finish({
  second,
  left,
  unsent,
}: {
  second: SecondMarkingDocument;
  left: number;
  unsent: number;
}) {
  const client = useQueryClient();
  const { id } = second.summary;
  const finish = useMutation({
    mutationFn: () => call(routes.finishSecondMarking, { params: { id } }),
    onSuccess: (answer) => {
      client.setQueryData(secondMarkingOptions(id).queryKey, answer);
      void client.invalidateQueries({ queryKey: ['reliability'] });
      void client.invalidateQueries({ queryKey: ['visits', second.visit.id, 'sides'] });
      void client.invalidateQueries({
        queryKey: secondMarkingsOptions(second.summary.repId).queryKey,
      });
    },
  });
  return (
    <div className="mt-6">
      <Button
        look="primary"
        disabled={left > 0 || unsent > 0}
        busy={finish.isPending}
        busyLabel="Comparing…"
        onClick={() => finish.mutate()}
      >
        Finish and compare
      </Button>
      <p className="mt-2 text-note text-soft" role="status">
        {left > 0
          ? `${inWords(left)} ${left === 1 ? 'frame' : 'frames'} to go.`.replace(/^./, (c) =>
              c.toUpperCase(),
            )
          : unsent > 0
            ? 'The last marks are on their way.'
            : 'All frames are marked. After finishing, the second marks stay as they are.'}
      </p>
      {finish.isError && (
        <div className="mt-3">
          <ErrorState error={finish.error} />
        </div>
      )}
    </div>
  );
}

function GiveUp({ second }: { second: SecondMarkingDocument }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const { id, repId } = second.summary;
  return (
    <div className="mt-4">
      <ConfirmButton
        label="Give it up"
        look="plain"
        title="Give this second marking up?"
        confirm="Give it up"
        onConfirm={async () => {
          await call(routes.discardSecondMarking, { params: { id } });
          await client.invalidateQueries({ queryKey: secondMarkingsOptions(repId).queryKey });
          await navigate(paths.bench(second.clip.id));
          client.removeQueries({ queryKey: secondMarkingOptions(id).queryKey });
        }}
      >
        <p>Its marks are deleted. The first marks stay as they are.</p>
      </ConfirmButton>
    </div>
  );
}
