import { useQuery } from '@tanstack/react-query';
import { WordLink } from '#src/components/word.tsx';
import { paths } from '#src/lib/paths.ts';
import { healthQuery } from '../api/get-health.ts';

/** The copy that the demonstration has lent: it can be read without signing in, as any lent copy can. */
export function DemoCopy() {
  const { data } = useQuery(healthQuery);
  if (!data?.demoCopy) return null;
  const { token, title, recipient } = data.demoCopy;
  return (
    <p className="mt-3 text-sm/[22px] text-ink-2">
      Or, without signing in, <WordLink to={paths.copy(token)}>read a lent copy</WordLink> of {title}, as{' '}
      {recipient} does.
    </p>
  );
}
