import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { Button } from '#src/components/button.tsx';
import { ApiError } from '#src/lib/api/api-error.ts';
import { FailedScreen } from './failed-screen.tsx';
import { NotFoundScreen } from './not-found-screen.tsx';
import { PlainPage } from './plain-page.tsx';

function reload(): void {
  location.reload();
}

/** In the place of a screen that failed while it was drawn or loaded. */
export function ErrorScreen() {
  const error = useRouteError();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFoundScreen />;
  if (error instanceof ApiError) return <FailedScreen error={error} onAgain={reload} />;
  const isMissingFile = error instanceof TypeError && /import|module|fetch/i.test(error.message);
  return (
    <PlainPage title={isMissingFile ? 'A part of this page could not be loaded' : 'This page has failed'}>
      <p role="alert">
        {isMissingFile
          ? 'The server cannot be reached, or Holdwater was renewed while this page was open. Load the page again.'
          : 'Something in it went wrong. What was kept is safe. Load the page again; if it fails again, tell whoever runs the server what you did just before.'}
      </p>
      <Button kind="main" onClick={reload}>
        Load again
      </Button>
    </PlainPage>
  );
}
