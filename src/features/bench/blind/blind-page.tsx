import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { secondMarkingOptions } from '#src/api/reliability.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { BlindBench } from './blind-bench.tsx';
import { BlindResult } from './blind-result.tsx';

/** `/second-markings/:id`: marking again without sight of the first marks; once finished, how well both agree. */
export function BlindPage() {
  const { id = '' } = useParams();
  const second = useQuery(secondMarkingOptions(id));
  if (second.data) {
    const { clip, agreement, visit } = second.data;
    if (agreement) return <BlindResult second={second.data} agreement={agreement} />;
    const { frames, width, height, copy } = clip;
    if (clip.state === 'ready' && frames && width !== null && height !== null && copy)
      return (
        <BlindBench
          key={id}
          second={second.data}
          frames={frames}
          frameSize={{ width, height }}
          copySize={{ width: copy.width, height: copy.height }}
        />
      );
    return (
      <Page title="Mark again, blind">
        <Empty
          title="This clip cannot be shown now"
          action={
            <ButtonLink look="primary" to={paths.visit(visit.id)}>
              Back to the visit
            </ButtonLink>
          }
        >
          The visit says what it waits for.
        </Empty>
      </Page>
    );
  }
  if (second.isPending)
    return (
      <Loading label="Loading the frames">
        <div className="min-h-[70vh] bg-dusk tablet:w-[46%]" />
      </Loading>
    );
  return (
    <Page title="Mark again, blind">
      <ErrorState error={second.error} onRetry={() => void second.refetch()}>
        <Link to={paths.today()} className="py-2.5">
          Back to Today
        </Link>
      </ErrorState>
    </Page>
  );
}
