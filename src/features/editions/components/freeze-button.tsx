import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { editionFigures } from '#shared/editions/edition-figures.ts';
import { Button } from '#src/components/button.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';
import { useFreezeEdition } from '../api/freeze-edition.ts';
import { draftQuery } from '../api/get-draft.ts';
import { figureWords } from '../sentences/say-when.ts';
import { FreezeDialog } from './freeze-dialog.tsx';

/** Opens the question; for who may not freeze, the sentence who may. `latest` is the newest edition on screen. */
export function FreezeButton({ latest }: { readonly latest: number }) {
  const { address, role, team } = useProblem();
  const evidence = useEvidence();
  const { data: document } = useQuery(draftQuery(address));
  const { mutate, reset, isPending, error } = useFreezeEdition(address);
  /** The edition that was on screen when the question was opened: what came since is no surprise to the server. */
  const [after, setAfter] = useState<number | null>(null);
  if (role !== 'captain') {
    const captains = team.people.filter((person) => person.role === 'captain').map(({ name }) => name);
    return <p className="text-sm text-ink-2">{captains.join(' or ')} freezes editions, as captain.</p>;
  }
  const close = () => {
    reset();
    setAfter(null);
  };
  const freeze = (note: string) => {
    if (after === null) return;
    mutate(
      { note, after },
      {
        onSuccess: ({ n }) => {
          close();
          say(`Edition ${n} is frozen and sealed.`);
        },
      },
    );
  };
  return (
    <>
      <Button kind="main" onClick={() => setAfter(latest)}>
        Freeze edition {latest + 1}
      </Button>
      {after !== null && (
        <FreezeDialog
          n={after + 1}
          figures={document ? figureWords({ pages: null, ...editionFigures({ evidence, document }) }) : null}
          isFreezing={isPending}
          error={error}
          onClose={close}
          onFreeze={freeze}
        />
      )}
    </>
  );
}
