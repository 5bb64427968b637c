import { useQuery } from '@tanstack/react-query';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { benchOptions } from '#src/api/bench.queries.ts';
import { Section } from '#src/ui/page.tsx';
import { Empty, ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import type { Measured } from '../measured.ts';
import { Films } from './films.tsx';

/** A clip whose frames can be shown. */
const isReady = ({ clip }: BenchDocument): boolean =>
  clip.state === 'ready' && clip.frames !== null && clip.copy !== null && clip.width !== null;

/** Both reps playing together. */
export function Together({ pair }: { pair: readonly [Measured, Measured] }) {
  // one request where both are of one clip
  const first = useQuery(benchOptions(pair[0].rep.clipId));
  const second = useQuery(benchOptions(pair[1].rep.clipId));
  const failed = [first, second].find((each) => each.isError && !each.data);
  return (
    <Section
      title="Together"
      note="Matched by lift, not by the clock: at each moment both show the same lift, to one frame."
      wide
    >
      {failed ? (
        <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />
      ) : !first.data || !second.data ? (
        <Loading label="Loading both clips">
          <div className="grid grid-cols-2 gap-2 tablet:gap-4">
            <Skeleton className="h-80 w-full" />
            <Skeleton className="h-80 w-full" />
          </div>
        </Loading>
      ) : isReady(first.data) && isReady(second.data) ? (
        <Films pair={pair} documents={[first.data, second.data]} />
      ) : (
        <Empty title="One of the clips cannot be played yet">
          It is still being prepared. The courses below can be compared already.
        </Empty>
      )}
    </Section>
  );
}
