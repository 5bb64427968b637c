import { QueryClientProvider } from '@tanstack/react-query';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';
import { makeQueryClient } from '#src/api/query-client.ts';
import { StatusProvider } from '#src/ui/status.tsx';
import { pages } from './routes.tsx';
import { signInAddress } from './sign-in-address.ts';
import '../styles/app.css';

const router = createBrowserRouter(pages);
const queries = makeQueryClient(() => {
  const { pathname, search, hash } = router.state.location;
  void router.navigate(signInAddress(`${pathname}${search}${hash}`), { replace: true });
});

const root = document.getElementById('root');
if (root === null) throw new Error('the page has no #root');
createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queries}>
      <StatusProvider>
        <RouterProvider router={router} />
      </StatusProvider>
    </QueryClientProvider>
  </StrictMode>,
);
