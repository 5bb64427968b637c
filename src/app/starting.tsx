import { Loading, Skeleton } from '#src/ui/states.tsx';

/** Seen while the first page's code comes. */
export function Starting() {
  return (
    <Loading label="Redshank is opening">
      <div className="h-14 border-b border-rule" />
      <div className="mx-auto max-w-page px-4 pt-9 tablet:px-12">
        <Skeleton className="h-10 w-72 max-w-full" />
      </div>
    </Loading>
  );
}
