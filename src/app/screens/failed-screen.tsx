import { Button } from '#src/components/button.tsx';
import { WordLink } from '#src/components/word.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { NotFoundScreen } from './not-found-screen.tsx';
import { PlainPage } from './plain-page.tsx';

interface FailedScreenProps {
  readonly error: unknown;
  readonly onAgain: () => void;
}

/** In the place of a screen whose data did not come. */
export function FailedScreen({ error, onAgain }: FailedScreenProps) {
  const status = error instanceof ApiError ? error.status : null;
  if (status === 404) return <NotFoundScreen />;
  if (status === 403) {
    return (
      <PlainPage title="This is not yours to see">
        <p>{sentenceOf(error)}</p>
        <p>
          <WordLink to="/">Go to your Season</WordLink>
        </p>
      </PlainPage>
    );
  }
  return (
    <PlainPage title={status === 0 ? 'The server cannot be reached' : 'This page could not be brought'}>
      <p role="alert">{sentenceOf(error)}</p>
      {error instanceof ApiError && error.requestId && (
        <p className="text-base">
          If it stays so, tell whoever runs the server this number: {error.requestId}.
        </p>
      )}
      <Button kind="main" onClick={onAgain}>
        Try again
      </Button>
    </PlainPage>
  );
}
