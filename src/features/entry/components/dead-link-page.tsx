import { Button } from '#src/components/button.tsx';
import { WordLink } from '#src/components/word.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { EntryPage } from './entry-page.tsx';

/** In the place of a form whose link opens nothing, or could not be looked up. */
export function DeadLinkPage({ error, onAgain }: { readonly error: unknown; readonly onAgain: () => void }) {
  const isDead = error instanceof ApiError && error.status === 404;
  if (!isDead) {
    return (
      <EntryPage title="The link could not be opened" sentence={<p role="alert">{sentenceOf(error)}</p>}>
        <Button kind="main" onClick={onAgain}>
          Try again
        </Button>
      </EntryPage>
    );
  }
  return (
    <EntryPage
      title="This link opens nothing"
      sentence="It may have been used, or its time is over. Ask for a new one."
    >
      <WordLink to="/">Go to sign in</WordLink>
    </EntryPage>
  );
}
