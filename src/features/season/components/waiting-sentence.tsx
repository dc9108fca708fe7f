import { Fragment } from 'react';
import { Link } from 'react-router-dom';
import type { Waiting } from '../sentences/waiting.ts';
import { SEASON_SENTENCE } from './season-headline.tsx';

/** What waits for this person, each thing a link in its own words. */
export function WaitingSentence({ things }: { readonly things: readonly Waiting[] }) {
  if (things.length === 0) return null;
  return (
    <p className={SEASON_SENTENCE}>
      Waiting for you:{' '}
      {things.map(({ key, before, linked, after, to }, index) => (
        <Fragment key={key}>
          {index > 0 && (index === things.length - 1 ? ', and ' : ', ')}
          {before}
          <Link to={to} className="border-b-[1.25px] border-edge whitespace-nowrap text-ink hover:border-ink">
            {linked}
          </Link>
          {after}
        </Fragment>
      ))}
      .
    </p>
  );
}
