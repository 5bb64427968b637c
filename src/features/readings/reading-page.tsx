import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { side as sideShape, type Side } from '#shared/contracts/primitives.ts';
import type { SidePage } from '#shared/contracts/readings.ts';
import { ApiProblem, isProblem } from '#src/api/problem.ts';
import { sideReadingOptions } from '#src/api/readings.queries.ts';
import { Breadcrumbs } from '#src/ui/breadcrumbs.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { longDay, shortDay } from '#src/ui/days.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, Skeleton, SkeletonLines } from '#src/ui/states.tsx';
import { useHashTarget } from '#src/ui/use-hash-target.ts';
import { CallOnly } from './call/call-only.tsx';
import { Measured } from './measured.tsx';

/** What one support side of one visit says: the reading, the call by eye, and everything behind them. */
export function ReadingPage() {
  const { id = '', side: asked } = useParams();
  const side = sideShape.safeParse(asked);
  if (!side.success)
    return (
      <Page title="Reading">
        <ErrorState error={new ApiProblem('not-found')} />
      </Page>
    );
  return <OfSide key={`${id} ${side.data}`} visitId={id} side={side.data} />;
}

function OfSide({ visitId, side }: { visitId: string; side: Side }) {
  const page = useQuery(sideReadingOptions(visitId, side));
  if (page.data) return <Opened page={page.data} />;
  if (isProblem(page.error, 'call-first')) return <CallFirst visitId={visitId} side={side} />;
  return (
    <Page
      title={page.isError ? 'Reading' : <Skeleton className="h-14 w-96 max-w-full" />}
      documentTitle="Reading"
    >
      {page.isError ? (
        <ErrorState error={page.error} onRetry={() => void page.refetch()} />
      ) : (
        <Loading label="Working out the reading">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

function CallFirst({ visitId, side }: { visitId: string; side: Side }) {
  return (
    <Page
      title={`What did you see, standing on the ${side}?`}
      documentTitle="Call by eye first"
      crumbs={[{ label: 'visit', to: paths.visit(visitId) }, { label: `${side} side` }]}
    >
      <Empty
        title="The call by eye comes before the figures"
        action={
          <ButtonLink look="primary" to={paths.call(visitId, side)}>
            Make the call
          </ButtonLink>
        }
      >
        Whoever has seen the figures sees with them. Say what your eye saw; then the measured
        reading stands beside it.
      </Empty>
    </Page>
  );
}

function Opened({ page }: { page: SidePage }) {
  const { athlete, visit, side, reading } = page;
  const call = page.calls[0];
  useHashTarget();
  return (
    <div className="mx-auto max-w-page px-4 pb-16 tablet:px-12 tablet:pb-24">
      <title>{`${athlete.name}, ${side} side, ${longDay(visit.day)} · Redshank`}</title>
      <Breadcrumbs
        crumbs={[
          { label: athlete.name, to: paths.athlete(athlete.id) },
          { label: `visit of ${shortDay(visit.day)}`, to: paths.visit(visit.id) },
          { label: `${side} side` },
        ]}
      />
      {reading ? (
        <Measured page={page} reading={reading} />
      ) : (
        call && <CallOnly page={page} call={call} />
      )}
    </div>
  );
}
