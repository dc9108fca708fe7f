import { useParams, useSearchParams } from 'react-router-dom';
import { EditionBeside } from '#src/features/editions/routes/edition-beside.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { NotFoundScreen } from './not-found-screen.tsx';

/** One edition, laid beside the draft or beside the edition that the address names. */
export function Component() {
  const { problem } = useProblem();
  const n = numberIn(useParams().n);
  const beside = numberIn(useSearchParams()[0].get('beside'));
  useTitle(n === null ? 'Editions' : `Edition ${n}`, problem.title);
  useWhere('Editions');
  if (n === null) return <NotFoundScreen />;
  return <EditionBeside n={n} beside={beside === n ? null : beside} />;
}

function numberIn(text: string | null | undefined): number | null {
  return text && /^[1-9]\d{0,3}$/.test(text) ? Number(text) : null;
}
