import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { side as sideShape, type Side } from '#shared/contracts/primitives.ts';
import { ApiProblem } from '#src/api/problem.ts';
import { callsOptions } from '#src/api/readings.queries.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { shortDay } from '#src/ui/days.ts';
import { capital } from '#src/ui/figures.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { supportWords } from '#src/ui/words.ts';
import { clipsOfSide } from '../side-clips.ts';
import { BareClip } from './bare-clip.tsx';
import { CallForm } from './call-form.tsx';

/** What the eye saw, before any figure: the form, and the bare clip beside it. */
export function CallPage() {
  const { id = '', side: asked } = useParams();
  const side = sideShape.safeParse(asked);
  if (!side.success)
    return (
      <Page title="Call by eye">
        <ErrorState error={new ApiProblem('not-found')} />
      </Page>
    );
  return <OfSide key={`${id} ${side.data}`} visitId={id} side={side.data} />;
}

function OfSide({ visitId, side }: { visitId: string; side: Side }) {
  const visit = useQuery(visitOptions(visitId));
  const calls = useQuery(callsOptions(visitId, side));
  const data = visit.data;
  const failed = [visit, calls].find(({ isError, data: known }) => isError && !known);
  const clips = clipsOfSide(data?.clips ?? [], side).filter(({ state }) => state === 'ready');
  const second = (calls.data?.items.length ?? 0) > 0;
  return (
    <Page
      title="What did you see?"
      documentTitle={`Call by eye, ${side} side`}
      crumbs={
        data && [
          { label: data.visit.athlete.name, to: paths.athlete(data.visit.athlete.id) },
          { label: `visit of ${shortDay(data.visit.day)}`, to: paths.visit(visitId) },
          { label: `${side} side` },
        ]
      }
      lead={
        second
          ? `${capital(supportWords(side))}. There is a call already; yours will stand beside it, with its time.`
          : `${capital(supportWords(side))}. Your call comes first; figures stay hidden until you save it.`
      }
    >
      {failed ? (
        <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />
      ) : data && calls.data ? (
        <div className="grid gap-10 tablet:grid-cols-[minmax(0,700px)_minmax(200px,300px)] tablet:justify-between tablet:gap-12">
          <div className="tablet:order-2">
            <BareClip clips={clips} />
          </div>
          <CallForm visitId={visitId} side={side} />
        </div>
      ) : (
        <Loading label="Loading the visit">
          <SkeletonLines count={6} />
        </Loading>
      )}
    </Page>
  );
}
