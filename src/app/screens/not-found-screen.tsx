import { WordLink } from '#src/components/word.tsx';
import { PlainPage } from './plain-page.tsx';

/** Also for what a person may not see: for them it does not exist. */
export function NotFoundScreen() {
  return (
    <PlainPage title="There is nothing at this address">
      <p>
        It may have been mistyped, or it belongs to a team that you are not in. If a link brought you here,
        ask who sent it.
      </p>
      <p>
        <WordLink to="/">Go to your Season</WordLink>
      </p>
    </PlainPage>
  );
}
