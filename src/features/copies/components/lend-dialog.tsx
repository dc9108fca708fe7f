import { useState } from 'react';
import type { Copy } from '#shared/contracts/copies.ts';
import { Dialog } from '#src/components/dialog.tsx';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { LendForm } from './lend-form.tsx';
import { LentAddress } from './lent-address.tsx';

interface LendDialogProps {
  readonly address: ProblemAddress;
  readonly title: string;
  /** Editions to choose from, the newest first. */
  readonly editions: readonly number[];
  readonly onClose: () => void;
}

/** Lends an edition: to whom, as what, until when. Then it tells the address, this once. */
export function LendDialog({ address, title, editions, onClose }: LendDialogProps) {
  const [lent, setLent] = useState<{ copy: Copy; token: string } | null>(null);
  if (lent) {
    return (
      <Dialog
        open
        onClose={onClose}
        title={`Edition ${lent.copy.edition.n} is lent to ${lent.copy.recipient}`}
        actions={null}
      >
        <LentAddress copy={lent.copy} token={lent.token} onClose={onClose} />
      </Dialog>
    );
  }
  const one = editions.length === 1 ? `edition ${editions[0]} of ` : '';
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Lend ${one}${title}?`}
      sentence="The reader gets this report with its provenance, and nothing else of ours. It ends when you say. A screen can still be photographed: lend what you would say aloud."
      actions={null}
    >
      <LendForm address={address} editions={editions} onLent={setLent} onClose={onClose} />
    </Dialog>
  );
}
