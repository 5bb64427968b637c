import { useQuery } from '@tanstack/react-query';
import type { ProtocolPage as Protocols } from '#shared/contracts/protocol.ts';
import { useMe } from '#src/api/me.ts';
import { protocolQuery } from '#src/api/protocol.queries.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { dayOf } from '#src/ui/days.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { ProtocolForm } from './protocol-form.tsx';
import { ProtocolHistory } from './protocol-history.tsx';
import { ProtocolRead } from './protocol-read.tsx';

/** How this practice reads and what its work starts from, in versions that every reading names. */
export function ProtocolPage() {
  const protocols = useQuery(protocolQuery);
  const { practice } = useMe();
  return (
    <Page
      title="Protocol"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'protocol' }]}
      lead={
        protocols.data
          ? `Protocol ${protocols.data.current.version} of ${practice.name}, ${dayOf(protocols.data.current.at)}. Each reading names the version it was made with.`
          : 'How this practice reads, in versions. Each reading names the version it was made with.'
      }
    >
      {protocols.data ? (
        <Opened protocols={protocols.data} />
      ) : protocols.isError ? (
        <ErrorState error={protocols.error} onRetry={() => void protocols.refetch()} />
      ) : (
        <Loading label="Loading the protocol">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

function Opened({ protocols: { current, history } }: { protocols: Protocols }) {
  const may = useMayInPractice();
  return (
    <>
      {may('protocol.change') ? (
        <ProtocolForm key={current.version} current={current} />
      ) : (
        <>
          <p className="mb-6 max-w-lead">The owner of the practice sets these figures.</p>
          <ProtocolRead values={current.values} />
        </>
      )}
      <ProtocolHistory history={history} />
    </>
  );
}
