import { useMemo, useState } from 'react';
import type { ValueReference } from '#shared/evidence/evidence.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import { optionsForSymbol } from '#shared/report/value-options.ts';
import { Select } from '#src/components/select.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';

interface ReferencePickerProps {
  readonly label: string;
  readonly value: ValueReference | null;
  readonly error: string | undefined;
  readonly onChange: (reference: ValueReference | null) => void;
}

/** Chooses a value: first the quantity, then which of its values. */
export function ReferencePicker({ label, value, error, onChange }: ReferencePickerProps) {
  const { evidence, findings } = useFindingsSnapshot();
  const [quantity, setQuantity] = useState(value && 'quantity' in value ? value.quantity : '');
  const symbol = evidence.quantities.find(({ id }) => id === quantity)?.symbol;
  const options = useMemo(
    () => (symbol ? optionsForSymbol(symbol, evidence, findings, '') : []),
    [symbol, evidence, findings],
  );
  const current = value ? keyOf(value) : '';
  const isListed = options.some(({ ref }) => keyOf(ref) === current);
  return (
    <div className="grid grid-cols-[1fr_1.6fr] gap-3 max-sm:grid-cols-1">
      <Select
        label={label}
        options={[
          { value: '', words: 'choose' },
          ...evidence.quantities.map(({ id, name, symbol: shown }) => ({
            value: id,
            words: `${shown}, ${name}`,
          })),
        ]}
        value={quantity}
        error={error}
        onChange={(event) => {
          setQuantity(event.target.value);
          onChange(null);
        }}
      />
      <Select
        label="which"
        options={[
          { value: '', words: value && !isListed ? 'as it was chosen' : 'choose' },
          ...options.map(({ ref, words, text }) => ({ value: keyOf(ref), words: `${words}: ${text}` })),
        ]}
        value={isListed ? current : ''}
        disabled={!symbol}
        onChange={(event) =>
          onChange(options.find(({ ref }) => keyOf(ref) === event.target.value)?.ref ?? null)
        }
      />
    </div>
  );
}
