import { useState } from 'react';
import type { Copy } from '#shared/contracts/copies.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { dayAndMonth, timeOfDay } from '#src/lib/dates/say-date.ts';
import { paths } from '#src/lib/paths.ts';

interface LentAddressProps {
  readonly copy: Copy;
  readonly token: string;
  readonly onClose: () => void;
}

/** The address of a new copy: told once, because only its hash is kept. */
export function LentAddress({ copy, token, onClose }: LentAddressProps) {
  const [isCopied, setIsCopied] = useState(false);
  const address = new URL(paths.copy(token), window.location.origin).href;
  const until = new Date(copy.until);
  return (
    <div className="grid gap-3.5">
      <p className="text-sm/[21px] text-ink-2">
        This is its address until {dayAndMonth(until)}, {timeOfDay(until)}. It is told this once: send it to{' '}
        {copy.recipient} now. Whoever has it reads the report{copy.hasPassphrase && ', with the passphrase'}.
      </p>
      <Field
        label="Address"
        readOnly
        value={address}
        className="font-code text-xs"
        onFocus={(event) => event.currentTarget.select()}
      />
      <div className="flex flex-wrap items-center justify-end gap-2.5">
        <span role="status" className="mr-auto text-sm text-ink-2">
          {isCopied && 'The address is copied.'}
        </span>
        <Button
          onClick={() =>
            void navigator.clipboard.writeText(address).then(
              () => setIsCopied(true),
              () => setIsCopied(false),
            )
          }
        >
          Copy the address
        </Button>
        <Button kind="main" onClick={onClose}>
          Done
        </Button>
      </div>
    </div>
  );
}
