import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { LendDialog } from './lend-dialog.tsx';

/** Lends one edition; the captain may. */
export function LendButton({ n }: { readonly n: number }) {
  const { address, problem, role } = useProblem();
  const [isOpen, setIsOpen] = useState(false);
  if (role !== 'captain') return null;
  return (
    <>
      <Button onClick={() => setIsOpen(true)}>Lend edition {n}</Button>
      {isOpen && (
        <LendDialog address={address} title={problem.title} editions={[n]} onClose={() => setIsOpen(false)} />
      )}
    </>
  );
}
