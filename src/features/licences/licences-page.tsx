import { useQuery } from '@tanstack/react-query';
import type { ShippedPackage } from '#shared/contracts/licences.ts';
import { licencesQuery } from '#src/api/licences.queries.ts';
import { Fold } from '#src/ui/fold.tsx';
import { Page, Section } from '#src/ui/page.tsx';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { type Column, Table } from '#src/ui/table.tsx';

/** What others made and Redshank stands on, under their own licences. */
export function LicencesPage() {
  const licences = useQuery(licencesQuery);
  return (
    <Page
      title="Licences"
      lead="Redshank stands on programs and letters that others made and let everybody use. Thank you. The letters are Source Sans 3, under the SIL Open Font License 1.1."
    >
      {licences.data ? (
        <Lists packages={licences.data.packages} />
      ) : licences.isError ? (
        <ErrorState error={licences.error} onRetry={() => void licences.refetch()} />
      ) : (
        <Loading label="Loading the licences">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

function Lists({ packages }: { packages: readonly ShippedPackage[] }) {
  const inBrowser = packages.filter(({ browser }) => browser);
  const onServer = packages.filter(({ browser }) => !browser);
  return (
    <>
      <Section title="In your browser" note={`${inBrowser.length} packages`} first wide>
        <List caption="Packages in your browser" packages={inBrowser} />
      </Section>
      <Section title="On the server" wide>
        <Fold title={`${onServer.length} packages`}>
          <List caption="Packages on the server" packages={onServer} />
        </Fold>
      </Section>
    </>
  );
}

function List({ caption, packages }: { caption: string; packages: readonly ShippedPackage[] }) {
  return (
    <Table
      caption={caption}
      columns={COLUMNS}
      rows={packages.map((one, n) => ({ ...one, key: `${n} ${one.name}` }))}
      rowKey={({ key }) => key}
    />
  );
}

const COLUMNS: Column<ShippedPackage & { key: string }>[] = [
  {
    key: 'name',
    label: 'Package',
    cell: ({ name, version }) => (
      <>
        <b className="break-words">{name}</b> {version}
      </>
    ),
  },
  { key: 'licence', label: 'Licence', cell: ({ licence }) => licence },
  {
    key: 'text',
    label: 'Words',
    end: true,
    cell: ({ name, text }) =>
      text === null ? (
        <span className="text-soft">named only</span>
      ) : (
        <a href={`/${text}`} target="_blank" rel="noreferrer" className="tap">
          Read it<span className="sr-only">: the licence of {name}</span>
        </a>
      ),
  },
];
