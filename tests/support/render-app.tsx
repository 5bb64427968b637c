import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import userEvent, { PointerEventsCheckLevel } from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { vi } from 'vitest';
import type { Role } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { makeQueryClient } from '#src/api/query-client.ts';
import { pages } from '#src/app/routes.tsx';
import { signInAddress } from '#src/app/sign-in-address.ts';
import { StatusProvider } from '#src/ui/status.tsx';
import { fakeApi } from './fake-api.ts';
import { aProtocolPage } from './protocol.ts';
import { aWordingPage } from './consent-wording.ts';
import { aMe } from './records.ts';

/** A stream that stays silent: live events have tests of their own. */
class SilentEvents extends EventTarget {
  static readonly CLOSED = 2;
  readonly readyState = 1;
  close() {}
}

/** The fake server with somebody signed in. */
export function signedInApi(role: Role = 'coach') {
  vi.stubGlobal('EventSource', SilentEvents);
  return fakeApi()
    .on(routes.me, () => aMe(role))
    .on(routes.waitingMail, () => ({ items: [] }))
    .on(routes.protocol, () => aProtocolPage())
    .on(routes.listReports, () => ({ items: [] }))
    .on(routes.listPlans, () => ({ items: [] }))
    .on(routes.consentWording, () => aWordingPage());
}

/** The whole product at an address, as main.tsx puts it together. */
export function renderAt(address: string) {
  const router = createMemoryRouter(pages, { initialEntries: [address] });
  const queries = makeQueryClient(() => {
    const { pathname, search, hash } = router.state.location;
    void router.navigate(signInAddress(`${pathname}${search}${hash}`), { replace: true });
  });
  queries.setDefaultOptions({ queries: { ...queries.getDefaultOptions().queries, retry: false } });
  render(
    <QueryClientProvider client={queries}>
      <StatusProvider>
        <RouterProvider router={router} />
      </StatusProvider>
    </QueryClientProvider>,
  );
  const place = () => `${router.state.location.pathname}${router.state.location.search}`;
  // nothing is laid out here: whether something can be hit is for the journeys in a real browser
  const user = userEvent.setup({ delay: null, pointerEventsCheck: PointerEventsCheckLevel.Never });
  return { user, place, router };
}
