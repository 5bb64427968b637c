import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { benchOptions } from '#src/api/bench.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { roughly } from '#src/ui/figures.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { clipWords } from '#src/ui/words.ts';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { Bench } from './bench.tsx';

/** `/clips/:id`: the Bench once the clip is ready; until then what it waits for. */
export function BenchPage() {
  const { id = '' } = useParams();
  const bench = useQuery({
    ...benchOptions(id),
    // a clip that is being prepared tells its progress; events may be lost on a poor line
    refetchInterval: ({ state }) =>
      state.data && (state.data.clip.state === 'waiting' || state.data.clip.state === 'preparing')
        ? 5_000
        : false,
  });
  if (bench.data) {
    const { clip } = bench.data;
    const { frames, width, height, copy } = clip;
    if (clip.state === 'ready' && frames && width !== null && height !== null && copy)
      return (
        <Bench
          key={clip.id}
          document={bench.data}
          frames={frames}
          frameSize={{ width, height }}
          copySize={{ width: copy.width, height: copy.height }}
        />
      );
    return <NotReady document={bench.data} />;
  }
  if (bench.isPending) return <BenchSkeleton />;
  return (
    <Page title="The Bench">
      <ErrorState error={bench.error} onRetry={() => void bench.refetch()}>
        <Link to={paths.today()} className="py-2.5">
          Back to Today
        </Link>
      </ErrorState>
    </Page>
  );
}

function NotReady({ document }: { document: BenchDocument }) {
  const { clip, athlete, visit } = document;
  const { progress, secondsLeft, refusal } = clip;
  const back = (
    <ButtonLink look="primary" to={paths.visit(visit.id)}>
      Back to the visit
    </ButtonLink>
  );
  return (
    <Page
      title={athlete.name}
      crumbs={[
        { label: athlete.name, to: paths.athlete(athlete.id) },
        { label: 'Visit', to: paths.visit(visit.id) },
        { label: clipWords(clip) },
      ]}
    >
      {clip.state === 'refused' ? (
        <Empty title="This clip was refused" action={back}>
          {refusal?.sentence ?? 'It holds no pictures that could be shown.'}
        </Empty>
      ) : clip.trouble ? (
        <Empty title="This clip could not be prepared" action={back}>
          {clip.trouble.sentence} The visit says when it is tried again.
        </Empty>
      ) : (
        <Empty title="This clip is being prepared" action={back}>
          <p role="status">
            {clip.state === 'waiting' || progress === null
              ? 'It waits for its turn.'
              : `${Math.round(progress)} %${secondsLeft === null ? '' : `, ${roughly(secondsLeft)} left`}.`}{' '}
            The Bench opens here by itself.
          </p>
        </Empty>
      )}
    </Page>
  );
}

/** The shape of the Bench, so that nothing jumps when it comes. */
function BenchSkeleton() {
  return (
    <Loading label="Loading the Bench">
      <div className="flex min-h-[70vh] flex-col tablet:flex-row">
        <div className="min-h-[372px] bg-dusk tablet:w-[46%]" />
        <div className="flex-1 space-y-4 p-8">
          <Skeleton className="h-5 w-40" />
          <Skeleton className="h-64 w-full" />
          <Skeleton className="h-5 w-2/3" />
          <Skeleton className="h-5 w-1/2" />
        </div>
      </div>
    </Loading>
  );
}
