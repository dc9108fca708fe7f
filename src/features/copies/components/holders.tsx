import { useQuery } from '@tanstack/react-query';
import { dayAndMonth } from '#src/lib/dates/say-date.ts';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { WordLink } from '#src/components/word.tsx';
import { problemCopiesQuery } from '../api/list-copies.ts';
import { isOut } from '../sentences/copy-words.ts';

interface HoldersProps {
  readonly address: ProblemAddress;
  /** The edition. */
  readonly n: number;
}

/** Who holds a copy of an edition, and until when. */
export function Holders({ address, n }: HoldersProps) {
  const { data } = useQuery(problemCopiesQuery(address));
  const out = (data ?? []).filter((copy) => copy.edition.n === n && isOut(copy));
  if (!data) return null;
  if (out.length === 0) return <p className="text-sm text-ink-2">Nobody holds a copy of it.</p>;
  return (
    <ul className="grid gap-1.5 text-sm">
      {out.map(({ id, recipient, reader, until, views }) => (
        <li key={id}>
          <b>{recipient}</b>, {reader}, until {dayAndMonth(new Date(until))}
          {views.opened === 0 ? ', not opened yet' : ', opened'}
        </li>
      ))}
      <li>
        <WordLink to={paths.copies(address.team)}>Look after the copies</WordLink>
      </li>
    </ul>
  );
}
