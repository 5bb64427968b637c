import { Loading, Skeleton } from '#src/ui/states.tsx';

/** Seen while the first page's code comes. */
export function Starting() {
  return (
    <main>
      <h1 className="sr-only">Redshank</h1>
      <Loading label="Redshank is opening">
        <div className="h-14 border-b border-rule" />
        <div className="mx-auto max-w-page px-4 pt-9 tablet:px-12">
          <Skeleton className="h-10 w-72 max-w-full" />
        </div>
      </Loading>
    </main>
  );
}
