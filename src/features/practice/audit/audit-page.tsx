import { useMutation, useQuery } from '@tanstack/react-query';
import { useCallback, useEffect, useRef } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { routes } from '#shared/contracts/routes.ts';
import { auditNamesQuery, auditOptions } from '#src/api/audit.queries.ts';
import { download } from '#src/api/client.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { Button } from '#src/ui/button.tsx';
import { Page } from '#src/ui/page.tsx';
import { Pager } from '#src/ui/pager.tsx';
import { paths } from '#src/ui/paths.ts';
import { saveAs } from '#src/ui/save-as.ts';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { type AuditField, changed, queryOf } from './audit-address.ts';
import { AuditFilters } from './audit-filters.tsx';
import { AuditTable } from './audit-table.tsx';

const PAGE_SIZE = 50;

/** `/practice/audit`: who did what to which athlete, from where. Filters and page stand in the address. */
export function AuditPage() {
  const may = useMayInPractice()('audit.read');
  return (
    <Page
      title="Audit trail"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'audit trail' }]}
      lead="Who did what to which athlete, and from which network. It is only added to: nobody can change or delete an entry."
      actions={may ? <SaveFile /> : undefined}
    >
      {may ? (
        <Trail />
      ) : (
        <Empty title="The owner reads this">
          Ask the owner of the practice if you need to know who did what.
        </Empty>
      )}
    </Page>
  );
}

function SaveFile() {
  const [search] = useSearchParams();
  const save = useMutation({
    mutationFn: () => {
      const { page: _page, ...query } = queryOf(search);
      return download(routes.auditFile, { query });
    },
    onSuccess: ({ name, blob }) => saveAs(name, blob),
  });
  return (
    <div className="flex flex-col items-start gap-2">
      <Button busy={save.isPending} onClick={() => save.mutate()}>
        Save these entries (CSV)
      </Button>
      {save.isError && (
        <p role="alert" className="max-w-form text-note text-alarm">
          {save.error.message}
        </p>
      )}
    </div>
  );
}

function Trail() {
  const [search, setSearch] = useSearchParams();
  const names = useQuery(auditNamesQuery);
  const trail = useQuery(auditOptions({ ...queryOf(search), pageSize: PAGE_SIZE }));
  // two changes in one moment build on each other
  const latest = useRef(search);
  useEffect(() => {
    latest.current = search;
  }, [search]);
  const onChange = useCallback(
    (field: AuditField, value: string) => {
      latest.current = changed(latest.current, field, value);
      void setSearch(latest.current, { replace: true, preventScrollReset: true });
    },
    [setSearch],
  );
  return (
    <>
      <AuditFilters search={search} names={names.data} onChange={onChange} />
      <p role="status" className="mt-4 flex min-h-[44px] items-center text-soft">
        {trail.data && (trail.data.total === 1 ? '1 entry' : `${trail.data.total} entries`)}
      </p>
      <div className="border-t border-rule pt-6" aria-busy={trail.isPlaceholderData || undefined}>
        {trail.isPending && (
          <Loading label="Loading the audit trail">
            <SkeletonLines count={8} />
          </Loading>
        )}
        {trail.isError && <ErrorState error={trail.error} onRetry={() => void trail.refetch()} />}
        {trail.data && trail.data.items.length > 0 && <AuditTable entries={trail.data.items} />}
        {trail.data?.items.length === 0 &&
          (search.size > 0 ? (
            <Empty
              title="No entry fits"
              action={<Link to={paths.audit()}>Show the whole trail</Link>}
            >
              Choose more days, or another person, athlete or action.
            </Empty>
          ) : (
            <Empty title="Nothing yet">
              Signing in, uploading, looking at a clip, exporting and opening a replay appear here
              as they happen.
            </Empty>
          ))}
        {trail.data && (
          <Pager
            {...trail.data}
            label="the audit trail"
            to={(page) => `?${changed(search, 'page', String(page))}`}
          />
        )}
      </div>
    </>
  );
}
