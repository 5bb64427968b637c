import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { isProblem } from '#src/api/problem.ts';
import { Button } from '#src/ui/button.tsx';
import { Page } from '#src/ui/page.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { NotFoundPage } from './not-found-page.tsx';

/** Browsers word a missing piece of code each in their own way. */
const isMissingCode = (error: unknown) =>
  error instanceof TypeError && /import|module/i.test(error.message);

/** A page that broke. A piece of code that is gone after an update is fetched by loading again. */
export function ErrorPage() {
  const error = useRouteError();
  const missing = isRouteErrorResponse(error) && error.status === 404;
  if (missing || isProblem(error, 'not-found')) return <NotFoundPage />;
  const shown = isMissingCode(error)
    ? new Error(
        'A part of this page could not be fetched: the connection broke, or Redshank was updated.',
      )
    : new Error('This page broke. What you had saved is safe.');
  return (
    <Page title="That did not work">
      <ErrorState error={shown}>
        <Button onClick={() => window.location.reload()}>Load the page again</Button>
      </ErrorState>
    </Page>
  );
}

/** The same where even the frame broke, or a page without a frame. */
export function RootErrorPage() {
  return (
    <main>
      <ErrorPage />
    </main>
  );
}
