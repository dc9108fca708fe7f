import { useQuery } from '@tanstack/react-query';
import { Fragment, useMemo } from 'react';
import { Link } from 'react-router-dom';
import { worthDoing } from '#shared/editions/worth-doing.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { draftQuery } from '../api/get-draft.ts';
import { worthDoingWords, type Worth } from '../sentences/worth-doing-words.ts';

interface WorthDoingSentenceProps {
  readonly address: ProblemAddress;
  /** Things that other parts of the problem find worth doing. */
  readonly others?: readonly Worth[];
}

/** What is worth doing before freezing, in a sentence. Freezing never waits for it. */
export function WorthDoingSentence({ address, others = [] }: WorthDoingSentenceProps) {
  const { data: draft } = useQuery(draftQuery(address));
  const { evidence, findings } = useFindingsSnapshot();
  const worth = useMemo(
    () => (draft ? worthDoingWords(address, worthDoing(draft, evidence, findings)) : null),
    [address, draft, evidence, findings],
  );
  if (!worth) return null;
  const things = [...worth, ...others];
  return (
    <div className="max-[1099.98px]:col-span-full">
      <h3 className="mb-1 text-sm font-[650]">Worth doing before you freeze</h3>
      <p className="font-report text-[16px]/6 text-ink-2">
        {things.length === 0
          ? 'Nothing: every number is tied and every claim is decided.'
          : things.map(({ key, linked, after, to }, index) => (
              <Fragment key={key}>
                {index > 0 && (index === things.length - 1 ? ', and ' : ', ')}
                <Link to={to} className="border-b-[1.25px] border-edge text-ink hover:border-ink">
                  {index === 0 ? capital(linked) : linked}
                </Link>
                {after}
              </Fragment>
            ))}
        {things.length > 0 && '.'}
      </p>
    </div>
  );
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
