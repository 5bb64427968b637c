import { useQuery } from '@tanstack/react-query';
import type { UseQueryResult } from '@tanstack/react-query';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import type { SidePage } from '#shared/contracts/readings.ts';
import { isProblem } from '#src/api/problem.ts';
import { sideReadingOptions } from '#src/api/readings.queries.ts';
import { shortDay } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { Differences } from './differences/differences.tsx';
import { type End, endText, chosenRep, playableReps, relationOf } from './ends.ts';
import { Together } from './films/together.tsx';

/** The two beside each other, once both have a reading and a rep that can be matched. */
export function Pair({ first, second }: { first: End; second: End }) {
  const pages = [
    useQuery(sideReadingOptions(first.visitId, first.side)),
    useQuery(sideReadingOptions(second.visitId, second.side)),
  ] as const;
  const [search] = useSearchParams();
  const [one, other] = pages.map(({ data }) => data);
  if (!one || !other) return <Waiting ends={[first, second]} pages={pages} />;
  if (one.athlete.id !== other.athlete.id)
    return (
      <Section title="Comparison" wide>
        <Empty title="Two people are not compared">
          Choose two reps, sides or visits of one athlete.
        </Empty>
      </Section>
    );
  const firstRep = one.reading && chosenRep(playableReps(one.reading), first.repId);
  const others = other.reading ? playableReps(other.reading) : [];
  // of one side, the second is another rep than the first
  const twoReps = relationOf(first, second) === 'reps' && second.repId === null;
  const secondRep = chosenRep(
    twoReps ? others.filter(({ id }) => id !== firstRep?.id) : others,
    second.repId,
  );
  if (twoReps && firstRep && secondRep)
    return (
      <Navigate
        replace
        to={paths.compare({
          athlete: search.get('athlete') ?? one.athlete.id,
          first: endText({ ...first, repId: firstRep.id }),
          second: endText({ ...second, repId: secondRep.id }),
        })}
      />
    );
  if (!one.reading || !firstRep) return <NotMatched end={first} page={one} />;
  if (!other.reading || !secondRep) return <NotMatched end={second} page={other} />;
  const pair = [
    { end: first, page: one, reading: one.reading, rep: firstRep },
    { end: second, page: other, reading: other.reading, rep: secondRep },
  ] as const;
  return (
    <>
      <Together key={`${firstRep.id} ${secondRep.id}`} pair={pair} />
      <Differences pair={pair} />
    </>
  );
}

function Waiting({
  ends,
  pages,
}: {
  ends: readonly [End, End];
  pages: readonly [UseQueryResult<SidePage>, UseQueryResult<SidePage>];
}) {
  const failed = pages.findIndex(({ isError, data }) => isError && !data);
  const page = pages[failed];
  const end = ends[failed];
  return (
    <Section title="Comparison" wide>
      {page && end ? (
        isProblem(page.error, 'call-first') ? (
          <Empty title="The call by eye comes before the figures">
            <Link to={paths.call(end.visitId, end.side)}>
              Make the call for the {end.side} side
            </Link>
            ; then it can be compared.
          </Empty>
        ) : (
          <ErrorState error={page.error} onRetry={() => void page.refetch()} />
        )
      ) : (
        <Loading label="Loading both readings">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Section>
  );
}

function NotMatched({ end, page }: { end: End; page: SidePage }) {
  return (
    <Section title="Comparison" wide>
      <Empty title="Nothing to match by">
        Standing on the {end.side} on {shortDay(page.visit.day)} no further rep has a rise whose
        lift is known. <Link to={paths.reading(end.visitId, end.side)}>Open that reading</Link>
      </Empty>
    </Section>
  );
}
