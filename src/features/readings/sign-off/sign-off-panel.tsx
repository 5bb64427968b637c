import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { SidePage } from '#shared/contracts/readings.ts';
import type { ReviewSubject, SideReview } from '#shared/contracts/reviews.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { sidesKey } from '#src/api/readings.queries.ts';
import { reviewQueueQuery, sideReviewOptions } from '#src/api/reviews.queries.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useSideReps } from '../side-clips.ts';
import { SendBack } from './send-back.tsx';
import { meaning, standing } from './sign-off-words.ts';

/** Where the side stands, and what the person signed in may do about it. */
export function SignOffPanel({
  page,
  review,
  subject,
}: {
  page: SidePage;
  review: SideReview;
  subject: ReviewSubject;
}) {
  const { visit, side } = page;
  const client = useQueryClient();
  const say = useStatus();
  const [sending, setSending] = useState(false);
  const params = { id: visit.id, side };
  const told = (words: string) => async (answer: SideReview) => {
    client.setQueryData(sideReviewOptions(visit.id, side).queryKey, answer);
    say(words);
    setSending(false);
    await Promise.all(
      [reviewQueueQuery.queryKey, todayQuery.queryKey, athletesKey].map((queryKey) =>
        client.invalidateQueries({ queryKey }),
      ),
    );
  };
  const old = () => void client.invalidateQueries({ queryKey: sidesKey(visit.id) });
  const handIn = useMutation({
    mutationFn: () => call(routes.handIn, { params, body: { about: subject } }),
    onSuccess: told('Handed in.'),
    onError: old,
  });
  const signOff = useMutation({
    mutationFn: () =>
      call(routes.decideReview, { params, body: { verdict: 'sign-off', about: subject } }),
    onSuccess: told('Signed off.'),
    onError: old,
  });
  const sendBack = async (reason: string) => {
    const body = { verdict: 'send-back', about: subject, reason } as const;
    await told('Sent back.')(await call(routes.decideReview, { params, body }));
  };
  const provisional = subject.kind === 'reading' && page.reading?.provisional === true;
  const { state, may, openComments } = review;
  const decides = may.decide && state !== 'signed-off';
  const hands = may.handIn && state !== 'waits' && state !== 'signed-off';
  const error = handIn.error ?? signOff.error;
  return (
    <div className="rounded border border-ink bg-sheet p-5 tablet:p-6">
      <h3 className="text-lead font-bold">{standing(review, subject)}</h3>
      <p className="mt-2">{meaning(review, subject)}</p>
      {openComments > 0 && <OpenComments page={page} count={openComments} />}
      {provisional && (
        <p className="mt-2 text-ochre">
          It rests on tracked marks that nobody has looked at: look at them on the Bench first.
        </p>
      )}
      <p className="mt-4 border-l-[3px] border-ochre py-0.5 pl-3.5">
        <b className="text-ochre">An aid to trained judgement, not a diagnosis.</b> Local codes and
        licensed practice come first.
      </p>
      {error !== null && (
        <div className="mt-4">
          <ErrorState error={error} />
        </div>
      )}
      {sending ? (
        <SendBack onSend={sendBack} onLeave={() => setSending(false)} />
      ) : (
        <div className="mt-5 flex flex-wrap items-center gap-x-4 gap-y-2">
          {hands && (
            <Button
              look="primary"
              disabled={provisional}
              busy={handIn.isPending}
              onClick={() => handIn.mutate()}
            >
              {state === 'none' ? 'Hand in for review' : 'Hand in again'}
            </Button>
          )}
          {decides && (
            <Button
              look={hands ? 'secondary' : 'primary'}
              disabled={provisional}
              busy={signOff.isPending}
              onClick={() => signOff.mutate()}
            >
              Sign off
            </Button>
          )}
          {may.decide && state !== 'sent-back' && (
            <Button disabled={provisional} onClick={() => setSending(true)}>
              Send back with a reason
            </Button>
          )}
          {may.decide && <SecondMarking page={page} />}
        </div>
      )}
    </div>
  );
}

function OpenComments({ page, count }: { page: SidePage; count: number }) {
  const { reps } = useSideReps(page.visit.id, page.side);
  const clipId = reps[0]?.rep.clipId;
  const words = count === 1 ? 'One comment is open' : `${count} comments are open`;
  return (
    <p className="mt-2">
      {clipId === undefined ? (
        words
      ) : (
        <Link to={paths.bench(clipId, { comments: true })}>{words}</Link>
      )}
      : a reviewer may sign off all the same.
    </p>
  );
}

/** On the Bench, at the first rep that has marks: who marks it and which frames is chosen there. */
function SecondMarking({ page }: { page: SidePage }) {
  const { reps } = useSideReps(page.visit.id, page.side);
  const rep = reps.find(({ rep }) => rep.markedFrames > 0 && rep.excluded === null)?.rep;
  return rep ? (
    <Link to={paths.bench(rep.clipId, { again: rep.number })} className="py-2.5">
      Ask for a blind second marking
    </Link>
  ) : null;
}
