import type { Quantity } from '#shared/evidence/evidence.ts';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { Triangle } from '#src/components/triangle.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { quantityValue, type QuantityValue } from './quantity-value.ts';

const STATUS_WORDS: Readonly<Record<Quantity['status'], string>> = {
  measured: 'measured',
  published: 'published',
  assumed: 'assumed',
  fitted: 'fitted',
  predicted: 'predicted',
};

const HUES = {
  measured: 'text-measured',
  predicted: 'text-predicted',
  difference: 'text-difference',
  count: 'text-ink',
} as const;

export function QuantityRow({
  quantity,
  onChange,
}: {
  readonly quantity: Quantity;
  readonly onChange: (() => void) | null;
}) {
  const { evidence, findings } = useFindingsSnapshot();
  const value = quantityValue(quantity, evidence, findings);
  const { symbol, name, status, source } = quantity;
  const text = (
    <>
      <span className="text-[19px]/5">
        <QuantitySymbol symbol={symbol} />
      </span>
      <span className="text-ink-2">
        {name}
        <span className="block text-2xs text-ink-3">
          <SentenceText
            text={source || STATUS_WORDS[status]}
            symbols={evidence.quantities.map((row) => row.symbol)}
          />
        </span>
      </span>
    </>
  );
  return (
    <li className="grid grid-cols-[1fr_auto] items-baseline gap-x-2 border-t border-hair py-2 text-xs first:border-t-[1.25px] first:border-ink">
      {onChange ? (
        <button
          type="button"
          className="-mx-1 grid grid-cols-[50px_1fr] items-baseline rounded-sm px-1 text-left hover:bg-sill"
          aria-label={`Change ${name}, ${symbol}`}
          onClick={onChange}
        >
          {text}
        </button>
      ) : (
        <span className="grid grid-cols-[50px_1fr] items-baseline">{text}</span>
      )}
      <ValueText value={value} isMeasured={status === 'measured'} />
    </li>
  );
}

function ValueText({ value, isMeasured }: { readonly value: QuantityValue; readonly isMeasured: boolean }) {
  const base = 'text-right text-sm font-semibold whitespace-nowrap';
  switch (value.kind) {
    case 'value':
      return (
        <span className={`${base} ${value.hue === 'measured' && !isMeasured ? 'text-ink' : HUES[value.hue]}`}>
          {value.text}
          {value.where && <span className="block text-2xs font-normal text-ink-3">{value.where}</span>}
        </span>
      );
    case 'each trial':
      return <span className={`${base} text-measured`}>{value.text}</span>;
    case 'not measured':
      return <span className={`${base} text-difference`}>not measured</span>;
    case 'fault':
      return (
        <span className="col-span-2 mt-1 flex items-start gap-1.5 text-xs text-leak">
          <Triangle className="mt-px flex-none" />
          {value.sentence}
        </span>
      );
  }
}
