import { useQuery } from '@tanstack/react-query';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { healthQuery } from '../api/get-health.ts';
import { useStartSession } from '../api/start-session.ts';

/** The people of the invented demonstration, each a word that signs in. */
export function DemoSignIns({ onSignedIn }: { readonly onSignedIn: () => void }) {
  const { data } = useQuery(healthQuery);
  const { mutate, isPending, error } = useStartSession();
  if (!data?.demo || data.demo.length === 0) return null;
  return (
    <section aria-label="Demonstration" className="text-sm/[22px] text-ink-2">
      <p>This installation shows what was invented for demonstration. Look at it as</p>
      <ul className="mt-1 flex flex-wrap gap-x-4 gap-y-1.5">
        {data.demo.map(({ name, email, passphrase, role }) => (
          <li key={email} className="whitespace-nowrap">
            <Word
              disabled={isPending}
              onClick={() => mutate({ email, passphrase }, { onSuccess: onSignedIn })}
            >
              {name}
            </Word>
            , {role}
          </li>
        ))}
      </ul>
      {error && <Notice title={sentenceOf(error)} className="mt-3" />}
    </section>
  );
}
