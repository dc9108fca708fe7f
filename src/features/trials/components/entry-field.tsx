import type { Ref } from 'react';
import type { Quantity } from '#shared/evidence/evidence.ts';
import { Field } from '#src/components/field.tsx';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { UnitText } from '#src/components/unit-text.tsx';
import { shortName } from '../view/short-name.ts';

interface EntryFieldProps {
  readonly quantity: Quantity;
  readonly isReading: boolean;
  readonly value: string;
  readonly uncertainty: string;
  readonly understood: string | undefined;
  readonly error: string | undefined;
  readonly onChange: (value: string) => void;
  readonly onUncertainty: (value: string) => void;
  readonly inputRef?: Ref<HTMLInputElement> | undefined;
}

/** One quantity in the entry bar; a reading has its own uncertainty beside it. */
export function EntryField({
  quantity,
  isReading,
  value,
  uncertainty,
  understood,
  error,
  onChange,
  onUncertainty,
  inputRef,
}: EntryFieldProps) {
  const unit = quantity.unit === '1' ? undefined : <UnitText unit={quantity.unit} />;
  return (
    <>
      <Field
        label={
          <>
            {shortName(quantity.name)} <QuantitySymbol symbol={quantity.symbol} />
          </>
        }
        aria-label={`${quantity.name}, ${quantity.symbol}`}
        size="tall"
        frameClassName={
          isReading ? 'w-38 flex-none max-sm:w-full' : 'w-30 flex-none max-sm:w-[calc(50%-7px)]'
        }
        className="text-report"
        inputMode="decimal"
        autoComplete="off"
        unit={unit}
        error={error}
        hint={understood && !error ? `Read as ${understood}` : undefined}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        ref={inputRef}
        {...(inputRef ? { 'data-region-start': true } : {})}
      />
      {isReading && (
        <Field
          label="Uncertainty"
          aria-label={`Uncertainty of ${quantity.name}`}
          size="tall"
          frameClassName="w-30 flex-none max-sm:w-full"
          className="text-report"
          inputMode="decimal"
          autoComplete="off"
          before="±"
          unit={unit}
          value={uncertainty}
          onChange={(event) => onUncertainty(event.target.value)}
        />
      )}
    </>
  );
}
