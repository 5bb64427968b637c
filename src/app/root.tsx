import { Outlet, ScrollRestoration } from 'react-router-dom';
import { Arrival } from './arrival.tsx';

/** What every page has, signed in or not. */
export function Root() {
  return (
    <>
      <Outlet />
      <Arrival />
      <ScrollRestoration />
    </>
  );
}
