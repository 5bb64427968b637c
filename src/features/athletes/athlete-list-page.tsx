import { useQuery } from '@tanstack/react-query';
import { useCallback, useEffect, useRef } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import type { Role } from '#shared/contracts/accounts.ts';
import { athleteListOptions } from '#src/api/athletes.queries.ts';
import { useMe } from '#src/api/me.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { useMayInPractice } from '#src/api/use-may.ts';
import { Page } from '#src/ui/page.tsx';
import { Pager } from '#src/ui/pager.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { AthleteTable } from './athlete-table.tsx';
import { changed, queryOf, type ListField } from './list-address.ts';
import { ListFilters } from './list-filters.tsx';

/** Whose athletes a role sees. */
const LEADS: Record<Role, string | undefined> = {
  coach: undefined,
  supervisor: 'The athletes of the coaches you look after.',
  owner: 'Everyone in the practice.',
};

/** The athletes that this person may see. Search, filter, order and page stand in the address. */
export function AthleteListPage() {
  const [search, setSearch] = useSearchParams();
  const { user } = useMe();
  const mayAdd = useMayInPractice()('athlete.add');
  const list = useQuery(athleteListOptions(queryOf(search)));
  // two changes in one moment (a search that is still being typed, then a filter) build on each other
  const latest = useRef(search);
  useEffect(() => {
    latest.current = search;
  }, [search]);
  const onChange = useCallback(
    (field: ListField, value: string) => {
      latest.current = changed(latest.current, field, value);
      void setSearch(latest.current, { replace: true, preventScrollReset: true });
    },
    [setSearch],
  );
  const filtered = ['q', 'consent', 'coach'].some((field) => search.has(field));
  return (
    <Page
      title="Athletes"
      lead={LEADS[user.role]}
      actions={mayAdd ? <ButtonLink to={paths.newAthlete()}>Add an athlete</ButtonLink> : undefined}
    >
      <ListFilters search={search} coaches={list.data?.coaches ?? []} onChange={onChange} />
      <p role="status" className="mt-4 flex min-h-[44px] items-center text-soft">
        {list.data && (list.data.total === 1 ? '1 athlete' : `${list.data.total} athletes`)}
      </p>
      <div className="border-t border-rule pt-6" aria-busy={list.isPlaceholderData || undefined}>
        {list.isPending && (
          <Loading label="Loading athletes">
            <SkeletonLines count={8} />
          </Loading>
        )}
        {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
        {list.data && list.data.items.length > 0 && (
          <AthleteTable
            athletes={list.data.items}
            showCoach={user.role !== 'coach'}
            coachAddress={(id) => `?${changed(search, 'coach', id)}`}
          />
        )}
        {list.data?.items.length === 0 &&
          (filtered ? (
            <Empty
              title="Nobody fits"
              action={<Link to={paths.athletes()}>Show all athletes</Link>}
            >
              Try fewer letters, or another filter.
            </Empty>
          ) : (
            <Empty
              title="No athletes yet"
              action={
                mayAdd ? (
                  <ButtonLink look="primary" to={paths.newAthlete()}>
                    Add the first athlete
                  </ButtonLink>
                ) : undefined
              }
            >
              An athlete is the person filmed. Visits, consent and readings are kept with them.
            </Empty>
          ))}
        {list.data && (
          <Pager
            {...list.data}
            label="athletes"
            to={(page) => `?${changed(search, 'page', String(page))}`}
          />
        )}
      </div>
    </Page>
  );
}
