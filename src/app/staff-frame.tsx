import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import { Outlet, useLocation, useNavigate, useNavigation } from 'react-router-dom';
import { meQuery } from '#src/api/accounts.queries.ts';
import { MeContext, useMe } from '#src/api/me.ts';
import { isProblem } from '#src/api/problem.ts';
import { useLiveConnection } from '#src/api/use-live.ts';
import { CodesFirstPage } from '#src/features/accounts/codes/codes-first-page.tsx';
import { Page } from '#src/ui/page.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { ConnectionBar } from './connection-bar.tsx';
import { Header } from './header.tsx';
import { signInAddress } from './sign-in-address.ts';
import { Starting } from './starting.tsx';
import { useWaitingMarks } from './use-waiting-marks.ts';

/** The frame of every page that wants a sign-in: who it is, where to go, and the tab's stream of events. */
export function StaffFrame() {
  const me = useQuery(meQuery);
  const client = useQueryClient();
  const signedOut = useSignedOut();
  const [codesFirst, setCodesFirst] = useState(false);
  // held until the recovery codes were seen: they are shown once
  if (me.data?.codeMissing && !codesFirst) setCodesFirst(true);
  if (me.data !== undefined && codesFirst)
    return (
      <CodesFirstPage
        me={me.data}
        onDone={() =>
          void client
            .invalidateQueries({ queryKey: meQuery.queryKey })
            .then(() => setCodesFirst(false))
        }
        onOut={signedOut}
      />
    );
  if (me.data !== undefined)
    return (
      <MeContext value={me.data}>
        <SignedIn />
      </MeContext>
    );
  // the query client is already leading to the sign-in page
  if (me.isPending || isProblem(me.error, 'sign-in-needed')) return <Starting />;
  return (
    <main>
      <Page title="Redshank">
        <ErrorState error={me.error} onRetry={() => void me.refetch()} />
      </Page>
    </main>
  );
}

/** Leads to the sign-in, which leads back here. */
function useSignedOut(): () => void {
  const client = useQueryClient();
  const navigate = useNavigate();
  return useCallback(() => {
    const place = window.location.pathname + window.location.search;
    void navigate(signInAddress(place), { replace: true });
    client.clear();
  }, [client, navigate]);
}

function SignedIn() {
  const { pathname } = useLocation();
  const going = useNavigation().state !== 'idle';
  useLiveConnection(useSignedOut());
  useWaitingMarks(useMe().user.id);
  return (
    <>
      <a
        href="#main"
        className="absolute left-4 top-2 z-50 -translate-y-20 rounded bg-ink px-4 py-2.5 text-mud focus:translate-y-0"
      >
        To the page
      </a>
      {/* a new page closes the header's menus */}
      <Header key={pathname} />
      <ConnectionBar />
      <main id="main" tabIndex={-1} aria-busy={going || undefined} data-going={going || undefined}>
        <Outlet />
      </main>
    </>
  );
}
